import { buildBaseTitrant, buildSample } from '../../test/simulator/buildVessels.ts';
import { carbonicPKaAt25, type SampleRun, titrate, waterAt25 } from '../sampleRun.ts';
import { sharedEquipment } from '../sharedEquipment.ts';
import { fitted, fixed, known, knownExpanded, truthOf } from '../told.ts';

const { bottle12, burette7 } = sharedEquipment;

/** Standardisation of the base with a primary standard of one proton, potassium hydrogen phthalate; separated by tabs. */
export function phthalate(): SampleRun {
  const q = {
    pKa1: fixed(2.95),
    pKa2: fitted(5.41),
    concentration: knownExpanded(0.02004, 0.00002, 2, 'weighing K3'),
    // The same bottle as in the other runs: here it is what the run is for.
    'titrant.concentration': fitted(bottle12.strength.truth, 0.1),
    'titrant.carbonate': bottle12.carbonate,
    'burette.gain': burette7.gain,
    'reading.offset': known(0, 0.01, 'calibration of the morning'),
  };
  const run = titrate(
    {
      sample: buildSample({
        volume_mL: 50,
        analytes: [
          {
            pKa: [q.pKa1.truth, q.pKa2.truth],
            chargeFullyProtonated: 0,
            protonsLostAsWeighed: 1,
            concentration_M: q.concentration.truth,
          },
        ],
      }),
      titrant: buildBaseTitrant({
        concentration_M: q['titrant.concentration'].truth,
        strengthMeans: 'toHydrogencarbonate',
        carbonate_M: q['titrant.carbonate'].truth,
        carbonicPKa: carbonicPKaAt25,
      }),
      medium: waterAt25,
      buretteGain: q['burette.gain'].truth,
      reading: { kind: 'pH', scale: 'activity', offset: q['reading.offset'].truth },
      errors: { seed: 103, uReading: 0.003, uSetting_mL: burette7.uSetting_mL },
    },
    { last_mL: 13, smallest_mL: 0.01, largest_mL: 0.25, aim_pH: 0.15 },
  );
  const rows = Array.from(
    run.volumes_mL,
    (volume, i) => `${(0.4 + 0.55 * i).toFixed(2)}\t${volume.toFixed(2)}\t${run.readings[i].toFixed(3)}`,
  );
  return {
    file: 'phthalate.txt',
    exported: ['Time/min\tVolume/mL\tpH', ...rows, ''].join('\n'),
    truth: truthOf(q),
    sheet: {
      sheet: 1,
      sample: {
        volume_mL: 50,
        extraWater_mL: 0,
        strongIon_M: 0,
        carbonate_M: 0,
        background_M: 0,
        analytes: [
          {
            name: 'potassium hydrogen phthalate',
            groups: 2,
            chargeFullyProtonated: 0,
            protonsLostAsWeighed: 1,
            concentration_M: q.concentration.declared,
            pKa: [q.pKa1.declared, q.pKa2.declared],
          },
        ],
      },
      titrant: {
        kind: 'base',
        name: 'NaOH',
        concentration_M: q['titrant.concentration'].declared,
        strengthMeans: 'toHydrogencarbonate',
        carbonate_M: q['titrant.carbonate'].declared,
        background_M: 0,
      },
      burette: { gain: q['burette.gain'].declared, uSetting_mL: burette7.uSetting_mL, uDose_mL: 0 },
      medium: { temperature_C: 25, activity: 'davies' },
      reading: { kind: 'pH', scale: 'activity', offset: q['reading.offset'].declared, slope: 1, u: 0.003 },
    },
  };
}
