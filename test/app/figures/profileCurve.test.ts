import { expect, test } from 'vitest';
import { profileCurve } from '../../../app/figures/profileCurve.ts';
import { fittedConstant } from '../views/results/fittedConstant.ts';

const at = (value: number, rise: number) => ({ value, rise });
/** u is 0.01. */
const profile = [at(2.91, 4), at(2.93, 0), at(2.96, 4)];

test('the curve goes through every refit and reaches the threshold where the interval ends', () => {
  const drawn = profileCurve({ ...fittedConstant, profile });
  expect(drawn?.threshold).toBeCloseTo(4, 12);
  expect(drawn?.curve[0]).toEqual([2.91, 4]);
  const lowest = Math.min(...(drawn?.curve.map(([, rise]) => rise) ?? []));
  // One of 80 steps beside the minimum the rise is at most 4 (1/32)².
  expect(lowest).toBeLessThan(0.004);
});

test('the parabola is that of the standard uncertainty', () => {
  const drawn = profileCurve({ ...fittedConstant, profile });
  for (const [value, rise] of drawn?.parabola ?? []) expect(rise).toBeCloseTo(((value - 2.93) / 0.01) ** 2, 9);
  expect(drawn?.parabola.length).toBeGreaterThan(20);
});

test('no profile is drawn where none was taken, or where it is not about the value', () => {
  expect(profileCurve(fittedConstant)).toBe(null);
  expect(profileCurve({ ...fittedConstant, profile: [at(-2, 4), at(0, 0), at(2, 4)] })).toBe(null);
});

test('a bound has a profile without a parabola', () => {
  const bound = { ...fittedConstant, value: null, u: null, whyNoU: 'bound', interval95: [null, 2.1] } as const;
  const drawn = profileCurve({ ...bound, profile: [at(-4, 1), at(0, 0.5), at(1.5, 0), at(2.1, 4)] });
  expect(drawn?.parabola).toEqual([]);
  expect(drawn?.threshold).toBeCloseTo(4, 12);
});
