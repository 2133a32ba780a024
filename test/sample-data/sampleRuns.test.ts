import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { estimateCovariance } from '../../core/fit/covariance.ts';
import { parameterGradient, uncertaintyOf } from '../../core/fit/uncertaintyOf.ts';
import { buildProblem } from '../../core/model/problem.ts';
import { RunModel } from '../../core/model/runModel.ts';
import type { RunResult } from '../../core/results/runResult.ts';
import { readRuns } from '../../core/run/readRuns.ts';
import { parseSheet } from '../../core/sheet/parseSheet.ts';
import truths from '../../sample-data/truth.json';
import { workUp } from '../experiment.ts';

const contentsOf = (name: string) => readFileSync(fileURLToPath(new URL(`../../sample-data/${name}`, import.meta.url)));

/** Reading noise in the unit of the run, and error of every volume, that the data were made with (see their README). */
const trueNoise: Record<string, number> = {
  'om-217.csv': 0.004,
  'citric-acid.csv': 0.005,
  'phthalate.txt': 0.003,
  'washing-soda.csv': 0.005,
  'strong-acid-mv.csv': 0.3,
};
const trueSetting_mL = 0.003;

function sampleResult(name: string): RunResult {
  const runs = readRuns(contentsOf(name), name);
  const sheetName = name.replace(/\.\w+$/, '.sheet.json');
  const sheet = parseSheet(contentsOf(sheetName).toString('utf8'), sheetName);
  if (!runs.ok || !sheet.ok) throw new Error(`${name} or its sheet is refused`);
  return workUp(runs.value[0], sheet.value);
}

/**
 * What the noise allows at best: the Cramér–Rao value of every fitted quantity,
 * from the derivatives at the truth, the noise that the data were made with,
 * and what the sheet declares as known.
 */
function smallestUncertainties(result: RunResult, truth: Record<string, number>, reading: number): Map<string, number> {
  const volumes = Float64Array.from(result.points, (point) => point.volume_mL);
  const readings = Float64Array.from(result.points, (point) => point.reading);
  const problem = buildProblem([{ sheet: result.sheet, volumes, readings }]);
  if (!problem.ok) throw new Error('problem refused');
  const { runs, parameters } = problem.value;
  const [run] = runs;
  const { quantities } = run.design;
  const values = Float64Array.from(quantities, ({ id, declaration }) =>
    id in truth ? truth[id] : declaration.state === 'fitted' ? Number.NaN : declaration.value,
  );
  const model = new RunModel(run.design, volumes, readings);
  if (!model.predict(values, new Float64Array(volumes.length))) throw new Error('no curve at the truth');
  const count = volumes.length;
  const derivatives = new Float64Array(quantities.length * count);
  const slopes = new Float64Array(count);
  model.differentiate(Int32Array.from(quantities.keys()), derivatives, slopes);
  const rows = count + parameters.filter(({ kind }) => kind === 'knowledge').length;
  const jacobian = new Float64Array(rows * parameters.length);
  for (let i = 0; i < count; i++) {
    const sigma = Math.hypot(reading, trueSetting_mL * slopes[i]);
    const byQuantity = Float64Array.from(quantities, (_, q) => derivatives[q * count + i] / sigma);
    parameterGradient(run, byQuantity, parameters.length).forEach((derivative, j) => {
      jacobian[j * rows + i] = derivative;
    });
  }
  let row = count;
  parameters.forEach(({ kind }, j) => {
    if (kind === 'knowledge') jacobian[j * rows + row++] = 1;
  });
  const covariance = estimateCovariance(jacobian, rows, parameters.length);
  return new Map(
    quantities.flatMap(({ id }, q): [string, number][] => {
      const unit = new Float64Array(quantities.length);
      unit[q] = 1;
      const u = uncertaintyOf(covariance, parameterGradient(run, unit, parameters.length));
      return u === null || u === 0 ? [] : [[id, u]];
    }),
  );
}

/** Squared length of a vector in units of its covariance (correlations and uncertainties), by Gaussian elimination. */
function mahalanobis(deviations: readonly number[], covariance: readonly (readonly number[])[]): number {
  const rows = covariance.map((row, i) => [...row, deviations[i]]);
  for (let k = 0; k < rows.length; k++)
    for (let i = k + 1; i < rows.length; i++) {
      const factor = rows[i][k] / rows[k][k];
      for (let j = k; j <= rows.length; j++) rows[i][j] -= factor * rows[k][j];
    }
  // L D Lᵀ: the eliminated right-hand side squared over the pivots.
  return rows.reduce((sum, row, k) => sum + row[rows.length] ** 2 / row[k], 0);
}

describe.each(Object.keys(truths))('%s', (name) => {
  const result = sampleResult(name);
  const truth: Record<string, number> = truths[name as keyof typeof truths];

  it('is fitted, and gives its truth within three standard uncertainties', () => {
    expect(result.ending.code).toBe('fitted');
    for (const { id, state, value, u } of result.quantities) {
      if (state !== 'fitted' && state !== 'known') continue;
      expect(Math.abs((value ?? Number.NaN) - truth[id]) / (u ?? Number.NaN), id).toBeLessThan(3);
    }
  });

  it('gives all of them together within what their correlation allows', () => {
    const { ids, matrix } = result.correlation;
    const fitted = ids.filter((id) =>
      result.quantities.some((quantity) => quantity.id === id && quantity.state === 'fitted'),
    );
    const find = (id: string) => result.quantities.find((quantity) => quantity.id === id);
    const deviations = fitted.map((id) => (find(id)?.value ?? Number.NaN) - truth[id]);
    const covariance = fitted.map((a) =>
      fitted.map(
        (b) => (matrix[ids.indexOf(a) * ids.length + ids.indexOf(b)] ?? 0) * (find(a)?.u ?? 0) * (find(b)?.u ?? 0),
      ),
    );
    // Chi-square of four quantities, the most there are, exceeds 16.25 as seldom as one quantity exceeds 3 u.
    expect(fitted.length).toBeLessThanOrEqual(4);
    expect(mahalanobis(deviations, covariance)).toBeLessThan(16.25);
  });

  it('has uncertainties between what the noise allows and 1.5 times that', () => {
    const smallest = smallestUncertainties(result, truth, trueNoise[name]);
    for (const { id, state, u } of result.quantities) {
      if (state !== 'fitted') continue;
      const ratio = (u ?? Number.NaN) / (smallest.get(id) ?? Number.NaN);
      expect(ratio, id).toBeLessThan(1.5);
      // Weights from slopes at the readings scatter a little; estimated noise by 8 %.
      expect(ratio, id).toBeGreaterThan(0.8);
    }
  });

  it('raises no doubt but that of what its sheet leaves out', () => {
    for (const doubt of result.doubts) {
      expect(doubt.code).toBe('rests-on-assumption');
      expect(doubt.seen).toContain('pKw');
    }
  });
});
