import { fTail } from '../numerics/fTail.ts';
import { ladderNesting } from './ladderNesting.ts';
import type { LadderRung } from './ladderRung.ts';
import type { LadderSheets } from './ladderSheets.ts';

/**
 * A richer rung must lower AICc by this much to be believed: above 10 the
 * poorer one is left with essentially no support (evidence of 150 to 1).
 * Source: Burnham, K. P.; Anderson, D. R., Model Selection and Multimodel
 * Inference, 2nd ed., Springer 2002, section 2.6 (from memory).
 */
export const decisiveDifference = 10;
/** A rung that F does not prefer to a rung contained in it with at most this chance of error is not believed either. */
const decisiveTail = 0.001;

/** The F test of a rung against one contained in it. */
export interface RungTest {
  /** Position of the smaller rung in the ladder. */
  readonly against: number;
  readonly F: number;
  /** Chance of an F as large where the smaller rung is true. */
  readonly p: number;
}

/** A rung as it stands among the others, all on one noise. */
export interface JudgedRung {
  readonly rung: LadderRung;
  readonly cost: number | null;
  readonly aicc: number | null;
  /** Evidence weight: the share of all evidence; the weights of a ladder add up to 1. */
  readonly weight: number;
  readonly againstIt: readonly string[];
  readonly test: RungTest | null;
}

/**
 * 2k + 2k(k + 1)/(n − k − 1), which AICc adds to the cost; null where the points are too few.
 * Source: Hurvich, C. M.; Tsai, C.-L., Biometrika 76 (1989) 297–307.
 */
export function corrected(fitted: number, points: number): number | null {
  const spare = points - fitted - 1;
  return spare > 0 ? 2 * fitted + (2 * fitted * (fitted + 1)) / spare : null;
}

/** Compares rungs; in order of groups, then of what else is fitted. */
export function judgeRungs(
  rungs: readonly LadderRung[],
  sheets: LadderSheets,
  against: (rung: LadderRung) => readonly string[],
): JudgedRung[] {
  const ordered = [...rungs].sort(
    (a, b) => a.kind.groups - b.kind.groups || variation(a, sheets) - variation(b, sheets),
  );
  const criteria = ordered.map(criterion);
  const best = Math.min(...criteria.map((value) => value ?? Number.POSITIVE_INFINITY));
  const shares = criteria.map((value) => (value === null ? 0 : Math.exp(0.5 * (best - value))));
  const total = shares.reduce((sum, share) => sum + share, 0);
  return ordered.map((rung, i) => ({
    rung,
    cost: rung.end?.cost ?? null,
    aicc: criteria[i],
    weight: total > 0 ? shares[i] / total : 0,
    againstIt: against(rung),
    test: testOf(rung, ordered, sheets),
  }));
}

/** AICc with the log-determinant of the common noise; null where the rung was not fitted. */
export function criterion({ end, fitted, points, run }: LadderRung): number | null {
  const correction = corrected(fitted, points);
  return end === null || correction === null ? null : end.cost + run.whitening.logDeterminant + correction;
}

/** What is fitted that the sheet does not ask for: nothing, carbonate, an excess, both. */
export function variation({ kind }: LadderRung, sheets: LadderSheets): number {
  const carbonate = sheets.carbonate === 'open' && kind.carbonate;
  const excess = sheets.excess === 'open' && kind.excess && kind.groups > 0;
  return Number(carbonate) + 2 * Number(excess);
}

/** Against the rung with one group less, else against one with the same groups. */
function testOf(rung: LadderRung, rungs: readonly LadderRung[], sheets: LadderSheets): RungTest | null {
  const { end, fitted, points } = rung;
  if (end === null) return null;
  const contained = rungs
    .map((smaller, index) => ({ smaller, index }))
    .filter(({ smaller }) => smaller.end !== null && ladderNesting(smaller, rung, sheets) !== null)
    .sort((a, b) => a.smaller.kind.groups - b.smaller.kind.groups);
  if (contained.length === 0) return null;
  const { smaller, index } = contained[0];
  const spare = points - fitted;
  const more = fitted - smaller.fitted;
  if (smaller.end === null || spare <= 0 || more <= 0) return null;
  const gain = Math.max(0, smaller.end.cost - end.cost);
  // Readings without noise leave nothing; any gain is then beyond doubt, and as large as can be written.
  const F = end.cost > 0 ? Math.min(gain / more / (end.cost / spare), Number.MAX_VALUE) : Number.MAX_VALUE;
  return { against: index, F, p: fTail(F, more, spare) };
}

/**
 * The position of the rung that the run shows: of those against which nothing
 * speaks, the simplest that no other beats decisively. Of equally simple ones,
 * the one that keeps to the sheet comes first.
 */
export function chooseRung(rungs: readonly JudgedRung[], sheets: LadderSheets): number {
  const fitted = rungs.map((judged, index) => ({ ...judged, index })).filter(({ aicc }) => aicc !== null);
  if (fitted.length === 0) return 0;
  const sound = fitted.filter(({ againstIt }) => againstIt.length === 0);
  const believed = sound.filter(({ test }) => test === null || test.p <= decisiveTail);
  const pool = believed.length > 0 ? believed : fitted;
  const best = Math.min(...pool.map(({ aicc }) => aicc ?? Number.POSITIVE_INFINITY));
  const near = pool.filter(({ aicc }) => aicc !== null && aicc - best <= decisiveDifference);
  const hasPlain = near.some(({ rung }) => variation(rung, sheets) === 0);
  // A run of a substance is not turned into one without any by what the sheet does not know of.
  const sensible = near.filter(({ rung }) => !(hasPlain && rung.kind.groups === 0 && variation(rung, sheets) > 0));
  sensible.sort(
    (a, b) =>
      a.rung.fitted - b.rung.fitted ||
      Number(variation(a.rung, sheets) > 0) - Number(variation(b.rung, sheets) > 0) ||
      (a.aicc ?? 0) - (b.aicc ?? 0),
  );
  return sensible[0].index;
}
