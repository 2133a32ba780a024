import type { ProblemFit } from '../fit/fitProblem.ts';
import { parameterGradient, uncertaintyOf } from '../fit/uncertaintyOf.ts';
import type { WeightedRun } from '../fit/weightedProblem.ts';
import { sharesOf } from '../inference/shares.ts';
import { equivalenceVolumes } from '../model/equivalenceVolumes.ts';
import { numberOrNull } from './numberOrNull.ts';
import type { EquivalenceResult } from './runResult.ts';
import type { StepsOfReadings } from './stepsOfReadings.ts';

/** Equivalence volumes of every step by the fit. */
export function equivalenceByFit(fit: ProblemFit, weighted: WeightedRun): EquivalenceResult[] {
  return equivalenceVolumes(weighted.run.design, weighted.values).map((found) => {
    const gradient = parameterGradient(weighted.run, found.gradient, fit.weighted.parameterCount);
    const u = uncertaintyOf(fit.covariance, gradient);
    // Where nothing that moves has an influence, the volume is as fixed as what it follows from.
    const isMoved = gradient.some((g) => g !== 0);
    return {
      analyte: found.analyte,
      step: found.step,
      volume_mL: u === null ? null : numberOrNull(found.volume_mL),
      u: u === null || !isMoved ? null : numberOrNull(u),
      by: 'fit' as const,
      shares: u === null || !isMoved ? [] : sharesOf(fit, gradient),
      remark: found.countedAs,
    };
  });
}

/** How far a step of the readings may lie from the fitted one it is named after: a tenth of the volume, and of 1 mL at least. */
const namingReach = 0.1;

interface StepName {
  readonly analyte: string;
  readonly step: number;
}

/**
 * Names the steps of the readings after the fitted ones they lie nearest to:
 * an inflection may lie off its equivalence point, but not as far as the next
 * step. A fitted step gives its name once; a step that gets none keeps its own
 * number and no analyte. Gran lines have the name of the step they lead to.
 *
 * @param volumes of the points from which the steps were read, mL
 */
export function equivalenceByReadings(
  { derivative, gran }: StepsOfReadings,
  fitted: readonly EquivalenceResult[],
  volumes: Float64Array,
): EquivalenceResult[] {
  const names = nameSteps(
    derivative.map((step) => step.volume_mL),
    fitted,
  );
  const results: EquivalenceResult[] = derivative.map((step, index) => {
    const [from, to] = step.pointsUsed.map((i) => volumes[i]);
    const pointsUsed = volumes.filter((volume) => volume >= from && volume <= to).length;
    return {
      ...names[index],
      volume_mL: step.volume_mL,
      u: step.u_mL,
      by: 'derivative' as const,
      shares: [],
      remark: `steepest point; ${describeRange(pointsUsed, from, to)}`,
    };
  });
  for (const line of gran) {
    if (line.volume_mL === null) continue;
    results.push({
      ...names[line.step - 1],
      volume_mL: line.volume_mL,
      u: line.u_mL,
      by: 'gran',
      shares: [],
      remark: `${line.kind}; ${describeRange(line.pointsUsed, ...line.range_mL)}`,
    });
  }
  return results;
}

function describeRange(points: number, from: number, to: number): string {
  return `${points} points from ${from.toFixed(3)} to ${to.toFixed(3)} mL`;
}

function nameSteps(volumes: readonly number[], fitted: readonly EquivalenceResult[]): StepName[] {
  const names: StepName[] = volumes.map((_, index) => ({ analyte: '', step: index + 1 }));
  const pairs = volumes.flatMap((volume, index) =>
    fitted.flatMap((name) => {
      const distance = Math.abs((name.volume_mL ?? Number.POSITIVE_INFINITY) - volume);
      return distance < namingReach * Math.max(volume, 1) ? [{ index, name, distance }] : [];
    }),
  );
  const named = new Set<number>();
  const given = new Set<EquivalenceResult>();
  for (const { index, name } of pairs.sort((a, b) => a.distance - b.distance)) {
    if (named.has(index) || given.has(name)) continue;
    names[index] = { analyte: name.analyte, step: name.step };
    named.add(index);
    given.add(name);
  }
  return names;
}
