import { describe, expect, it } from 'vitest';
import { fitFromScratch } from '../../core/fit/fitFromScratch.ts';
import { endings } from '../../core/fit/leastSquaresEnding.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { declare, problemOf } from '../laws/simulatedDesign.ts';
import runDocument from './fit-runs.json' with { type: 'json' };
import fitDocument from './fits.json' with { type: 'json' };

/** Estimates in the units of the quantities, with their covariance, by the ids of `ids`. */
interface Answer {
  readonly estimates: readonly number[];
  readonly covariance: readonly (readonly number[])[];
}

interface ReferenceFit {
  readonly name: string;
  readonly ids: readonly string[];
  readonly odr?: Answer;
  readonly leastSquares?: Answer;
  readonly generalised?: Answer;
}

const references: readonly ReferenceFit[] = fitDocument.fits;

/** The program's own answer for a run, its quantities in the order asked for. */
function ownAnswer(name: string, ids: readonly string[]): Answer {
  const run = runDocument.runs.find((candidate) => candidate.name === name);
  if (run === undefined) throw new Error(`no run is named ${name}`);
  const problem = problemOf([
    declare(run.sheet as unknown as SheetFile, Float64Array.from(run.volumes_mL), Float64Array.from(run.readings)),
  ]);
  const { fit } = fitFromScratch(problem);
  expect(endings[fit.ending].usable).toBe(true);
  expect(ids.length).toBe(problem.parameters.length);
  const [{ bindings, design }] = problem.runs;
  const places = ids.map((id) => {
    const binding = bindings[design.quantities.findIndex((quantity) => quantity.id === id)];
    if (binding.kind === 'parameter') return { parameter: binding.parameter, origin: 0, scale: 1 };
    if (binding.kind === 'known')
      return { parameter: binding.terms[0].parameter, origin: binding.nominal, scale: binding.terms[0].sensitivity };
    throw new Error(`${id} is fixed`);
  });
  return {
    estimates: places.map(({ parameter, origin, scale }) => origin + scale * fit.parameters[parameter]),
    covariance: places.map((a) =>
      places.map(
        (b) => a.scale * b.scale * fit.covariance.covariance[a.parameter * problem.parameters.length + b.parameter],
      ),
    ),
  };
}

const uncertainty = ({ covariance }: Answer, j: number) => Math.sqrt(covariance[j][j]);

/** Largest difference of two estimates, in the reference's standard uncertainties. */
function largestShift(own: Answer, reference: Answer): number {
  return Math.max(
    ...own.estimates.map((value, j) => Math.abs(value - reference.estimates[j]) / uncertainty(reference, j)),
  );
}

/** Largest difference of two standard uncertainties, relative. */
function largestUncertaintyError(own: Answer, reference: Answer): number {
  return Math.max(...own.estimates.map((_, j) => Math.abs(uncertainty(own, j) / uncertainty(reference, j) - 1)));
}

/** Largest difference of two covariances, relative to the product of both standard uncertainties. */
function largestCovarianceError(own: Answer, reference: Answer): number {
  return Math.max(
    ...own.covariance.flatMap((row, i) =>
      row.map(
        (value, j) =>
          Math.abs(value - reference.covariance[i][j]) / (uncertainty(reference, i) * uncertainty(reference, j)),
      ),
    ),
  );
}

const independent = references.filter((fit) => fit.odr !== undefined && fit.leastSquares !== undefined);
const accumulated = references.filter((fit) => fit.generalised !== undefined);

describe('independent errors', () => {
  it('are compared on at least six runs', () => {
    expect(independent.length).toBeGreaterThanOrEqual(6);
  });

  it.each(independent)('agree with orthogonal distance regression: $name', ({ name, ids, odr }) => {
    if (odr === undefined) throw new Error('filtered above');
    const own = ownAnswer(name, ids);
    // Both are the maximum of the same likelihood, to first order in the errors.
    expect(largestShift(own, odr)).toBeLessThan(0.2);
    expect(largestUncertaintyError(own, odr)).toBeLessThan(0.02);
  });

  it.each(independent)('agree with least squares of the same weights: $name', ({ name, ids, leastSquares }) => {
    if (leastSquares === undefined) throw new Error('filtered above');
    const own = ownAnswer(name, ids);
    // The weights follow the solution until it stands still to 1e-4 of a standard uncertainty.
    expect(largestCovarianceError(own, leastSquares)).toBeLessThan(0.005);
    expect(largestShift(own, leastSquares)).toBeLessThan(1e-3);
  });
});

describe('accumulated errors', () => {
  it.each(accumulated)('agree with dense generalised least squares: $name', ({ name, ids, generalised }) => {
    if (generalised === undefined) throw new Error('filtered above');
    const own = ownAnswer(name, ids);
    // The same covariance matrix, taken apart in another way: what differs is where the weights stood still.
    expect(largestShift(own, generalised)).toBeLessThan(1e-4);
    expect(largestCovarianceError(own, generalised)).toBeLessThan(1e-3);
  });
});
