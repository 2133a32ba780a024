import type { ProblemFit } from '../fit/fitProblem.ts';
import type { WeightedRun } from '../fit/weightedProblem.ts';
import type { Intervals } from '../inference/intervals.ts';
import type { Run } from '../run/run.ts';
import type { Sheet } from '../sheet/sheet.ts';
import type { Speciation } from '../speciation/speciation.ts';
import type { MisfitCause } from './misfitCauses.ts';
import type { EquivalenceResult, PointResult, QuantityResult, RobustResult } from './runResult.ts';
import type { StepsOfReadings } from './stepsOfReadings.ts';
import type { UsedPoints } from './usedPoints.ts';

/** A fitted run with everything the results and the checks are drawn from. */
export interface Analysis {
  readonly run: Run;
  readonly sheet: Sheet;
  readonly fit: ProblemFit;
  /** Position of the run in the problem of the fit. */
  readonly index: number;
  /** The run inside the fit: its model, curve and weights. */
  readonly weighted: WeightedRun;
  /** The second best minimum in which automatic starts ended; null where there is none. */
  readonly runnerUp: ProblemFit | null;
  readonly intervals: Intervals;
  readonly used: UsedPoints;
  readonly robust: RobustResult | null;
  /** What would explain a misfit; empty where nothing is amiss or nothing explains it. */
  readonly causes: readonly MisfitCause[];
  readonly speciation: Speciation;
  /** Steps of the readings, and of the fitted curve taken at the same volumes. */
  readonly readSteps: StepsOfReadings;
  readonly curveSteps: StepsOfReadings;
  readonly quantities: readonly QuantityResult[];
  readonly equivalence: readonly EquivalenceResult[];
  readonly points: readonly PointResult[];
}
