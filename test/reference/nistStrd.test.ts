import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { covarianceOf, estimateCovariance } from '../../core/fit/covariance.ts';
import { solveLeastSquares } from '../../core/fit/leastSquares.ts';
import { endings } from '../../core/fit/leastSquaresEnding.ts';
import { nistModels } from './nistModels.ts';
import { type NistEntry, nistProblem } from './nistProblem.ts';

// Certified by NIST to 11 digits (source and way of reading with each entry of the file).
const entries: NistEntry[] = JSON.parse(readFileSync(new URL('./nist-strd.json', import.meta.url), 'utf8'));

/** Number of leading digits in which a figure agrees with the certified one (log relative error). */
function matchingDigits(found: number, certified: number): number {
  return found === certified ? 11 : -Math.log10(Math.abs((found - certified) / certified));
}

/** Six digits are what the collection's authors ask of a good program; default tolerances, nothing tuned. */
const PARAMETER_DIGITS = 6;
const DEVIATION_DIGITS = 4;
/**
 * Lanczos1 is exact but for the rounding of its data to 14 digits: its residuals
 * are rounding noise, whose sum of squares the printed figures cannot reproduce.
 */
const LANCZOS1_DEVIATION_DIGITS = 2.5;

describe('certified nonlinear regression problems of NIST', () => {
  it('are all there', () => {
    expect(entries).toHaveLength(27);
  });

  for (const entry of entries) {
    for (const start of ['start1', 'start2'] as const) {
      it(`${entry.name} from ${start}`, () => {
        const { n_obs, n_params, certified_params, certified_sd } = entry;
        const result = solveLeastSquares(nistProblem(entry, nistModels[entry.name]), entry[start]);
        expect(endings[result.ending].usable, result.ending).toBe(true);
        expect(result.rank).toBe(n_params);

        const estimate = estimateCovariance(result.jacobian, n_obs, n_params);
        expect(estimate.rank).toBe(n_params);
        const noise = (result.cost ?? Number.NaN) / (n_obs - n_params);
        certified_params.forEach((certified, j) => {
          expect(matchingDigits(result.parameters[j], certified), `b${j + 1}`).toBeGreaterThanOrEqual(PARAMETER_DIGITS);
          const deviation = Math.sqrt((covarianceOf(estimate, j, j) ?? Number.NaN) * noise);
          expect(matchingDigits(deviation, certified_sd[j]), `deviation of b${j + 1}`).toBeGreaterThanOrEqual(
            entry.name === 'Lanczos1' ? LANCZOS1_DEVIATION_DIGITS : DEVIATION_DIGITS,
          );
        });
      });
    }
  }
});
