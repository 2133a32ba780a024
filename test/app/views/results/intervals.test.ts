import { expect, test } from 'vitest';
import { intervalScale } from '../../../../app/views/results/intervalScale.ts';
import { intervalWords } from '../../../../app/views/results/intervalWords.ts';
import { whyNoNumber } from '../../../../app/views/results/whyNoNumber.ts';
import { fittedConstant } from './fittedConstant.ts';

test('an interval is told as it is: two-sided, one-sided, none', () => {
  expect(intervalWords(fittedConstant)).toBe('2.910–2.960');
  expect(intervalWords({ ...fittedConstant, value: 0, interval95: [-0.02, 0.01] })).toBe('−0.020 to 0.010');
  const bound = { ...fittedConstant, value: null, u: null, whyNoU: 'bound' } as const;
  expect(intervalWords({ ...bound, interval95: [null, 2.1] })).toBe('below 2.1');
  expect(intervalWords({ ...bound, interval95: [11.2, null] })).toBe('above 11.2');
  expect(intervalWords({ ...bound, interval95: null })).toBe(null);
});

test('whatever has no uncertainty says why', () => {
  expect(whyNoNumber(fittedConstant)).toBe(null);
  expect(whyNoNumber({ ...fittedConstant, u: null, whyNoU: 'undetermined' })).toBe('not determined by this run');
  expect(whyNoNumber({ ...fittedConstant, u: null, whyNoU: null })).toBe('no uncertainty could be computed');
});

test('fitted constants are drawn on one scale: that of the widest', () => {
  const wider = { ...fittedConstant, id: 'pKa2', value: 6, interval95: [5.9, 6.3] } as const;
  const other = { ...fittedConstant, id: 'concentration', value: 1, interval95: [0, 9] } as const;
  const all = [fittedConstant, wider, other];
  expect(intervalScale(fittedConstant, all, null)?.halfWidth).toBeCloseTo(0.3, 12);
  expect(intervalScale(other, all, null)?.halfWidth).toBe(8);
});

test('a known quantity is drawn on what was declared of it, however far it moved', () => {
  const moved = {
    ...fittedConstant,
    id: 'reading.offset',
    state: 'known',
    value: -0.1,
    interval95: [-0.12, -0.08],
  } as const;
  const scale = intervalScale(moved, [moved], { state: 'known', value: 0, u: 0.01, source: null, assumed: false });
  expect(scale).toMatchObject({ centre: 0, halfWidth: 0.12 });
  // 1.960 u of a normal distribution.
  expect(scale?.declared?.[1]).toBeCloseTo(0.0196, 5);
});

test('a bound is not drawn', () => {
  expect(intervalScale({ ...fittedConstant, interval95: [null, 2] }, [], null)).toBe(null);
});
