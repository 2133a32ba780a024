import { expect, test } from 'vitest';
import { toPixels } from '../../../../app/figures/pixelAxis.ts';
import { panelAt } from '../../../../app/views/figure/figurePanel.ts';
import { pointAt } from '../../../../app/views/figure/pointAt.ts';
import { exampleFrame } from '../../figures/exampleFrame.ts';

const frame = exampleFrame();
const { volume, reading, residual } = frame.axes;
const { volume_mL, reading: value, residual: difference } = frame.run.points[20];

test('a point is hit on its mark in the curve and in the residuals, and missed a finger away', () => {
  const x = toPixels(volume, volume_mL);
  const y = toPixels(reading, value);
  expect(pointAt(frame, 'curve', x + 3, y - 3)).toBe(20);
  expect(pointAt(frame, 'curve', x, y - 60)).toBeNull();
  if (residual === null) throw new Error('the example has residuals');
  expect(pointAt(frame, 'residuals', x, toPixels(residual, difference ?? 0))).toBe(20);
  expect(pointAt(frame, 'speciation', x, y)).toBeNull();
});

test('each place belongs to the panel it lies in', () => {
  const { curve, residuals, speciation } = frame.panels;
  const middle = (panel: { left: number; top: number; width: number; height: number } | null) =>
    panel === null ? null : panelAt(frame, panel.left + panel.width / 2, panel.top + panel.height / 2);
  expect([middle(curve), middle(residuals), middle(speciation), panelAt(frame, 2, 2)]).toEqual([
    'curve',
    'residuals',
    'speciation',
    null,
  ]);
});
