import { granLine } from './granLine.ts';
import { sortedByVolume } from './sortedByVolume.ts';

/** The side of an equivalence from which the line runs towards it, and the function that was drawn. */
export type GranKind =
  | 'acid side strong'
  | 'acid side weak'
  | 'base side'
  // mirrored, for a titrant that is an acid
  | 'base side strong'
  | 'base side weak'
  | 'acid side';

/** Why there is no Gran volume. */
export type GranAbsence = 'no step' | 'too few points' | 'not straight' | 'meets zero elsewhere';

interface GranCommon {
  readonly kind: GranKind;
  /** Number of the step it belongs to, from 1; 0 where there is no step. */
  readonly step: number;
  readonly pointsUsed: number;
}

/** An equivalence volume from a Gran function, or the reason why there is none. */
export type GranVolume =
  | (GranCommon & {
      readonly volume_mL: number;
      /** Standard uncertainty from the scatter about the line and from what curvature is seen in it. */
      readonly u_mL: number;
      /** Lowest and highest volume used, mL. */
      readonly range_mL: readonly [number, number];
      readonly rSquared: number;
      readonly reason: null;
    })
  | (GranCommon & {
      readonly volume_mL: null;
      readonly u_mL: null;
      readonly range_mL: null;
      readonly rSquared: null;
      readonly reason: GranAbsence;
    });

export interface GranInput {
  /** mL, in any order. */
  readonly volumes: Float64Array;
  /** p[H⁺], converted from the readings by the caller; as many as volumes. */
  readonly pH: Float64Array;
  /** Sample and extra water together, mL. */
  readonly startVolume_mL: number;
  readonly titrant: 'base' | 'acid';
  /** Of the medium, on the concentration scale. */
  readonly pKw: number;
  /** Volumes of the steps, rising, as found from the derivative, mL. */
  readonly steps: readonly number[];
}

/**
 * Shares of the way from one step to the next between which points are used.
 * A strong acid is straight from the start; a weak one is not where it hardly
 * buffers, at either end.
 */
const STRONG_RANGE: readonly [number, number] = [0.1, 0.97];
const WEAK_RANGE: readonly [number, number] = [0.5, 0.92];
/** Behind the last step: from this share of the way from the step to the last point. */
const BEHIND_FROM = 0.25;

/**
 * Equivalence volumes from Gran functions (G. Gran, Analyst 77 (1952) 661–671,
 * from memory), without a model. With V the volume added and V₀ that of the
 * sample with its water, a base as titrant gives straight lines that meet zero
 * at an equivalence volume:
 *
 * - after the last step: (V₀+V)·10^(pH−pKw), whose slope is the strength c of the titrant;
 * - before the first step: (V₀+V)·10^−pH for a strong acid, V*·10^−pH for a weak
 *   one; the straighter of the two is given;
 * - before each later step: (V*−V′)·10^−pH, V′ the step before.
 *
 * V* = V + (V₀+V)([H⁺]−[OH⁻])/c counts the protons that the acid gave off by
 * itself; without a straight line behind the last step c is not known and V
 * stands for V*. Left out: overlap of neighbouring steps, and protons still
 * bound behind the last one. What is therefore not straight, or does not lead
 * to its step, gives a reason in place of a volume (see granLine). An acid as
 * titrant is the mirror image, with pKw − pH in place of pH.
 *
 * @returns one for each step, then the one behind the last
 */
export function granVolumes(input: GranInput): GranVolume[] {
  const sorted = sortedByVolume(input.volumes, input.pH);
  const { volumes } = sorted;
  const { startVolume_mL, pKw, steps } = input;
  const isBase = input.titrant === 'base';
  const own = isBase ? 'acid side' : 'base side';
  if (steps.length === 0 || volumes.length === 0) return [absent(`${own} strong`, 0, 0, 'no step')];

  // What the titrant uses up, and what it brings, in mmol.
  const usedUp = sorted.readings.map((pH) => 10 ** (isBase ? -pH : pH - pKw));
  const freeLeft = usedUp.map((concentration, i) => concentration * (startVolume_mL + volumes[i]));
  const freeBrought = sorted.readings.map((pH, i) => 10 ** (isBase ? pH - pKw : -pH) * (startVolume_mL + volumes[i]));

  const lastStep = steps[steps.length - 1];
  const end = volumes[volumes.length - 1];
  const behind = granLine({
    volumes,
    abscissa: volumes,
    values: freeBrought,
    range: [lastStep + BEHIND_FROM * (end - lastStep), end],
    target: lastStep,
    width: lastStep - (steps.length > 1 ? steps[steps.length - 2] : 0),
  });
  const strength = 'reason' in behind ? Number.POSITIVE_INFINITY : Math.abs(behind.slope);
  const withOwnProtons = volumes.map((volume, i) => volume + (freeLeft[i] - freeBrought[i]) / strength);

  const found = steps.map((target, k): GranVolume => {
    const before = k === 0 ? 0 : steps[k - 1];
    const width = target - before;
    const along = (range: readonly [number, number]) => [before + range[0] * width, before + range[1] * width] as const;
    const common = { volumes, target, width };
    const weak = granLine({
      ...common,
      abscissa: withOwnProtons,
      values: usedUp.map((concentration, i) => concentration * (withOwnProtons[i] - before)),
      range: along(WEAK_RANGE),
    });
    const strong =
      k > 0 ? null : granLine({ ...common, abscissa: volumes, values: freeLeft, range: along(STRONG_RANGE) });
    const strongIsStraighter =
      strong !== null && !('reason' in strong) && ('reason' in weak || strong.relativeScatter <= weak.relativeScatter);
    return strongIsStraighter ? named(`${own} strong`, k + 1, strong) : named(`${own} weak`, k + 1, weak);
  });
  return [...found, named(isBase ? 'base side' : 'acid side', steps.length, behind)];
}

function named(kind: GranKind, step: number, line: ReturnType<typeof granLine>): GranVolume {
  if ('reason' in line) return absent(kind, step, line.pointsUsed, line.reason);
  return {
    kind,
    step,
    pointsUsed: line.pointsUsed,
    volume_mL: line.volume_mL,
    u_mL: line.u_mL,
    range_mL: line.range_mL,
    rSquared: line.rSquared,
    reason: null,
  };
}

function absent(kind: GranKind, step: number, pointsUsed: number, reason: GranAbsence): GranVolume {
  return { kind, step, pointsUsed, volume_mL: null, u_mL: null, range_mL: null, rSquared: null, reason };
}
