import { expect, test } from 'vitest';
import { readingOfPH } from '../../../app/figures/pHLink.ts';
import { fromPixels, toPixels } from '../../../app/figures/pixelAxis.ts';
import { exampleFrame } from './exampleFrame.ts';

test.each(['pH', 'mV'] as const)(
  'in %s a pH beside the curve lies on the height of the reading that it gives',
  (kind) => {
    const { axes, run } = exampleFrame({ kind });
    if (axes.pH === null || run.link === null) throw new Error('the example has a speciation');
    for (const pH of [3, 6, 9.5]) {
      // 1e-6 px: rounding of a straight line through two points.
      expect(toPixels(axes.pH, pH)).toBeCloseTo(toPixels(axes.reading, readingOfPH(run.link, pH)), 6);
    }
  },
);

test('millivolts rise upwards, so their pH rises downwards', () => {
  const { axes } = exampleFrame({ kind: 'mV' });
  expect(axes.reading.range[1]).toBeGreaterThan(axes.reading.range[0]);
  expect(axes.pH?.range[0]).toBeGreaterThan(axes.pH?.range[1] ?? Number.NaN);
});

test('beside each other the panels do not touch, and the readout stands in the free corner', () => {
  const { panels } = exampleFrame({ kind: 'mV', carbonate: true }, 900);
  const { curve, residuals, speciation, readout } = panels;
  if (residuals === null || speciation === null) throw new Error('the example has every panel');
  expect(panels.arrangement).toBe('beside');
  expect(residuals.left).toBe(curve.left);
  expect(residuals.width).toBe(curve.width);
  expect(residuals.top).toBeGreaterThan(curve.top + curve.height);
  expect(speciation.top).toBe(curve.top);
  expect(speciation.height).toBe(curve.height);
  expect(speciation.left).toBeGreaterThan(curve.left + curve.width);
  expect(readout.left).toBeGreaterThan(residuals.left + residuals.width);
  expect(readout.top).toBeGreaterThan(speciation.top + speciation.height);
  expect(readout.left + readout.width).toBeLessThanOrEqual(panels.width);
});

test('on a narrow page the speciation is turned and stands below, its pH from left to right', () => {
  const { panels, axes } = exampleFrame({ kind: 'mV' }, 366);
  expect(panels.arrangement).toBe('below');
  expect(panels.speciation?.top).toBeGreaterThan(panels.readout.top + panels.readout.height);
  if (axes.pH === null) throw new Error('the example has a speciation');
  expect(axes.pH.range[0]).toBeLessThan(axes.pH.range[1]);
  expect(axes.pH.pixels).toEqual(axes.volume.pixels);
});

test('without speciation the curve takes the width, without a fit there are no residuals', () => {
  const alone = exampleFrame({ speciation: false });
  expect(alone.panels.arrangement).toBe('alone');
  expect(alone.panels.speciation).toBeNull();
  expect(alone.panels.residuals).not.toBeNull();
  expect(alone.panels.curve.width).toBeGreaterThan(1000);
  const unfitted = exampleFrame({ fitted: false });
  expect(unfitted.panels.residuals).toBeNull();
  expect(unfitted.axes.residual).toBeNull();
  expect(unfitted.panels.curve.height).toBeGreaterThan(alone.panels.curve.height);
});

test('the whole view shows every point, and a constant a little beyond the readings', () => {
  const { run, view } = exampleFrame({ pKa: [1.9, 6] });
  for (const { volume_mL, reading } of run.points) {
    expect(volume_mL).toBeGreaterThan(view.volume[0]);
    expect(volume_mL).toBeLessThan(view.volume[1]);
    expect(reading).toBeGreaterThan(view.reading[0]);
    expect(reading).toBeLessThan(view.reading[1]);
  }
  expect(Math.min(...run.points.map((point) => point.reading))).toBeGreaterThan(1.9);
  expect(view.reading[0]).toBeLessThan(1.9);
});

test('the residual axis is symmetric, fits the points in view, and does not follow an excluded outlier', () => {
  const frame = exampleFrame();
  const [low, high] = frame.axes.residual?.range ?? [0, 0];
  expect(low).toBe(-high);
  const largest = Math.max(...frame.run.points.map((point) => Math.abs(point.residual ?? 0)));
  expect(high).toBeGreaterThan(largest);
  expect(high).toBeLessThan(2 * largest);
  const worst = frame.run.points.find((point) => Math.abs(point.residual ?? 0) === largest);
  const without = exampleFrame({ excluded: [worst?.line ?? 0] });
  expect(without.axes.residual?.range[1]).toBeLessThan(high);
});

test('pixels turn back into the numbers they stand for', () => {
  const { axes } = exampleFrame();
  expect(fromPixels(axes.volume, toPixels(axes.volume, 7.3))).toBeCloseTo(7.3, 9);
  expect(fromPixels(axes.reading, toPixels(axes.reading, 4.4))).toBeCloseTo(4.4, 9);
});
