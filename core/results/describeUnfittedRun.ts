import type { ShapeOfRun } from '../endpoints/shapeOfRun.ts';
import { designRun } from '../model/runDesign.ts';
import type { Run } from '../run/run.ts';
import type { Sheet } from '../sheet/sheet.ts';
import { readingKindContradicted } from './checks/readingKindContradicted.ts';
import { equivalenceByReadings } from './describeEquivalence.ts';
import { describePoints } from './describePoints.ts';
import { describeUnfitted } from './describeQuantities.ts';
import { directionOfTitrant } from './directionOfTitrant.ts';
import { readingAsPH } from './readingAsPH.ts';
import type { RunEnding, RunResult } from './runResult.ts';
import { stepsOfReadings } from './stepsOfReadings.ts';
import type { UsedPoints } from './usedPoints.ts';

/** What can be said of a run without a fit: its points, its steps, and why there is no more. */
export function describeUnfittedRun(
  run: Run,
  sheet: Sheet,
  used: UsedPoints,
  shape: ShapeOfRun,
  ending: RunEnding,
): RunResult {
  const design = designRun(sheet);
  const asPH = readingAsPH(design, null, null);
  const titrant = directionOfTitrant(shape, design.readingKind);
  const steps = stepsOfReadings(design, used, asPH, titrant, sheet.reading.uncertainty);
  return {
    run,
    sheet,
    ending,
    quantities: describeUnfitted(design),
    equivalence: equivalenceByReadings(steps, [], used.volumes),
    noise: null,
    doubts: [...run.doubts, ...readingKindContradicted({ run, sheet })],
    ladder: null,
    correlation: { ids: [], matrix: [] },
    curve: null,
    points: describePoints(run, used, asPH, null),
    speciation: null,
    robust: null,
  };
}
