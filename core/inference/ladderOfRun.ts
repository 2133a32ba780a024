import type { Sheet } from '../sheet/sheet.ts';
import { ladderAgainst } from './ladderAgainst.ts';
import { chooseRung, type JudgedRung, judgeRungs } from './ladderChoice.ts';
import { LadderClimb } from './ladderClimb.ts';
import { type LadderSheets, ladderSheets } from './ladderSheets.ts';

/** Points on which rungs are compared; a longer run is thinned to as many. */
const comparedPoints = 120;

/** All rungs of a run on one common noise, and the one that can be defended. */
export interface Ladder {
  readonly rungs: readonly JudgedRung[];
  /** Position of the rung that the run shows. */
  readonly chosen: number;
  readonly sheets: LadderSheets;
  /** Curves computed for all of it. */
  readonly curveEvaluations: number;
}

/**
 * The same run with 0, 1, 2 … ionisable groups, with and without carbonate and
 * an excess of strong acid or base, compared on one noise. Yields the number of
 * groups that is about to be fitted.
 *
 * Each rung starts from the readings and from the ends of the rungs contained
 * in it, so that the cost never rises from a rung to one that contains it. Null
 * where there are too few points to compare anything.
 *
 * @param sheet complete; its number of groups does not matter
 * @param volumes mL
 * @param readings in the unit of the sheet
 */
export function* ladderOfRun(
  sheet: Sheet,
  volumes: Float64Array,
  readings: Float64Array,
): Generator<number, Ladder | null> {
  // What is left of a thinned run has gathered the errors of all doses between two points.
  const dosesPerPoint = Math.max(1, (volumes.length - 1) / (comparedPoints - 1));
  const { burette } = sheet;
  const uDose = { ...burette.doseUncertainty, value: burette.doseUncertainty.value * Math.sqrt(dosesPerPoint) };
  const sheets = ladderSheets({ ...sheet, burette: { ...burette, doseUncertainty: uDose } });
  const climb = new LadderClimb(sheets, thinned(volumes), thinned(readings));
  yield* climb.climb();
  if (climb.rungs.length === 0) return null;
  climb.settle();
  let judged = judgeRungs(climb.rungs, sheets, (rung) => ladderAgainst(rung, sheets));
  let chosen = chooseRung(judged, sheets);
  for (;;) {
    const rival = climb.rivalOf(judged[chosen].rung);
    if (rival === null) break;
    const reason = `${rival} would explain the run without this group`;
    judged = judged.map((entry, i) => (i === chosen ? { ...entry, againstIt: [...entry.againstIt, reason] } : entry));
    chosen = chooseRung(judged, sheets);
  }
  return { rungs: judged, chosen, sheets, curveEvaluations: climb.curveEvaluations };
}

function thinned(values: Float64Array): Float64Array {
  const count = values.length;
  if (count <= comparedPoints) return values;
  return Float64Array.from(
    { length: comparedPoints },
    (_, k) => values[Math.round((k * (count - 1)) / (comparedPoints - 1))],
  );
}
