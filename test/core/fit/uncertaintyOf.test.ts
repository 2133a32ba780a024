import { describe, expect, it } from 'vitest';
import { estimateCovariance } from '../../../core/fit/covariance.ts';
import { covarianceBetween, parameterGradient, uncertaintyOf } from '../../../core/fit/uncertaintyOf.ts';
import { experimentProblem } from '../../experiment.ts';

/** Residuals (p₁ + p₂, p₁ − p₂, 2 p₃): covariance ½, ½ and ¼ on the diagonal, nothing beside it. */
const determined = estimateCovariance(Float64Array.of(1, 1, 0, 1, -1, 0, 0, 0, 2), 3, 3);
/** Residuals (p₁ + p₂, p₁ + p₂, p₃): only the sum of the first two shows. */
const ratioOnly = estimateCovariance(Float64Array.of(1, 1, 0, 1, 1, 0, 0, 0, 1), 3, 3);

describe('the uncertainty of a function of the parameters', () => {
  it('follows from its gradient', () => {
    // Var(3 p₁ + 4 p₃) = 9/2 + 16/4.
    expect(uncertaintyOf(determined, Float64Array.of(3, 0, 4))).toBeCloseTo(Math.sqrt(8.5), 12);
    expect(uncertaintyOf(determined, new Float64Array(3))).toBe(0);
    expect(covarianceBetween(determined, Float64Array.of(1, 1, 0), Float64Array.of(1, -1, 0))).toBeCloseTo(0, 12);
    expect(covarianceBetween(determined, Float64Array.of(1, 0, 1), Float64Array.of(2, 0, 1))).toBeCloseTo(1.25, 12);
  });

  it('is null for what the data leave open, and for that alone', () => {
    expect(uncertaintyOf(ratioOnly, Float64Array.of(1, 0, 0))).toBeNull();
    expect(uncertaintyOf(ratioOnly, Float64Array.of(1, -1, 0))).toBeNull();
    // The sum shows twice: variance ½.
    expect(uncertaintyOf(ratioOnly, Float64Array.of(1, 1, 0))).toBeCloseTo(Math.sqrt(0.5), 12);
    expect(uncertaintyOf(ratioOnly, Float64Array.of(0, 0, 1))).toBeCloseTo(1, 12);
    expect(covarianceBetween(ratioOnly, Float64Array.of(0, 0, 1), Float64Array.of(1, 0, 0))).toBeNull();
  });
});

describe('a gradient with respect to the parameters', () => {
  it('passes every quantity through its binding, and adds up what shares a source', () => {
    const source = 'one balance';
    const [run] = experimentProblem(
      { pKa: [4.8], end_mL: 3.6, points: 10 },
      {
        sample: { volume_mL: { value: 25, u: 0.01, source } },
        titrant: { concentration_M: { value: 0.1, u: 0.0002, source } },
      },
    ).runs;
    const position = (id: string) => run.design.quantities.findIndex((quantity) => quantity.id === id);
    const byQuantity = new Float64Array(run.design.quantities.length);
    byQuantity[position('pKa1')] = 5;
    byQuantity[position('sample.volume')] = 2;
    byQuantity[position('titrant.concentration')] = 30;
    // A fixed quantity has no parameter: its derivative goes nowhere.
    byQuantity[position('medium.pKw')] = 7;
    const gradient = parameterGradient(run, byQuantity, 3);
    expect(Array.from(gradient).sort((a, b) => a - b)).toEqual([0, 2 * 0.01 + 30 * 0.0002, 5]);
  });
});
