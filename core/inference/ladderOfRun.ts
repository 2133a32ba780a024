import { dataSlopes } from '../fit/dataSlopes.ts';
import { fitProblem } from '../fit/fitProblem.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import { declaredNoise, type Noise, noiseAt } from '../fit/noise.ts';
import type { Sheet } from '../sheet/sheet.ts';
import { ladderAgainst } from './ladderAgainst.ts';
import { chooseRung, corrected, type JudgedRung, judgeRungs } from './ladderChoice.ts';
import { ladderNesting } from './ladderNesting.ts';
import { type ReadingsReach, readingsReach } from './ladderReach.ts';
import { type CommonNoise, LadderRung } from './ladderRung.ts';
import { type LadderSheets, ladderSheets, type RungKind } from './ladderSheets.ts';
import { limitOf, startFromOutermostGroup, startsBesideReadings, startsFromReadings } from './ladderStarts.ts';

/** Points on which rungs are compared; a longer run is thinned to as many. */
const comparedPoints = 120;
/** Starts of each kind that are fitted for one rung, the nearest to the readings first. */
const fittedStarts = { fromReadings: 3, sameGroups: 1, groupAdded: 1 } as const;
/** Groups added one by one without any use before the climb ends. */
const rungsWithoutGain = 2;
/** Groups may stand in for carbonate and an excess: so many fewer are tried with these. */
const variedBelow = 2;
/** Part of a cost that a larger rung may lie above a smaller one before it is fitted from there: rounding. */
const sameCost = 1e-9;
/** Reading noise before the readings have said anything, in pH. */
const firstReadingNoise = 0.01;
/** Times the common noise is taken from a rung that turns out to be better supported, by how much of AICc at least. */
const mostReferences = 2;
const betterReference = 6;

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
  const climb = new Climb(sheets, thinned(volumes), thinned(readings));
  yield* climb.plain();
  if (climb.rungs.length === 0) return null;
  yield* climb.varied();
  climb.settle();
  const judged = judgeRungs(climb.rungs, sheets, (rung) => ladderAgainst(rung, sheets));
  return { rungs: judged, chosen: chooseRung(judged, sheets), sheets, curveEvaluations: climb.curveEvaluations };
}

function thinned(values: Float64Array): Float64Array {
  const count = values.length;
  if (count <= comparedPoints) return values;
  return Float64Array.from(
    { length: comparedPoints },
    (_, k) => values[Math.round((k * (count - 1)) / (comparedPoints - 1))],
  );
}

/** The work on one ladder. */
class Climb {
  readonly rungs: LadderRung[] = [];
  readonly reach: ReadingsReach;

  private readonly sheets: LadderSheets;
  private readonly volumes: Float64Array;
  private readonly readings: Float64Array;
  private readonly acid: boolean;
  private noise: CommonNoise;
  private reference: LadderRung | null = null;
  private evaluationsOfReferences = 0;

  constructor(sheets: LadderSheets, volumes: Float64Array, readings: Float64Array) {
    this.sheets = sheets;
    this.volumes = volumes;
    this.readings = readings;
    const first = this.build(sheets.plain(Math.max(1, sheets.fewest)));
    const { run } = first.run;
    this.acid = run.design.titrantKind === 'acid';
    const unit = run.design.readingKind === 'mV' ? run.design.nernstSlope_mV : 1;
    const declaration = declaredNoise(run.sheet, run.design.nernstSlope_mV);
    const reading = declaration.kind === 'declared' ? declaration.reading : firstReadingNoise * unit;
    this.noise = { noise: noiseAt(declaration, reading), slopes: dataSlopes(volumes, readings) };
    this.reach = readingsReach(first);
  }

  get curveEvaluations(): number {
    return this.rungs.reduce((sum, { weighted }) => sum + weighted.curveEvaluations, this.evaluationsOfReferences);
  }

  /** Groups alone, as far as they bring anything. */
  *plain(): Generator<number, void> {
    const { sheets } = this;
    let best = Number.POSITIVE_INFINITY;
    let bestGroups = sheets.fewest;
    for (let groups = sheets.fewest; groups <= sheets.largest; groups++) {
      yield groups;
      const rung = this.climbTo(sheets.plain(groups));
      if (rung === null) break;
      const support = roughCriterion(rung);
      if (support < best) {
        best = support;
        bestGroups = groups;
      } else if (groups - bestGroups >= rungsWithoutGain) break;
    }
    this.settleNoise();
  }

  /** Carbonate and excess about the rung that is supported best, until that one stays. */
  *varied(): Generator<number, void> {
    const { sheets } = this;
    const carbonates = sheets.carbonate === 'open' ? [false, true] : [sheets.plain(1).carbonate];
    let lowest = sheets.largest;
    let highest = sheets.fewest - 1;
    for (;;) {
      const { groups: best } = this.bestSupported().kind;
      const from = Math.max(sheets.fewest, best - variedBelow);
      const to = Math.min(sheets.largest, best + 1);
      if (from >= lowest && to <= highest) break;
      lowest = Math.min(lowest, from);
      highest = Math.max(highest, to);
      for (let groups = lowest; groups <= highest; groups++) {
        yield groups;
        const excesses = sheets.excess === 'open' && groups > 0 ? [false, true] : [sheets.plain(groups).excess];
        for (const carbonate of carbonates) for (const excess of excesses) this.climbTo({ groups, carbonate, excess });
      }
    }
  }

