import { buildBaseTitrant, buildSample } from '../../test/simulator/buildVessels.ts';
import { carbonicPKaAt25, type SampleRun, titrate, waterAt25 } from '../sampleRun.ts';
import { sharedEquipment } from '../sharedEquipment.ts';
import { fitted, fixed, known, knownWithin, truthOf } from '../told.ts';

const { burette7 } = sharedEquipment;

/** A strong acid against an old base that has drawn carbonate, in millivolts; a plain comma-separated table. */
export function strongAcid(): SampleRun {
  const q = {
    'sample.strongIon': fitted(-0.01976),
    'sample.volume': knownWithin(25, 0.03, 'pipette 25 mL'),
    'sample.background': fixed(0.1),
    'titrant.concentration': known(0.0992, 0.0001, 'standardisation 9'),
    'titrant.carbonate': fitted(0.00215, 0.001),
    'burette.gain': burette7.gain,
    'reading.E0': fitted(411.3),
    'reading.slope': known(0.998, 0.002, 'electrode slope'),
  };
  const run = titrate(
    {
      sample: buildSample({
        volume_mL: q['sample.volume'].truth,
        background_M: q['sample.background'].truth,
        strongIon_M: q['sample.strongIon'].truth,
        analytes: [],
      }),
      titrant: buildBaseTitrant({
        concentration_M: q['titrant.concentration'].truth,
        strengthMeans: 'toHydrogencarbonate',
        carbonate_M: q['titrant.carbonate'].truth,
        carbonicPKa: carbonicPKaAt25,
      }),
      medium: waterAt25,
      buretteGain: q['burette.gain'].truth,
      reading: {
        kind: 'mV',
        scale: 'activity',
        E0_mV: q['reading.E0'].truth,
        slope: q['reading.slope'].truth,
      },
      errors: { seed: 105, uReading: 0.3, uSetting_mL: burette7.uSetting_mL },
    },
    { last_mL: 8, smallest_mL: 0.01, largest_mL: 0.15, aim_pH: 0.12 },
  );
  const rows = Array.from(run.volumes_mL, (volume, i) => `${volume.toFixed(3)},${run.readings[i].toFixed(1)}`);
  return {
    file: 'strong-acid-mv.csv',
    exported: ['V (mL),E (mV)', ...rows, ''].join('\n'),
    truth: truthOf(q),
    sheet: {
      sheet: 1,
      sample: {
        volume_mL: q['sample.volume'].declared,
        extraWater_mL: 0,
        strongIon_M: q['sample.strongIon'].declared,
        carbonate_M: 0,
        background_M: q['sample.background'].declared,
        analytes: [],
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
      medium: { temperature_C: 25, activity: 'davies', pKw: waterAt25.pKw },
      reading: {
        kind: 'mV',
        scale: 'activity',
        E0_mV: q['reading.E0'].declared,
        slope: q['reading.slope'].declared,
        u: 0.3,
      },
    },
  };
}
