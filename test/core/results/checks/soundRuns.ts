import { shapeOfRun } from '../../../../core/endpoints/shapeOfRun.ts';
import { fitFromScratch } from '../../../../core/fit/fitFromScratch.ts';
import { buildProblem } from '../../../../core/model/problem.ts';
import { describeFittedRun } from '../../../../core/results/describeFittedRun.ts';
import { describeUnfittedRun } from '../../../../core/results/describeUnfittedRun.ts';
import { directionOfTitrant } from '../../../../core/results/directionOfTitrant.ts';
import { endingOfFit } from '../../../../core/results/endingOfRun.ts';
import type { RunResult } from '../../../../core/results/runResult.ts';
import { usedPoints } from '../../../../core/results/usedPoints.ts';
import type { Run } from '../../../../core/run/run.ts';
import { completeSheet } from '../../../../core/sheet/completeSheet.ts';
import type { SheetFile } from '../../../../core/sheet/sheetFile.ts';
import { type Experiment, perform, runOf, type SheetChanges, sheetOf, usualErrors } from '../../../experiment.ts';
import { seededNoise } from '../../../simulator/seededNoise.ts';

/** The fit of a run as its sheet has it, and what is doubted of it, without asking how many groups there are. */
export function fitAsDeclared(run: Run, sheetFile: SheetFile): RunResult {
  const used = usedPoints(run);
  const shape = shapeOfRun(used.volumes, used.readings);
  const complete = completeSheet(sheetFile, {
    readingKind: run.readingKind,
    titrantKind: directionOfTitrant(shape, run.readingKind),
    groupsIfOpen: 1,
  });
  if (!complete.ok) throw new Error(JSON.stringify(complete.refusals));
  const sheet = complete.value;
  const problem = buildProblem([{ sheet, volumes: used.volumes, readings: used.readings }]);
  if (!problem.ok) throw new Error(JSON.stringify(problem.refusals));
  const fitted = fitFromScratch(problem.value);
  const ending = endingOfFit(fitted, run, shape, sheet);
  return ending.code === 'fitted' || ending.code === 'predicted'
    ? describeFittedRun(run, sheet, used, shape, fitted, null, ending)
    : describeUnfittedRun(run, sheet, used, shape, ending);
}

/** Performs an experiment and fits it with its true sheet or with a changed one. */
export function fitExperiment(experiment: Experiment, changes: SheetChanges = {}): RunResult {
  const { volumes_mL, readings } = perform(experiment);
  return fitAsDeclared(runOf(volumes_mL, readings), sheetOf(experiment, changes));
}

/**
 * A sound run: groups inside the readings and at least 1.2 apart, a concentration
 * that gives a visible last step, 40 to 90 points past it, usual noise, readings
 * rounded as an instrument rounds them.
 */
export function soundExperiment(seed: number): Experiment {
  const draw = seededNoise(seed + 50_000);
  const groups = 1 + (seed % 3);
  const pKa: number[] = [];
  const lowest = draw.uniform(3.2, 4.5);
  const room = (8.6 - lowest - 1.2 * (groups - 1)) / groups;
  for (let k = 0, from = lowest; k < groups; k++) {
    const value = from + (k === 0 ? 0 : 1.2) + draw.uniform(0, room);
    pKa.push(Math.round(value * 100) / 100);
    from = value;
  }
  const concentration_M = draw.uniform(0.008, 0.02);
  const end_mL = 250 * concentration_M * (groups + draw.uniform(0.25, 0.6));
  const davies = draw.uniform(0, 1) < 0.5;
  return {
    pKa,
    concentration_M,
    end_mL,
    points: draw.integer(40, 90),
    ...(davies ? { activity: 'davies', background_M: 0.1 } : {}),
    errors: { seed, ...usualErrors },
    decimals: 3,
  };
}
