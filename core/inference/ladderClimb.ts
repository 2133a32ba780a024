import { dataSlopes } from '../fit/dataSlopes.ts';
import { fitProblem } from '../fit/fitProblem.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import { declaredNoise, type Noise, noiseAt } from '../fit/noise.ts';
import { corrected, criterion, decisiveDifference } from './ladderChoice.ts';
import { ladderNesting } from './ladderNesting.ts';
import { type ReadingsReach, readingsReach } from './ladderReach.ts';
import { hasGroupAtEdge, ladderRivals } from './ladderRivals.ts';
import { type CommonNoise, LadderRung } from './ladderRung.ts';
import type { LadderSheets, RungKind } from './ladderSheets.ts';
import {
  carriedOver,
  limitOf,
  startFromOutermostGroup,
  startsBesideReadings,
  startsFromReadings,
  startsWithCarbonate,
  startsWithExcess,
} from './ladderStarts.ts';

/** Starts of each kind that are fitted for one rung, the nearest to the readings first. */
const fittedStarts = { fromReadings: 3, withExcess: 1, sameGroups: 1, groupAdded: 1 } as const;
/** Groups added one by one without any use before the climb ends. */
const rungsWithoutGain = 2;
/** A rung whose criterion lies this far above the best is not taken apart any further. */
const nearBest = 40;
/** Curves after which no further group is tried. */
const enoughEvaluations = 1000;
/** Part of a cost that a larger rung may lie above a smaller one before it is fitted from there: rounding. */
const sameCost = 1e-9;
/** Reading noise before the readings have said anything, in pH. */
const firstReadingNoise = 0.01;
/** Times the common noise is taken from a rung that turns out to be better supported, by how much of AICc at least. */
const mostReferences = 2;
const betterReference = 6;

/** The work on one ladder: which rungs are fitted, from where, and on which noise. */
export class LadderClimb {
  readonly rungs: LadderRung[] = [];
  readonly reach: ReadingsReach;

  private readonly sheets: LadderSheets;
  private readonly volumes: Float64Array;
  private readonly readings: Float64Array;
  private readonly acid: boolean;
  private noise: CommonNoise;
  private reference: LadderRung | null = null;
  /** Curves computed for references and rivals. */
  private otherEvaluations = 0;
  private readonly doubted = new Set<LadderRung>();

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
    return this.rungs.reduce((sum, { weighted }) => sum + weighted.curveEvaluations, this.otherEvaluations);
  }

  /**
   * Adds groups as long as they bring anything, alone and with all else that is
   * open: what is missing beside the groups would else be made up by more of
   * them. Then carbonate and excess one by one, where both together come near
   * the best.
   */
  *climb(): Generator<number, void> {
    const { sheets } = this;
    for (let groups = sheets.fewest; groups <= sheets.largest; groups++) {
      yield groups;
      if (this.climbTo(sheets.plain(groups)) === null) break;
      // One behind, because a group too many may turn out to be the excess.
      if (groups > sheets.fewest) this.climbTo(sheets.richest(groups - 1));
      const tried = this.curveEvaluations < enoughEvaluations;
      if (!tried || groups - this.bestSupported().kind.groups >= rungsWithoutGain) break;
    }
    if (this.rungs.length === 0) return;
    this.settleNoise();
    const worthwhile = roughCriterion(this.bestSupported()) + nearBest;
    const highest = Math.max(...this.rungs.map(({ kind }) => kind.groups));
    for (let groups = sheets.fewest; groups <= highest; groups++) {
      const richest = this.find(sheets.richest(groups));
      if (richest === undefined || roughCriterion(richest) > worthwhile) continue;
      yield groups;
      const { carbonate, excess } = sheets.richest(groups);
      const plain = sheets.plain(groups);
      this.climbTo({ groups, carbonate, excess: plain.excess });
      this.climbTo({ groups, carbonate: plain.carbonate, excess });
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
      this.otherEvaluations += fit.weighted.curveEvaluations;
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

  /** What is only assumed and explains the run as well as an outermost group of a rung, in words; null where nothing does. */
  rivalOf(rung: LadderRung): string | null {
    const { kind } = rung;
    const aicc = criterion(rung);
    if (aicc === null || this.doubted.has(rung) || !hasGroupAtEdge(rung)) return null;
    this.doubted.add(rung);
    const groups = kind.groups - 1;
    const smaller = this.find({ ...kind, groups, excess: kind.excess || groups === 0 });
    if (smaller === undefined || smaller.end === null) return null;
    for (const { name, id, sheet, range } of ladderRivals(smaller.kind.sheet)) {
      const rival = new LadderRung(this.sheets, { ...smaller.kind, sheet }, this.volumes, this.readings);
      rival.weigh(this.noise);
      rival.fitFrom(carriedOver(smaller, rival));
      this.otherEvaluations += rival.weighted.curveEvaluations;
      const other = criterion(rival);
      const value = rival.end?.values.get(id) ?? Number.NaN;
      const canBe = value >= range[0] && value <= range[1];
      if (canBe && other !== null && other <= aicc + decisiveDifference) return name;
    }
    return null;
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

  private isVariedByExcess({ groups, excess }: RungKind): boolean {
    return excess && !this.sheets.plain(groups).excess;
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
      if (nesting.kind === 'same-groups') {
        sameGroups.push(limit);
        if (kind.carbonate && !smaller.kind.carbonate)
          sameGroups.push(...startsWithCarbonate(smaller, rung, this.sheets.carbonateVessel));
      } else groupAdded.push(limit);
      if (nesting.kind === 'group-out-of-reach') groupAdded.push(...startsBesideReadings(smaller, rung, this.reach));
    }
    if (this.isVariedByExcess(kind)) {
      const richer = this.find(this.sheets.plain(kind.groups + 1));
      if (richer !== undefined && richer.end !== null)
        sameGroups.push(startFromOutermostGroup(richer, rung, this.acid));
    }
    const plain = this.find(this.sheets.plain(kind.groups));
    return [
      { from: this.isPlain(kind) ? startsFromReadings(rung) : [], fitted: fittedStarts.fromReadings },
      { from: this.isVariedByExcess(kind) ? startsWithExcess(rung, plain) : [], fitted: fittedStarts.withExcess },
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
