import { coverage } from '../../inference/coverage.ts';
import type { Doubt } from '../../notice/doubt.ts';
import { studentQuantile } from '../../numerics/studentQuantile.ts';
import type { Analysis } from '../analysis.ts';

/** An end of the interval that lies this much nearer or farther than u says, relative, is worth a word. */
const noticeable = 0.3;

/** Fitted quantities whose interval by profile is not what the standard uncertainty alone would say. */
export function intervalsDisagree({ intervals, quantities }: Analysis): Doubt[] {
  return quantities.flatMap(({ id, label, state, value, u, interval95 }, q): Doubt[] => {
    const found = intervals.quantities[q];
    if (state !== 'fitted' || found === null || value === null || u === null || interval95 === null) return [];
    const [lower, upper] = interval95;
    if (lower === null || upper === null) return [];
    const half = studentQuantile(0.5 * (1 + coverage), found.degreesOfFreedom) * u;
    const [below, above] = [(value - lower) / half, (upper - value) / half];
    if (Math.max(Math.abs(below - 1), Math.abs(above - 1)) < noticeable) return [];
    return [
      {
        code: 'intervals-disagree',
        seen: `The 95 % interval of ${/^pK/.test(label) ? '' : 'the '}${label} reaches ${below.toFixed(2)} times as far down and ${above.toFixed(2)} times as far up as its standard uncertainty says.`,
        means:
          'The curve answers to this quantity in a bent way; u is only a rough measure here, and the interval is to be trusted.',
        remedy: 'State the interval, not value and u; do not carry u into further sums.',
        place: { quantity: id },
      },
    ];
  });
}
