import { fitFromScratch } from '../../core/fit/fitFromScratch.ts';
import { freeze } from '../../core/inference/intervals.ts';
import { settledFit } from '../../core/inference/settledFit.ts';
import { studentQuantile } from '../../core/numerics/studentQuantile.ts';
import type { QuantityCoverage } from './coverageStudy.ts';
import { studyProblem } from './coverageStudy.ts';
import { denseProfileEnd } from './denseProfile.ts';
import type { StudyDesign } from './studyDesigns.ts';

/** Step and reach of the dense profile, in units of a pKa. */
const step = 0.05;
const reach = 12;

/**
 * Distances of bounds from the ends of densely scanned profiles, rising; a
 * bound whose dense profile never closes counts as off by the whole reach.
 * For designs with declared noise, whose threshold is that of the normal
 * distribution.
 */
export function boundErrors(design: StudyDesign, id: string, bounds: QuantityCoverage['bounds']): number[] {
  const threshold = studentQuantile(0.975, Number.POSITIVE_INFINITY) ** 2;
  return bounds
    .map(({ seed, lower, upper }) => {
      const { fit } = settledFit(fitFromScratch(studyProblem(design, seed)).fit, 0);
      const parameter = fit.weighted.problem.parameters.findIndex((candidate) => candidate.id === id);
      const direction = lower === null ? 1 : -1;
      const end = denseProfileEnd(freeze(fit), parameter, threshold, direction, step, reach);
      const bound = lower ?? upper;
      return end === null || bound === null ? reach : Math.abs(end - bound);
    })
    .sort((a, b) => a - b);
}
