import { assumptions } from './assumptions.ts';
import type { Declaration } from './declaration.ts';
import { readDeclaration } from './readDeclaration.ts';
import type { RunFacts } from './runFacts.ts';
import type { Analyte } from './sheet.ts';
import type { AnalyteFile } from './sheetFile.ts';

const fitted: Declaration = { state: 'fitted', start: null, assumed: false };

/**
 * Fills in what the sheet leaves out about an analyte. Where a base is added
 * it is taken as a free acid, where an acid is added as a free base.
 *
 * @param explicitIons true where the vessel declares its strong ions itself
 */
export function completeAnalyte(file: AnalyteFile, facts: RunFacts, explicitIons: boolean): Analyte {
  const declaredGroups = file.groups ?? file.pKa?.length;
  const groups = declaredGroups ?? facts.groupsIfOpen;
  const asAcid = facts.titrantKind === 'base';
  const chargeIfOpen = asAcid ? assumptions.chargeFullyProtonatedOfAcid : groups;
  const lostIfOpen = asAcid ? 0 : groups;
  return {
    name:
      file.name === undefined || file.name.trim() === ''
        ? { value: 'analyte', assumed: true }
        : { value: file.name, assumed: false },
    groups: { value: groups, assumed: declaredGroups === undefined },
    chargeFullyProtonated: {
      value: file.chargeFullyProtonated ?? chargeIfOpen,
      assumed: file.chargeFullyProtonated === undefined,
    },
    protonsLostAsWeighed: explicitIons
      ? null
      : { value: file.protonsLostAsWeighed ?? lostIfOpen, assumed: file.protonsLostAsWeighed === undefined },
    counterIon:
      file.counterIon === undefined
        ? null
        : {
            ...file.counterIon,
            name: file.counterIon.name ?? 'counter-ion',
            pKa: file.counterIon.pKa.map(readDeclaration),
          },
    concentration: file.concentration_M === undefined ? fitted : readDeclaration(file.concentration_M),
    pKa: Array.from({ length: groups }, (_, group) => {
      const declared = file.pKa?.[group];
      return declared === undefined ? fitted : readDeclaration(declared);
    }),
  };
}
