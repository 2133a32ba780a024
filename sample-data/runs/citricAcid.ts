import { buildBaseTitrant, buildSample } from '../../test/simulator/buildVessels.ts';
import { carbonicPKaAt25, type SampleRun, titrate, waterAt25 } from '../sampleRun.ts';
import { sharedEquipment } from '../sharedEquipment.ts';
import { fitted, known, knownWithin, truthOf } from '../told.ts';

const { bottle12, burette7 } = sharedEquipment;

/** A polyprotic reagent, the free acid; semicolons, decimal commas and German headers. */
export function citricAcid(): SampleRun {
  const q = {
    pKa1: fitted(3.13),
    pKa2: fitted(4.76, 4.8),
    pKa3: known(6.4, 0.02, 'handbook'),
    concentration: fitted(0.01507),
    'sample.volume': knownWithin(25, 0.03, 'pipette 25 mL'),
    'titrant.concentration': bottle12.strength,
    'titrant.carbonate': bottle12.carbonate,
    'burette.gain': burette7.gain,
    'reading.offset': known(0, 0.01, 'calibration of the morning'),
  };
  const run = titrate(
    {
      sample: buildSample({
        volume_mL: q['sample.volume'].truth,
        analytes: [
          {
            pKa: [q.pKa1.truth, q.pKa2.truth, q.pKa3.truth],
            chargeFullyProtonated: 0,
            protonsLostAsWeighed: 0,
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
      extraWater_mL: 20,
      medium: waterAt25,
      buretteGain: q['burette.gain'].truth,
      reading: { kind: 'pH', scale: 'activity', offset: q['reading.offset'].truth },
      errors: { seed: 102, uReading: 0.005, uSetting_mL: burette7.uSetting_mL },
    },
    { last_mL: 14, smallest_mL: 0.02, largest_mL: 0.25, aim_pH: 0.12 },
  );
  const german = (value: number, digits: number) => value.toFixed(digits).replace('.', ',');
  const rows = Array.from(
    run.volumes_mL,
    (volume, i) => `${i + 1};${german(volume, 3)};${german(run.readings[i], 3)};${german(25 + (i % 2) / 10, 1)}`,
  );
  return {
    file: 'citric-acid.csv',
    exported: ['Nr.;Volumen [mL];pH-Wert;Temperatur [°C]', ...rows, ''].join('\r\n'),
    truth: truthOf(q),
    sheet: {
      sheet: 1,
      sample: {
        volume_mL: q['sample.volume'].declared,
        extraWater_mL: 20,
        strongIon_M: 0,
        carbonate_M: 0,
        background_M: 0,
        analytes: [
          {
            name: 'citric acid',
            groups: 3,
            chargeFullyProtonated: 0,
            protonsLostAsWeighed: 0,
            concentration_M: q.concentration.declared,
            pKa: [q.pKa1.declared, q.pKa2.declared, q.pKa3.declared],
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
      reading: { kind: 'pH', scale: 'activity', offset: q['reading.offset'].declared, slope: 1 },
    },
  };
}
