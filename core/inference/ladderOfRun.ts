import { daviesFunction } from '../chemistry/davies.ts';
import { dataSlopes } from '../fit/dataSlopes.ts';
import { fitProblem } from '../fit/fitProblem.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import { declaredNoise, type Noise, noiseAt } from '../fit/noise.ts';
import { ReadingScale } from '../model/readingScale.ts';
import type { Sheet } from '../sheet/sheet.ts';
import { ladderAgainst } from './ladderAgainst.ts';
import { chooseRung, corrected, type JudgedRung, judgeRungs } from './ladderChoice.ts';
import { ladderNesting } from './ladderNesting.ts';
import { type CommonNoise, LadderRung } from './ladderRung.ts';
import { type LadderSheets, ladderSheets, type RungKind } from './ladderSheets.ts';
import {
  limitOf,
  type ReadingsReach,
  startFromOutermostGroup,
  startsBesideReadings,
  startsFromReadings,
} from './ladderStarts.ts';

/** Points on which rungs are compared; a longer run is thinned to as many. */
const comparedPoints = 120;
/** Starts of one rung that are fitted, the nearest to the readings first. */
const fittedStarts = { plain: 3, varied: 2 } as const;
/** Groups added one by one without any use before the climb ends. */
const rungsWithoutGain = 2;
/** Part of a cost that a larger rung may lie above a smaller one before it is fitted from there: rounding. */
const sameCost = 1e-9;
/** Reading noise before the readings have said anything, in pH. */
const firstReadingNoise = 0.01;
/** Times the common noise is taken from a rung that turns out to be better supported. */
const mostReferences = 3;
/** Ionic strength for the shift of constants where the run has no say yet, mol/L. */
const usualIonicStrength = 0.05;

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
  const sheets = ladderSheets(sheet);
  const climb = new Climb(sheets, thinned(volumes), thinned(readings));
  yield* climb.plain();
  if (climb.rungs.length === 0) return null;
  yield* climb.varied();
  climb.settleNoise();
  const judged = judgeRungs(climb.rungs, sheets, (rung) => ladderAgainst(rung, sheets, climb.reach));
  return { rungs: judged, chosen: chooseRung(judged, sheets), sheets, curveEvaluations: climb.curveEvaluations };
}

function thinned(values: Float64Array): Float64Array {
  const count = values.length;
  if (count <= comparedPoints) return values;
  return Float64Array.from({ length: comparedPoints }, (_, k) =>
    values[Math.round((k * (count - 1)) / (comparedPoints - 1))],
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
    const first = this.build({ groups: Math.max(1, sheets.fewest), carbonate: false, excess: false });
    const { run } = first.run;
    this.acid = run.design.titrantKind === 'acid';
    const unit = run.design.readingKind === 'mV' ? run.design.nernstSlope_mV : 1;
    const declaration = declaredNoise(run.sheet, run.design.nernstSlope_mV);
    const reading = declaration.kind === 'declared' ? declaration.reading : firstReadingNoise * unit;
    this.noise = { noise: noiseAt(declaration, reading), slopes: dataSlopes(volumes, readings) };
    this.reach = reachOf(first);
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
      const rung = this.climbTo({
        groups,
        carbonate: sheets.carbonate === 'always',
        excess: sheets.excess === 'always' || groups === 0,
      });
      if (rung === null) break;
      const support = roughCriterion(rung);
      if (support < best) {
        best = support;
        bestGroups = groups;
      } else if (groups - bestGroups >= rungsWithoutGain) break;
    }
    this.settleNoise();
  }

  /** Carbonate and excess, from no group to one more than is supported best. */
  *varied(): Generator<number, void> {
    const { sheets } = this;
    const carbonates = sheets.carbonate === 'open' ? [false, true] : [sheets.carbonate === 'always'];
    let highest = Math.min(sheets.largest, this.bestSupported().kind.groups + 1);
    for (let groups = sheets.fewest; groups <= highest; groups++) {
      yield groups;
      const excesses = sheets.excess === 'open' && groups > 0 ? [false, true] : [sheets.excess === 'always' || groups === 0];
      for (const carbonate of carbonates)
        for (const excess of excesses) this.climbTo({ groups, carbonate, excess });
      highest = Math.max(highest, Math.min(sheets.largest, this.bestSupported().kind.groups + 1));
    }
  }

  /** Takes the common noise from the best supported rung, again where that changes which one it is. */
  settleNoise(): void {
    for (let round = 0; round < mostReferences; round++) {
      const best = this.bestSupported();
      if (best === this.reference || best.end === null) return;
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
    const starts = this.startsOf(rung)
      .map((start) => ({ start, distance: rung.distance(start) }))
      .filter(({ distance }) => distance < Number.POSITIVE_INFINITY)
      .sort((a, b) => a.distance - b.distance);
    const isPlain = this.isPlain(kind);
    for (const { start } of starts.slice(0, isPlain ? fittedStarts.plain : fittedStarts.varied)) rung.fitFrom(start);
    this.rungs.push(rung);
    this.keepBelow(rung);
    return rung.end === null ? null : rung;
  }

  private isPlain({ groups, carbonate, excess }: RungKind): boolean {
    const { sheets } = this;
    return carbonate === (sheets.carbonate === 'always') && excess === (sheets.excess === 'always' || groups === 0);
  }

  private startsOf(rung: LadderRung): Float64Array[] {
    const { kind } = rung;
    const starts: Float64Array[] = [];
    for (const smaller of this.rungs) {
      if (smaller.end === null) continue;
      const nesting = ladderNesting(smaller, rung, this.sheets);
      if (nesting !== null) starts.push(limitOf(nesting, smaller, rung, this.reach));
      if (nesting?.kind === 'group-out-of-reach') starts.push(...startsBesideReadings(smaller, rung, this.reach));
    }
    if (kind.excess && kind.groups > 0) {
      const richer = this.find({ ...kind, groups: kind.groups + 1, excess: false });
      if (richer !== undefined && richer.end !== null)
        starts.push(startFromOutermostGroup(richer, rung, this.acid));
    }
    if (this.isPlain(kind)) starts.push(...startsFromReadings(rung));
    return starts;
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

/** Where the readings lie on the scale of p[H⁺]. */
function reachOf(rung: LadderRung): ReadingsReach {
  const { run } = rung.run;
  const { design } = run;
  const scale = new ReadingScale(design);
  scale.take(Float64Array.from(design.quantities, ({ declaration, role }) => nominal(declaration, role.kind)));
  const activityTerm =
    design.scale === 'activity' && design.coefficientA > 0
      ? design.coefficientA * daviesFunction(usualIonicStrength)
      : 0;
  const values = Array.from(run.readings, (reading) => scale.negativeLog(reading) - activityTerm);
  return { lowest: Math.min(...values), highest: Math.max(...values), ionicStrength: usualIonicStrength };
}
