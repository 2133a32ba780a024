import { inverse, Matrix } from 'ml-matrix';
import { buildBaseTitrant, buildSample } from '../simulator/buildVessels.ts';
import { simulateRun } from '../simulator/simulateRun.ts';

/** What the readings of the sample run of the new compound depend on, with what its sheet knows beforehand. */
const quantities = [
  { id: 'pKa1', known: null, step: 1e-3 },
  { id: 'pKa2', known: null, step: 1e-3 },
  { id: 'pKa3', known: null, step: 1e-3 },
  { id: 'concentration', known: null, step: 1e-6 },
  // A triangular tolerance of 0.03 mL.
  { id: 'sample.volume', known: 0.03 / Math.sqrt(6), step: 1e-3 },
  { id: 'titrant.concentration', known: 0.0001, step: 1e-5 },
  { id: 'titrant.carbonate', known: 0.0001, step: 1e-5 },
  { id: 'burette.gain', known: 0.0005, step: 1e-5 },
  { id: 'reading.offset', known: 0.01, step: 1e-4 },
] as const;

/** Standard uncertainties of one reading and of one set volume in that run. */
const uReading = 0.004;
const uSetting_mL = 0.003;

/**
 * The smallest standard uncertainties that the noise of the new compound's run allows (Cramér and Rao), computed with
 * the independent simulator and plain differences, by id.
 */
export function noiseAllows(
  truth: Readonly<Record<string, number>>,
  volumes_mL: readonly number[],
): Map<string, number> {
  const at = (values: Readonly<Record<string, number>>, volumes: readonly number[]) =>
    simulateRun({
      sample: buildSample({
        volume_mL: values['sample.volume'],
        background_M: 0.1,
        analytes: [
          {
            pKa: [values.pKa1, values.pKa2, values.pKa3],
            chargeFullyProtonated: 2,
            protonsLostAsWeighed: 0,
            concentration_M: values.concentration,
          },
        ],
      }),
      titrant: buildBaseTitrant({
        concentration_M: values['titrant.concentration'],
        strengthMeans: 'toHydrogencarbonate',
        carbonate_M: values['titrant.carbonate'],
        carbonicPKa: [6.353, 10.33],
      }),
      medium: { temperature_C: 25, activity: 'davies', debyeHueckelA: 0.5116, pKw: 13.997 },
      buretteGain: values['burette.gain'],
      reading: { kind: 'pH', scale: 'activity', offset: values['reading.offset'] },
      volumes_mL: volumes,
    }).readings;

  const slope = difference(
    at(
      truth,
      volumes_mL.map((v) => v + 1e-4),
    ),
    at(
      truth,
      volumes_mL.map((v) => v - 1e-4),
    ),
    2e-4,
  );
  const sigma = slope.map((perMl) => Math.hypot(uReading, perMl * uSetting_mL));
  const columns = quantities.map(({ id, step }) => {
    const moved = (by: number) => at({ ...truth, [id]: truth[id] + by }, volumes_mL);
    return difference(moved(step), moved(-step), 2 * step).map((derivative, i) => derivative / sigma[i]);
  });
  const information = new Matrix(quantities.length, quantities.length);
  quantities.forEach(({ known }, a) => {
    quantities.forEach((_, b) => {
      let sum = a === b && known !== null ? 1 / known ** 2 : 0;
      for (let i = 0; i < sigma.length; i++) sum += columns[a][i] * columns[b][i];
      information.set(a, b, sum);
    });
  });
  const covariance = inverse(information);
  return new Map(quantities.map(({ id }, a) => [id, Math.sqrt(covariance.get(a, a))]));
}

function difference(above: ArrayLike<number>, below: ArrayLike<number>, width: number): number[] {
  return Array.from(above, (value, i) => (value - below[i]) / width);
}
