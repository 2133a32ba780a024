import { readingNoise } from '../../endpoints/readingNoise.ts';
import { readingResolution } from '../../fit/readingResolution.ts';
import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';
import { byVolume } from '../byVolume.ts';
import { breakInside } from './breakInside.ts';

/** Windows in which a break is looked for: points on either side, and the degree of what a smooth miss is over so few. */
const windows = [
  { half: 6, degree: 2 },
  { half: 10, degree: 3 },
] as const;
/** Span of the curve in a window, in pH: beyond it, the miss of any model is bent by a step. */
const widestSpan = 1.2;
/** Standard deviations of a jump or a bend; two shapes are tried at every point of a run. */
const leastBreak = 8;
/** Standard uncertainties of a reading by which a run that turns back must do so. */
const leastTurn = 6;

interface Place {
  readonly volume_mL: number;
  readonly line: number;
  readonly what: string;
}

/** A kink or a turn in the readings that no solution makes, as when a solid forms or dissolves. */
export function solidLikely(analysis: Analysis): Doubt[] {
  const found = turnBack(analysis) ?? kink(analysis);
  if (found === null) return [];
  return [
    {
      code: 'solid-likely',
      seen: `${found.what} at ${found.volume_mL.toFixed(3)} mL (line ${found.line}).`,
      means:
        'No clear solution does that: a solid forms or dissolves there, slowly perhaps, or the electrode or the burette was disturbed. What was dissolved after it is not what the model takes it for.',
      remedy:
        'Look whether the solution was turbid; dilute, add a cosolvent, or fit only the points on the clear side of it.',
      place: { volume_mL: found.volume_mL, line: found.line },
    },
  ];
}

/** Standard deviation of a reading from point to point, which no smooth miss of the model enters. */
function scatterOf({ weighted, fit, index }: Analysis, order: readonly number[]): number {
  const { volumes, readings } = weighted.run;
  const scatter = readingNoise(
    Float64Array.from(order, (i) => volumes[i]),
    Float64Array.from(order, (i) => weighted.predicted[i] - readings[i]),
  );
  const { declared, reading } = fit.noise[index];
  return Math.max(scatter ?? reading, declared ? reading : 0, readingResolution(readings) / Math.sqrt(12));
}

/** Where readings go against the titrant, three points before compared with three after so that a single wild one does nothing. */
function turnBack(analysis: Analysis): Place | null {
  const { used, run, weighted } = analysis;
  const order = byVolume(used.volumes);
  const { readings } = weighted.run;
  const ends = [order.slice(0, 3), order.slice(-3)].map((few) => middle(few.map((i) => readings[i])));
  const direction = Math.sign(ends[1] - ends[0]);
  const least = Math.max(leastTurn * scatterOf(analysis, order), 3 * readingResolution(readings));
  let worst = least;
  let place: Place | null = null;
  for (let k = 3; k + 3 <= order.length; k++) {
    const [before, after] = [order.slice(k - 3, k), order.slice(k, k + 3)];
    const turned = direction * (middle(before.map((i) => readings[i])) - middle(after.map((i) => readings[i])));
    if (!(turned > worst)) continue;
    worst = turned;
    const row = run.rows[used.rows[order[k]]];
    const unit = run.readingKind === 'mV' ? ' mV' : ' in pH';
    place = { ...row, what: `The readings turn back by ${turned.toPrecision(2)}${unit} against the titrant` };
  }
  return place;
}

/** Where residuals break off or bend from one point to the next, away from the steps. */
function kink(analysis: Analysis): Place | null {
  const { weighted, used, run, robust } = analysis;
  const wild = new Set(robust?.distrusted.map(({ line }) => line));
  const order = byVolume(used.volumes).filter((i) => !wild.has(run.rows[used.rows[i]].line));
  const { volumes, readings, design } = weighted.run;
  const span = widestSpan * (design.readingKind === 'mV' ? design.nernstSlope_mV : 1);
  const misses = weighted.predicted.map((value, i) => value - readings[i]);
  const least = scatterOf(analysis, order);
  let strongest = leastBreak;
  let place: Place | null = null;
  for (const { half, degree } of windows)
    for (let k = half; k + half <= order.length; k++) {
      const window = order.slice(k - half, k + half);
      if (spanOf(window.map((i) => weighted.predicted[i])) > span) continue;
      const strength = breakInside(
        window.map((i) => volumes[i]),
        window.map((i) => misses[i]),
        degree,
        least,
      );
      if (!(strength > strongest)) continue;
      strongest = strength;
      place = { ...run.rows[used.rows[order[k]]], what: 'The residuals break off or bend sharply' };
    }
  return place;
}

function spanOf(values: readonly number[]): number {
  return Math.max(...values) - Math.min(...values);
}

function middle([a, b, c]: readonly number[]): number {
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
}
