import { buildAcidTitrant, buildSample } from '../../test/simulator/buildVessels.ts';
import { type SampleRun, titrate, waterAt25 } from '../sampleRun.ts';
import { sharedEquipment } from '../sharedEquipment.ts';
import { fitted, fixed, known, knownWithin, truthOf } from '../told.ts';

const { burette7 } = sharedEquipment;

/** A carbonate sample against acid in a closed vessel; a row of units under the header. */
export function washingSoda(): SampleRun {
  const q = {
    pKa1: fitted(6.353),
    pKa2: fitted(10.33),
    concentration: fitted(0.02467),
    'sample.volume': knownWithin(20, 0.03, 'pipette 20 mL'),
    'sample.background': fixed(0.1),
    'titrant.concentration': known(0.09985, 0.00012, 'standardisation of acid 5'),
    'burette.gain': burette7.gain,
    'reading.offset': known(0, 0.01, 'calibration of the afternoon'),
  };
  const run = titrate(
    {
      sample: buildSample({
        volume_mL: q['sample.volume'].truth,
        background_M: q['sample.background'].truth,
        analytes: [
          {
            pKa: [q.pKa1.truth, q.pKa2.truth],
            chargeFullyProtonated: 0,
            protonsLostAsWeighed: 2,
            concentration_M: q.concentration.truth,
          },
        ],
      }),
      titrant: buildAcidTitrant({ concentration_M: q['titrant.concentration'].truth }),
      extraWater_mL: 10,
      medium: waterAt25,
      buretteGain: q['burette.gain'].truth,
      reading: { kind: 'pH', scale: 'activity', offset: q['reading.offset'].truth },
      errors: { seed: 104, uReading: 0.005, uSetting_mL: burette7.uSetting_mL },
    },
    { last_mL: 12.5, smallest_mL: 0.02, largest_mL: 0.25, aim_pH: 0.12 },
  );
  const rows = Array.from(run.volumes_mL, (volume, i) => `${volume.toFixed(3)},${run.readings[i].toFixed(3)},25.0`);
  return {
    file: 'washing-soda.csv',
    exported: ['Volume,Measured value,Temperature', 'mL,pH,°C', ...rows, ''].join('\n'),
    truth: truthOf(q),
    sheet: {
      sheet: 1,
      sample: {
        volume_mL: q['sample.volume'].declared,
        extraWater_mL: 10,
        strongIon_M: 0,
        carbonate_M: 0,
        background_M: q['sample.background'].declared,
        analytes: [
          {
            name: 'sodium carbonate',
            groups: 2,
            chargeFullyProtonated: 0,
            protonsLostAsWeighed: 2,
            concentration_M: q.concentration.declared,
            pKa: [q.pKa1.declared, q.pKa2.declared],
          },
        ],
      },
      titrant: {
        kind: 'acid',
        name: 'HCl',
        concentration_M: q['titrant.concentration'].declared,
        carbonate_M: 0,
        background_M: 0,
      },
      burette: { gain: q['burette.gain'].declared, uSetting_mL: burette7.uSetting_mL, uDose_mL: 0 },
      medium: { temperature_C: 25, activity: 'davies', pKw: waterAt25.pKw },
      reading: { kind: 'pH', scale: 'activity', offset: q['reading.offset'].declared, slope: 1, u: 0.005 },
    },
  };
}
