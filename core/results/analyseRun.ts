import { type ShapeOfRun, shapeOfRun } from '../endpoints/shapeOfRun.ts';
import { type FitFromScratch, fitFromScratch } from '../fit/fitFromScratch.ts';
import { chooseGroups, type Ladder } from '../inference/chooseGroups.ts';
import { buildProblem } from '../model/problem.ts';
import type { Outcome } from '../notice/outcome.ts';
import type { Run } from '../run/run.ts';
import { completeSheet } from '../sheet/completeSheet.ts';
import type { RunFacts } from '../sheet/runFacts.ts';
import type { Sheet } from '../sheet/sheet.ts';
import type { SheetFile } from '../sheet/sheetFile.ts';
import { describeFittedRun } from './describeFittedRun.ts';
import { describeUnfittedRun } from './describeUnfittedRun.ts';
import { directionOfTitrant } from './directionOfTitrant.ts';
import { endingOfFit, obstacleToFit, sparePoints, tooFewPoints } from './endingOfRun.ts';
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
  const facts = (groupsIfOpen: number): RunFacts => ({
    readingKind: run.readingKind,
    titrantKind: directionOfTitrant(shape, sheetFile.reading?.kind ?? run.readingKind),
    groupsIfOpen,
  });
  const complete = completeSheet(sheetFile, facts(1));
  if (!complete.ok) return complete;
  const sheet = complete.value;

  const obstacle = obstacleToFit(run, used, shape, sheet);
  if (obstacle !== null) return { ok: true, value: describeUnfittedRun(run, sheet, used, shape, obstacle) };

  if (sheet.sample.analytes.some((analyte) => analyte.groups.assumed)) {
    const sheetWith = (groups: number): Sheet => {
      const again = completeSheet(sheetFile, facts(groups));
      if (!again.ok) throw new Error('a sheet does not become contradictory by its number of groups');
      return again.value;
    };
    const climb = chooseGroups(sheetWith, used.volumes, used.readings);
    let ladder: Ladder | null = null;
    while (ladder === null) {
      const step = climb.next();
      if (step.done === true) ladder = step.value;
      else yield { doing: `fitting ${step.value} groups`, share: (1 + step.value) / 8 };
    }
    const { chosen } = ladder;
    if (chosen.fitted === null) {
      const needed = chosen.parameters + sparePoints;
      return {
        ok: true,
        value: describeUnfittedRun(run, sheet, used, shape, tooFewPoints(used.volumes.length, needed)),
      };
    }
    return { ok: true, value: conclude(run, chosen.sheet, used, shape, chosen.fitted, ladder) };
  }

  yield { doing: 'fitting', share: 0.2 };
  const problem = buildProblem([{ sheet, volumes: used.volumes, readings: used.readings }]);
  if (!problem.ok) return problem;
  return { ok: true, value: conclude(run, sheet, used, shape, fitFromScratch(problem.value), null) };
}

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
    : describeUnfittedRun(run, sheet, used, shape, ending);
}
