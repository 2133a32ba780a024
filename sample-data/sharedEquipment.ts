import { known } from './told.ts';

/** What the runs of the laboratory share: bottles and a burette. */
export const sharedEquipment = {
  /** Sodium hydroxide, 0.1 mol/L, standardised to hydrogencarbonate. */
  bottle12: {
    strength: known(0.1002, 0.0001, 'standardisation 12'),
    carbonate: known(0.0003, 0.0001, 'carbonate in bottle 12'),
  },
  burette7: {
    gain: known(1, 0.0005, 'burette 7'),
    uSetting_mL: 0.003,
  },
};