  /** Puts the ladder on its final noise and in order: no rung lies above one that it contains. */
  settle(): void {
    this.settleNoise();
    this.rungs.sort((a, b) => a.fitted - b.fitted);
    for (const rung of this.rungs) this.keepBelow(rung);
  }

  /** Takes the common noise from the best supported rung, again where that changes which one it is. */
  private settleNoise(): void {
    for (let round = 0; round < mostReferences; round++) {
      const best = this.bestSupported();
      const gain = this.reference === null ? Infinity : roughCriterion(this.reference) - roughCriterion(best);
      if (best.end === null || !(gain > betterReference)) return;
      const fit = fitProblem(best.problem, best.end.parameters);
      this.evaluationsOfReferences += fit.weighted.curveEvaluations;
      this.reference = best;
      if (!endings[fit.ending].usable) return;
      const [noise] = fit.noise;
      // Declared noise that the best rung exceeds would make every further quantity look decisive.
      const excess = noise.declared ? Math.sqrt(Math.max(1, noise.reducedChiSquare ?? 1)) : 1;
      this.noise = { noise: scaled(noise, excess), slopes: fit.weighted.runs[0].slopes.slice() };
      best.fitFrom(fit.parameters);
      for (const rung of this.rungs) rung.weigh(this.noise);
      for (const rung of this.rungs) {
        rung.refit();
        this.keepBelow(rung);
      }
    }
  }

  private bestSupported(): LadderRung {
    return this.rungs.reduce((best, rung) => (roughCriterion(rung) < roughCriterion(best) ? rung : best));
  }

  private build(kind: RungKind): LadderRung {
    return new LadderRung(this.sheets, this.sheets.sheetFor(kind), this.volumes, this.readings);
  }

  private find({ groups, carbonate, excess }: RungKind): LadderRung | undefined {
    return this.rungs.find(
      ({ kind }) => kind.groups === groups && kind.carbonate === carbonate && kind.excess === excess,
    );
  }

  /** Fits a rung unless that has been done; null where the points are too few for it. */
  private climbTo(kind: RungKind): LadderRung | null {
    const known = this.find(kind);
    if (known !== undefined) return known;
    const rung = this.build(kind);
    if (corrected(rung.fitted, rung.points) === null) return null;
    rung.weigh(this.noise);
    for (const starts of this.startsOf(rung)) {
      const ranked = starts.from
        .map((start) => ({ start, distance: rung.distance(start) }))
        .filter(({ distance }) => distance < Number.POSITIVE_INFINITY)
        .sort((a, b) => a.distance - b.distance);
      for (const { start } of ranked.slice(0, starts.fitted)) rung.fitFrom(start);
    }
    this.rungs.push(rung);
    this.keepBelow(rung);
    return rung.end === null ? null : rung;
  }

  private isPlain({ groups, carbonate, excess }: RungKind): boolean {
    const plain = this.sheets.plain(groups);
    return carbonate === plain.carbonate && excess === plain.excess;
  }

  /**
   * Kinds of starts, each with the number of them that is worth fitting. The
   * nearest of one kind would hide those of another, which lead elsewhere.
   */
  private startsOf(rung: LadderRung): { from: Float64Array[]; fitted: number }[] {
    const { kind } = rung;
    const sameGroups: Float64Array[] = [];
    const groupAdded: Float64Array[] = [];
    for (const smaller of this.rungs) {
      if (smaller.end === null) continue;
      const nesting = ladderNesting(smaller, rung, this.sheets);
      if (nesting === null) continue;
      const limit = limitOf(nesting, smaller, rung, this.reach);
      if (nesting.kind === 'same-groups') sameGroups.push(limit);
      else groupAdded.push(limit);
      if (nesting.kind === 'group-out-of-reach') groupAdded.push(...startsBesideReadings(smaller, rung, this.reach));
    }
    if (kind.excess && kind.groups > 0) {
      const richer = this.find({ ...kind, groups: kind.groups + 1, excess: false });
      if (richer !== undefined && richer.end !== null)
        sameGroups.push(startFromOutermostGroup(richer, rung, this.acid));
    }
    return [
      { from: this.isPlain(kind) ? startsFromReadings(rung) : [], fitted: fittedStarts.fromReadings },
      { from: sameGroups, fitted: fittedStarts.sameGroups },
      { from: groupAdded, fitted: fittedStarts.groupAdded },
    ];
  }

  /** Fits a rung from every rung contained in it that has a lower cost, so that none has. */
  private keepBelow(rung: LadderRung): void {
    for (const smaller of this.rungs) {
      if (smaller.end === null || smaller === rung) continue;
      if (rung.end !== null && rung.end.cost <= smaller.end.cost * (1 + sameCost)) continue;
      const nesting = ladderNesting(smaller, rung, this.sheets);
      if (nesting !== null) rung.fitFrom(limitOf(nesting, smaller, rung, this.reach));
    }
  }
}

/** AICc with the noise taken from the rung itself: what a rung is worth before there is a common noise. */
function roughCriterion({ end, fitted, points }: LadderRung): number {
  const correction = corrected(fitted, points);
  return end === null || correction === null ? Number.POSITIVE_INFINITY : points * Math.log(end.cost) + correction;
}

function scaled(noise: Noise, factor: number): Noise {
  return {
    reading: noise.reading * factor,
    setting_mL: noise.setting_mL * factor,
    dose_mL: noise.dose_mL * factor,
  };
}
