import { buildBaseTitrant, buildSample } from '../../test/simulator/buildVessels.ts';
import { carbonicPKaAt25, type SampleRun, titrate, waterAt25 } from '../sampleRun.ts';
import { sharedEquipment } from '../sharedEquipment.ts';
import { fitted, fixed, known, knownWithin, truthOf } from '../told.ts';

const { bottle12, burette7 } = sharedEquipment;

/** An ampholyte of three groups, weighed as its dihydrochloride; lines above a comma-separated table. */
export function newCompound(): SampleRun {
  const q = {
    pKa1: fitted(2.93),
    pKa2: fitted(6.41),
    pKa3: fitted(9.52),
    concentration: fitted(0.01184),
    'sample.volume': knownWithin(25, 0.03, 'pipette 25 mL'),
    'sample.background': fixed(0.1),
    'titrant.concentration': bottle12.strength,
    'titrant.carbonate': bottle12.carbonate,
    'burette.gain': burette7.gain,
    'reading.offset': known(0, 0.01, 'calibration of the morning'),
  };
  const run = titrate(
    {
      sample: buildSample({
        volume_mL: q['sample.volume'].truth,
        background_M: q['sample.background'].truth,
        analytes: [
          {
            pKa: [q.pKa1.truth, q.pKa2.truth, q.pKa3.truth],
            chargeFullyProtonated: 2,
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
      medium: waterAt25,
      buretteGain: q['burette.gain'].truth,
      reading: { kind: 'pH', scale: 'activity', offset: q['reading.offset'].truth },
      errors: { seed: 101, uReading: 0.004, uSetting_mL: burette7.uSetting_mL },
    },
    { last_mL: 11, smallest_mL: 0.02, largest_mL: 0.2, aim_pH: 0.12 },
  );
  const rows = Array.from(run.volumes_mL, (volume, i) => {
    const time_s = 12 + 31 * i + (i % 4) * 3;
    return `${i + 1},${time_s},${volume.toFixed(3)},${run.readings[i].toFixed(3)},25.${i % 3}`;
  });
  const exported = [
    'Osterwick Mill Laboratory',
    'Method: alkalimetric titration under argon',
    'Sample: OM-217 dihydrochloride in 0.1 mol/L KCl',
    'Sample volume: 25.00 mL',
    'Titrant: NaOH 0.1 mol/L bottle 12',
    '',
    'Point,Time (s),Volume (mL),pH,Temperature (°C)',
    ...rows,
    '',
  ].join('\n');
  return {
    file: 'om-217.csv',
    exported,
    truth: truthOf(q),
    sheet: {
      sheet: 1,
      sample: {
        volume_mL: q['sample.volume'].declared,
        extraWater_mL: 0,
        strongIon_M: 0,
        carbonate_M: 0,
        background_M: q['sample.background'].declared,
        analytes: [
          {
            name: 'OM-217',
            groups: 3,
            chargeFullyProtonated: 2,
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
      medium: { temperature_C: 25, activity: 'davies', pKw: waterAt25.pKw },
      reading: { kind: 'pH', scale: 'activity', offset: q['reading.offset'].declared, slope: 1, u: 0.004 },
    },
  };
}
