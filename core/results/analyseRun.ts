import { largestGroupCount } from '../chemistry/protonSystem.ts';
import { type ShapeOfRun, shapeOfRun } from '../endpoints/shapeOfRun.ts';
import { type FitFromScratch, fitFromScratch, objectiveOf } from '../fit/fitFromScratch.ts';
import { fitProblem } from '../fit/fitProblem.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import { type Ladder, ladderOfRun } from '../inference/ladderOfRun.ts';
import { ladderSheets } from '../inference/ladderSheets.ts';
import { buildProblem, type Problem } from '../model/problem.ts';
import type { Outcome } from '../notice/outcome.ts';
import type { Run } from '../run/run.ts';
import { completeSheet } from '../sheet/completeSheet.ts';
import type { Sheet } from '../sheet/sheet.ts';
import type { SheetFile } from '../sheet/sheetFile.ts';
import { describeFittedRun } from './describeFittedRun.ts';
import { describeLadder } from './describeLadder.ts';
import { describeUnfittedRun } from './describeUnfittedRun.ts';
import { directionOfTitrant } from './directionOfTitrant.ts';
import { endingOfFit, obstacleToFit } from './endingOfRun.ts';
import type { Progress } from './progress.ts';
import type { RunResult } from './runResult.ts';
import { type UsedPoints, usedPoints } from './usedPoints.ts';

/**
 * The whole way from a run and what is declared about it to its results.
 *
 * A generator, so that whoever runs it can show progress and stop between two
 * steps. Refuses only a sheet that contradicts itself; a run that cannot be
 * fitted comes back with an ending that says why, and with everything that
 * needs no model.
 */
export function* analyseRun(run: Run, sheetFile: SheetFile): Generator<Progress, Outcome<RunResult>> {
  yield { doing: 'looking at the curve', share: 0 };
  const used = usedPoints(run);
  const shape = shapeOfRun(used.volumes, used.readings);
  const complete = completeSheet(sheetFile, {
    readingKind: run.readingKind,
    titrantKind: directionOfTitrant(shape, sheetFile.reading?.kind ?? run.readingKind),
    groupsIfOpen: fewestGroups(sheetFile),
  });
  if (!complete.ok) return complete;
  const sheet = complete.value;

  const obstacle = obstacleToFit(run, used, shape, sheet);
  if (obstacle !== null) return { ok: true, value: describeUnfittedRun(run, sheet, used, shape, obstacle) };

  const climb = function* (from: number): Generator<Progress, Ladder | null> {
    const work = ladderOfRun(sheet, used.volumes, used.readings);
    for (;;) {
      const step = work.next();
      if (step.done === true) return step.value;
      yield { doing: `comparing with ${step.value} groups`, share: from + (0.5 * step.value) / largestGroupCount };
    }
  };

  if (sheet.sample.analytes.some((analyte) => analyte.groups.assumed)) {
    const ladder = yield* climb(0.1);
    const groups = ladder?.rungs[ladder.chosen].rung.kind.groups ?? 1;
    const sheets = ladderSheets(sheet);
    const chosen = ladder === null ? sheet : sheets.sheetFor(sheets.plain(groups)).sheet;
    yield { doing: 'fitting', share: 0.7 };
    const problem = buildProblem([{ sheet: chosen, volumes: used.volumes, readings: used.readings }]);
    if (!problem.ok) return problem;
    const fitted = fitFromLadder(problem.value, ladder, groups);
    return { ok: true, value: conclude(run, chosen, used, shape, fitted, ladder) };
  }

  yield { doing: 'fitting', share: 0.1 };
  const problem = buildProblem([{ sheet, volumes: used.volumes, readings: used.readings }]);
  if (!problem.ok) return problem;
  const fitted = fitFromScratch(problem.value);
  const isFitted = problem.value.parameters.some(({ kind }) => kind === 'fitted');
  const ladder = isFitted ? yield* climb(0.4) : null;
  return { ok: true, value: conclude(run, sheet, used, shape, fitted, ladder) };
}

/** Groups of a substance whose number is left open, as long as nothing else is known: what it has lost, it must have had. */
function fewestGroups({ sample }: SheetFile): number {
  const open = (sample?.analytes ?? []).filter(({ groups, pKa }) => groups === undefined && pKa === undefined);
  return Math.max(1, ...open.map(({ protonsLostAsWeighed }) => protonsLostAsWeighed ?? 0));
}

/** The fit of a run whose groups were counted first: by itself, or from the end of its rung where that is better. */
function fitFromLadder(problem: Problem, ladder: Ladder | null, groups: number): FitFromScratch {
  const alone = fitFromScratch(problem);
  const plain = ladder?.sheets.plain(groups);
  const end = ladder?.rungs.find(
    ({ rung: { kind } }) =>
      kind.groups === groups && kind.carbonate === plain?.carbonate && kind.excess === plain.excess,
  )?.rung.end;
  if (end === undefined || end === null) return alone;
  const fit = fitProblem(problem, end.parameters);
  const better =
    endings[fit.ending].usable &&
    (!endings[alone.fit.ending].usable || objectiveOf(fit) < objectiveOf(alone.fit) - sameObjective);
  return better ? { fit, runnerUp: alone.fit } : alone;
}

/** Two objectives closer than this are the same minimum. */
const sameObjective = 1e-3;

/** Fitted or not, what is to be said of the run. */
function conclude(
  run: Run,
  sheet: Sheet,
  used: UsedPoints,
  shape: ShapeOfRun,
  fitted: FitFromScratch,
  ladder: Ladder | null,
): RunResult {
  const ending = endingOfFit(fitted, run, shape, sheet);
  return ending.code === 'fitted' || ending.code === 'predicted'
    ? describeFittedRun(run, sheet, used, shape, fitted, ladder, ending)
    : {
        ...describeUnfittedRun(run, sheet, used, shape, ending),
        ladder: ladder === null ? null : describeLadder(ladder),
      };
}
