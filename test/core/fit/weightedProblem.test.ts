import { describe, expect, it } from 'vitest';
import { WeightedProblem } from '../../../core/fit/weightedProblem.ts';
import { type Experiment, experimentProblem, perform, problemOf, sheetOf } from '../../experiment.ts';

const acid: Experiment = { pKa: [4.8], end_mL: 3.6, points: 20 };
const start = (problem: { parameters: readonly { id: string; kind: string }[] }) =>
  Float64Array.from(problem.parameters, ({ id, kind }) => (kind === 'knowledge' ? 0.5 : id === 'pKa1' ? 4.7 : 0.0101));

describe('residuals', () => {
  it('are (model − reading) / sigma, and zero at the truth of a run without noise', () => {
    const problem = experimentProblem(acid);
    const weighted = new WeightedProblem(problem);
    const [run] = weighted.runs;
    // Points of different weight: the volume error counts along made-up slopes.
    run.whitening.set(
      { reading: 0.01, setting_mL: 0.02, dose_mL: 0 },
      Float64Array.from(run.predicted, (_, i) => i),
    );
    const residuals = new Float64Array(weighted.residualCount);
    expect(weighted.residuals(Float64Array.of(4.8, 0.01), residuals)).toBe(true);
    // Solver and simulator agree to 1e-9 in pH away from the step; the sigma of a point is 0.01 at least.
    for (const residual of residuals) expect(Math.abs(residual)).toBeLessThan(1e-5);
    expect(weighted.residuals(Float64Array.of(4.9, 0.01), residuals)).toBe(true);
    residuals.forEach((residual, i) => {
      expect(residual).toBeCloseTo((run.predicted[i] - run.run.readings[i]) / Math.hypot(0.01, 0.02 * i), 12);
    });
    // A higher constant means a higher curve in the buffer region.
    expect(residuals[5]).toBeGreaterThan(0.5);
  });

  it('of declared knowledge follow those of the readings, with a weight of one', () => {
    const problem = experimentProblem(acid, {
      titrant: { concentration_M: { value: 0.1, u: 0.0002 } },
      burette: { gain: { value: 1, u: 0.001 } },
    });
    const weighted = new WeightedProblem(problem);
    expect([weighted.readingCount, weighted.residualCount]).toEqual([20, 22]);
    const parameters = start(problem);
    const residuals = new Float64Array(22);
    weighted.residuals(parameters, residuals);
    expect(Array.from(residuals.subarray(20))).toEqual([0.5, 0.5]);
    const [{ values, run }] = weighted.runs;
    const valueBound = (id: string) => values[run.design.quantities.findIndex((quantity) => quantity.id === id)];
    expect(valueBound('titrant.concentration')).toBeCloseTo(0.1001, 12);
    expect(valueBound('burette.gain')).toBeCloseTo(1.0005, 12);
  });

  it('are refused where the parameters describe no mixture', () => {
    const weighted = new WeightedProblem(experimentProblem(acid));
    expect(weighted.residuals(Float64Array.of(Number.NaN, 0.01), new Float64Array(20))).toBe(false);
  });
});

describe('derivatives', () => {
  it('agree with differences of the residuals, shared sources in two runs included', () => {
    const titrant = { concentration_M: { value: 0.1, u: 0.0005, source: 'standardisation' } };
    const problem = problemOf(
      [0.01, 0.012].map((concentration_M) => {
        const experiment = { ...acid, concentration_M };
        return { run: perform(experiment), sheet: sheetOf(experiment, { titrant }) };
      }),
      ['pKa1'],
    );
    expect(problem.parameters.map(({ id }) => id).sort()).toEqual([
      'concentration',
      'concentration',
      'pKa1',
      'standardisation',
    ]);
    const weighted = new WeightedProblem(problem);
    for (const { whitening, slopes } of weighted.runs)
      whitening.set({ reading: 0.02, setting_mL: 0, dose_mL: 0.001 }, slopes.fill(1));
    const { residualCount, parameterCount } = weighted;
    const at = start(problem);
    const residuals = new Float64Array(residualCount);
    const jacobian = new Float64Array(residualCount * parameterCount);
    weighted.residuals(at, residuals);
    weighted.derivatives(at, jacobian);
    const [above, below] = [new Float64Array(residualCount), new Float64Array(residualCount)];
    for (let j = 0; j < parameterCount; j++) {
      const width = problem.parameters[j].id === 'concentration' ? 1e-7 : 1e-4;
      const moved = at.slice();
      moved[j] = at[j] + width;
      weighted.residuals(moved, above);
      moved[j] = at[j] - width;
      weighted.residuals(moved, below);
      const column = jacobian.subarray(j * residualCount, (j + 1) * residualCount);
      const largest = column.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
      column.forEach((derivative, i) => {
        // Central differences over a ten-thousandth of the curve's scale: the square of it, and rounding.
        expect(Math.abs(derivative - (above[i] - below[i]) / (2 * width)) / largest).toBeLessThan(1e-5);
      });
    }
  });
});

describe('curve and derivatives', () => {
  it('are computed once for one point, and kept when only the weights change', () => {
    const weighted = new WeightedProblem(experimentProblem(acid));
    const at = Float64Array.of(4.7, 0.0101);
    const residuals = new Float64Array(20);
    const jacobian = new Float64Array(40);
    weighted.residuals(at, residuals);
    weighted.derivatives(at, jacobian);
    expect([weighted.curveEvaluations, weighted.derivativeEvaluations]).toEqual([1, 1]);
    const [{ whitening, slopes }] = weighted.runs;
    whitening.set({ reading: 0.5, setting_mL: 0, dose_mL: 0 }, slopes);
    const [again, jacobianAgain] = [new Float64Array(20), new Float64Array(40)];
    weighted.residuals(at, again);
    weighted.derivatives(at, jacobianAgain);
    expect([weighted.curveEvaluations, weighted.derivativeEvaluations]).toEqual([1, 1]);
    // The weights were one, now they are two.
    again.forEach((residual, i) => {
      expect(residual).toBeCloseTo(2 * residuals[i], 12);
    });
    jacobianAgain.forEach((derivative, i) => {
      expect(derivative).toBeCloseTo(2 * jacobian[i], 10);
    });
  });

  it('are computed anew elsewhere, and those kept survive a look at another point', () => {
    const weighted = new WeightedProblem(experimentProblem(acid));
    const at = Float64Array.of(4.7, 0.0101);
    const [first, other, back] = [new Float64Array(20), new Float64Array(20), new Float64Array(20)];
    weighted.residuals(at, first);
    weighted.derivatives(at, new Float64Array(40));
    weighted.residuals(Float64Array.of(5, 0.0101), other);
    expect(weighted.curveEvaluations).toBe(2);
    weighted.residuals(at, back);
    expect(weighted.curveEvaluations).toBe(2);
    expect(back).toEqual(first);
  });
});
