import { estimateCovariance } from '../../core/fit/covariance.ts';
import { fitFromScratch } from '../../core/fit/fitFromScratch.ts';
import { endings } from '../../core/fit/leastSquaresEnding.ts';
import { WeightedProblem } from '../../core/fit/weightedProblem.ts';
import { settledFit } from '../../core/inference/settledFit.ts';
import { buildProblem, type Problem } from '../../core/model/problem.ts';
import { completeSheet } from '../../core/sheet/completeSheet.ts';
import { seededNoise } from '../simulator/seededNoise.ts';
import { simulateRun } from '../simulator/simulateRun.ts';
import { fittedTruth, type StudyDesign, studyInput, studySheet } from './studyDesigns.ts';

/** What the runs of one design say of one quantity. */
export interface QuantityCoverage {
  readonly id: string;
  readonly truth: number;
  /** Runs with an interval or a bound. */
  readonly stated: number;
  /** Of these: two-sided, and true. */
  readonly twoSided: number;
  readonly holds: number;
  /** Median of u over the Cramér–Rao limit; null where fewer than half of the runs give one. */
  readonly uOverLimit: number | null;
  readonly bounds: readonly { readonly seed: number; readonly lower: number | null; readonly upper: number | null }[];
}

export interface DesignCoverage {
  readonly design: StudyDesign;
  readonly runs: number;
  /** Runs that were not fitted. */
  readonly failed: number;
  readonly quantities: readonly QuantityCoverage[];
}

/** The problem of one run of a design. */
export function studyProblem(design: StudyDesign, seed: number): Problem {
  const simulated = simulateRun(studyInput(design, seed));
  const drawn = seededNoise(seed + 7_000_000);
  const sheet = studySheet(design, () => drawn.normal());
  return declared(sheet, simulated.volumes_mL, simulated.readings);
}

function declared(sheet: ReturnType<typeof studySheet>, volumes: Float64Array, readings: Float64Array): Problem {
  const complete = completeSheet(sheet, { readingKind: 'pH', titrantKind: 'base', groupsIfOpen: 1 });
  if (!complete.ok) throw new Error(JSON.stringify(complete.refusals));
  const problem = buildProblem([{ sheet: complete.value, volumes, readings }]);
  if (!problem.ok) throw new Error(JSON.stringify(problem.refusals));
  return problem.value;
}

/** Standard uncertainties by id that no unbiased estimate can undercut, with the true noise and values. */
function cramerRaoLimits(design: StudyDesign): Map<string, number> {
  const simulated = simulateRun(studyInput(design, null));
  const problem = declared(
    studySheet(design, () => 0),
    simulated.volumes_mL,
    simulated.readings,
  );
  const weighted = new WeightedProblem(problem);
  const truth = fittedTruth(design);
  const parameters = Float64Array.from(problem.parameters, ({ kind, id }) => (kind === 'fitted' ? truth[id] : 0));
  const residuals = new Float64Array(weighted.residualCount);
  const jacobian = new Float64Array(weighted.residualCount * weighted.parameterCount);
  weighted.residuals(parameters, residuals);
  const noise = { reading: design.uReading, setting_mL: design.uSetting_mL, dose_mL: design.uDose_mL };
  weighted.weigh([noise], 1);
  weighted.residuals(parameters, residuals);
  weighted.derivatives(parameters, jacobian);
  const { covariance } = estimateCovariance(jacobian, weighted.residualCount, weighted.parameterCount);
  return new Map(
    problem.parameters.map(({ id }, j) => [id, Math.sqrt(covariance[j * weighted.parameterCount + j])] as const),
  );
}

/** Fits `runs` runs of a design and counts how often its 95 % statements are true. */
export function coverageOf(design: StudyDesign, runs: number, firstSeed: number): DesignCoverage {
  const truth = fittedTruth(design);
  const limits = cramerRaoLimits(design);
  const tally = new Map(
    Object.keys(truth).map((id) => [
      id,
      { stated: 0, twoSided: 0, holds: 0, ratios: [] as number[], bounds: [] as QuantityCoverage['bounds'][number][] },
    ]),
  );
  let failed = 0;
  for (let seed = firstSeed; seed < firstSeed + runs; seed++) {
    const { fit: first } = fitFromScratch(studyProblem(design, seed));
    if (!endings[first.ending].usable) {
      failed++;
      continue;
    }
    const { fit, intervals } = settledFit(first, 0);
    fit.weighted.runs[0].run.design.quantities.forEach(({ id }, q) => {
      const entry = tally.get(id);
      const found = intervals.quantities[q];
      if (entry === undefined || found === null) return;
      const [lower, upper] = found.interval;
      if (lower === null && upper === null) return;
      entry.stated++;
      if ((lower === null || lower <= truth[id]) && (upper === null || truth[id] <= upper)) entry.holds++;
      if (lower === null || upper === null) entry.bounds.push({ seed, lower, upper });
      else {
        entry.twoSided++;
        entry.ratios.push((found.u ?? Number.NaN) / (limits.get(id) ?? Number.NaN));
      }
    });
  }
  return {
    design,
    runs,
    failed,
    quantities: [...tally].map(([id, { ratios, ...counts }]) => ({
      id,
      truth: truth[id],
      ...counts,
      uOverLimit: ratios.length * 2 < runs ? null : ratios.sort((a, b) => a - b)[ratios.length >> 1],
    })),
  };
}
