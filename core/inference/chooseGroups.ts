import { largestGroupCount } from '../chemistry/protonSystem.ts';
import { type FitFromScratch, fitFromScratch, objectiveOf } from '../fit/fitFromScratch.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import { buildProblem } from '../model/problem.ts';
import type { Sheet } from '../sheet/sheet.ts';

/**
 * A further group must lower AICc by this much to be believed. Differences
 * above 10 leave the poorer model with essentially no support.
 * Source: Burnham, K. P.; Anderson, D. R., Model Selection and Multimodel
 * Inference, 2nd ed., Springer 2002, section 2.6 (from memory).
 */
const decisiveDifference = 10;
/** Rungs climbed without a decisive gain before the ladder ends. */
const rungsWithoutGain = 2;

/** One number of groups, fitted. */
export interface Rung {
  readonly groups: number;
  readonly sheet: Sheet;
  /** Null where the rung could not be fitted. */
  readonly fitted: FitFromScratch | null;
  /** Fitted and known parameters. */
  readonly parameters: number;
  readonly aicc: number | null;
}

export interface Ladder {
  readonly rungs: readonly Rung[];
  readonly chosen: Rung;
}

/**
 * Fits a run with 0, 1, 2 … groups and takes the smallest number that a
 * further group does not improve decisively. Yields the number of groups that
 * is about to be fitted.
 */
export function* chooseGroups(
  sheetWith: (groups: number) => Sheet,
  volumes: Float64Array,
  readings: Float64Array,
): Generator<number, Ladder> {
  const rungs: Rung[] = [];
  let chosen: Rung | null = null;
  for (let groups = 0; groups <= largestGroupCount; groups++) {
    yield groups;
    const rung = fitRung(groups, sheetWith(groups), volumes, readings);
    rungs.push(rung);
    if (chosen === null || isDecisive(rung, chosen)) chosen = rung;
    else if (groups - chosen.groups >= rungsWithoutGain) break;
  }
  if (chosen === null) throw new Error('a ladder has at least one rung');
  return { rungs, chosen };
}

function fitRung(groups: number, sheet: Sheet, volumes: Float64Array, readings: Float64Array): Rung {
  const problem = buildProblem([{ sheet, volumes, readings }]);
  if (!problem.ok) throw new Error('one run with at most six groups is never too large');
  const parameters = problem.value.parameters.length;
  const spare = volumes.length - parameters - 1;
  if (spare <= 0) return { groups, sheet, fitted: null, parameters, aicc: null };
  const fitted = fitFromScratch(problem.value);
  const usable = endings[fitted.fit.ending].usable && fitted.fit.covariance.undetermined.length === 0;
  // Akaike's criterion with the correction for small samples; Hurvich, C. M.; Tsai, C.-L., Biometrika 76 (1989) 297–307.
  const aicc = usable ? objectiveOf(fitted.fit) + 2 * parameters + (2 * parameters * (parameters + 1)) / spare : null;
  return { groups, sheet, fitted, parameters, aicc };
}

function isDecisive(rung: Rung, chosen: Rung): boolean {
  if (rung.aicc === null) return false;
  if (chosen.aicc !== null && rung.aicc > chosen.aicc - decisiveDifference) return false;
  return rung.fitted !== null && isSensible(rung.fitted);
}

/** Whether every group lies where something was read, and there is something of the substance. */
function isSensible({ fit }: FitFromScratch): boolean {
  const [{ run, model, values }] = fit.weighted.runs;
  const logs = model.logHydrogen;
  const lowest = -Math.max(...logs) / Math.LN10;
  const highest = -Math.min(...logs) / Math.LN10;
  return run.design.quantities.every(({ id, role, declaration }, q) => {
    if (declaration.state !== 'fitted') return true;
    if (role.kind === 'acidity') return values[q] > lowest - reach && values[q] < highest + reach;
    return !id.endsWith('concentration') || values[q] > 0;
  });
}

/** A constant this far outside the readings, in pH, still shows in them. */
const reach = 0.7;
