import { readingResolution } from '../../fit/readingResolution.ts';
import type { Doubt } from '../../notice/doubt.ts';
import { studentQuantile } from '../../numerics/studentQuantile.ts';
import type { Analysis } from '../analysis.ts';
import { byVolume } from '../byVolume.ts';
import { breakInside } from './breakInside.ts';

/** Points on either side of a place at which a break is looked for; a smooth miss is a cubic over so few. */
const halfWindow = 8;
/** Ratio of the steepest to the flattest slope in the window: beyond it, the miss of any model is bent by the step itself. */
const calmest = 2.5;
/** Chance that one place shows such a break; two shapes are tried at every point of a run. */
const chance = 1e-7;
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

/** Where readings go against the titrant, three points before compared with three after so that a single wild one does nothing. */
function turnBack({ used, run, weighted, fit, index }: Analysis): Place | null {
  const order = byVolume(used.volumes);
  const { readings } = weighted.run;
  const direction = Math.sign(weighted.slopes.reduce((sum, slope) => sum + slope, 0));
  const least = Math.max(leastTurn * fit.noise[index].reading, 3 * readingResolution(readings));
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
function kink({ fit, weighted, used, run, robust, index }: Analysis): Place | null {
  const wild = new Set(robust?.distrusted.map(({ line }) => line));
  const order = byVolume(used.volumes).filter((i) => !wild.has(run.rows[used.rows[i]].line));
  const { volumes, readings } = weighted.run;
  const rounding = readingResolution(readings) / Math.sqrt(12);
  const degrees = 2 * halfWindow - 5;
  const least = studentQuantile(1 - 0.5 * chance, degrees);
  let strongest = least;
  let place: Place | null = null;
  for (let k = halfWindow; k + halfWindow <= order.length; k++) {
    const window = order.slice(k - halfWindow, k + halfWindow);
    const slopes = window.map((i) => Math.abs(weighted.slopes[i]));
    if (!(Math.max(...slopes) <= calmest * Math.min(...slopes))) continue;
    const sigma = window.map((i) => weighted.whitening.sigma[i]);
    const leastScatter = fit.noise[index].declared ? 1 : rounding / Math.max(...sigma);
    const strength = breakInside(
      window.map((i) => volumes[i]),
      window.map((i, j) => (weighted.predicted[i] - readings[i]) / sigma[j]),
      leastScatter,
    );
    if (!(strength > strongest)) continue;
    strongest = strength;
    place = { ...run.rows[used.rows[order[k]]], what: 'The residuals break off or bend sharply' };
  }
  return place;
}

function middle([a, b, c]: readonly number[]): number {
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
}
