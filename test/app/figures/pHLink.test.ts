import { expect, test } from 'vitest';
import { pHLink, pHOfReading, readingOfPH } from '../../../app/figures/pHLink.ts';
import { nernstSlope_mV } from '../../simulator/simulateRun.ts';
import { exampleResult } from './exampleResult.ts';

function linkOf(wanted: Parameters<typeof exampleResult>[0]) {
  const link = pHLink(exampleResult(wanted));
  if (link === null) throw new Error('the example says what its readings mean');
  return link;
}

test('millivolts mean what the electrode equation says, on an axis of their own', () => {
  const link = linkOf({ kind: 'mV' });
  expect(link.separate).toBe(true);
  // 1e-9: a straight line through two of its own points, rounding alone.
  expect(pHOfReading(link, 400)).toBeCloseTo(0, 9);
  expect(pHOfReading(link, 400 - 7 * nernstSlope_mV(25))).toBeCloseTo(7, 9);
  expect(readingOfPH(link, pHOfReading(link, -123.4))).toBeCloseTo(-123.4, 9);
});

test('an ideal pH needs no second axis, nor does an offset of a line or two', () => {
  expect(linkOf({})).toMatchObject({ slope: 1, intercept: 0, separate: false });
  expect(linkOf({ offset: 0.02 }).separate).toBe(false);
  expect(pHOfReading(linkOf({ offset: 0.02 }), 7.02)).toBeCloseTo(7, 9);
});

test('an offset that shows gets its axis', () => {
  expect(linkOf({ offset: 0.3 }).separate).toBe(true);
});

test('millivolts that stand still say nothing about pH, a pH that stands still does', () => {
  const still = (kind: 'pH' | 'mV') => {
    const result = exampleResult({ kind, fitted: false });
    return pHLink({ ...result, points: result.points.map((point) => ({ ...point, reading: 5, pH: 5 })) });
  };
  expect(still('mV')).toBeNull();
  expect(still('pH')).toEqual({ slope: 1, intercept: 0, separate: false });
});
