import type { QuantityResult } from '../../../core/index.ts';
import type { ProfileCurve } from '../../figures/profileCurve.ts';
import { formatQuantity } from '../../widgets/formatQuantity.ts';

/** Reaches that differ by less than this part are the same to the reader. */
const same = 0.05;

/** What a drawn profile shows, in sentences. */
export function profileWords(quantity: QuantityResult, { threshold, parabola }: ProfileCurve): string {
  const { label, value, u, interval95 } = quantity;
  const drawn = `Rise of the weighted sum of squares when ${label} is held and all else is fitted anew (dots: computed)${
    parabola.length === 0 ? '' : '; dashed: what the standard uncertainty alone would say'
  }.`;
  const [low, high] = interval95 ?? [null, null];
  if (threshold === null) return `${drawn} It never rises enough to end an interval.`;
  if (low === null || high === null) {
    const side = low === null ? 'lower' : 'higher';
    return `${drawn} Towards ${side} values it never reaches the line, so that there is a bound and no value.`;
  }
  if (value === null || u === null) return drawn;
  const even = Math.sqrt(threshold) * u;
  const [down, up] = [value - low, high - value];
  if (Math.max(Math.abs(down / even - 1), Math.abs(up / even - 1)) < same)
    return `${drawn} Both give the same interval.`;
  const show = (reach: number) => formatQuantity(reach, u, 2).value;
  return `${drawn} The interval reaches ${show(down)} down and ${show(up)} up, where the standard uncertainty alone would say ${show(even)} either way.`;
}
