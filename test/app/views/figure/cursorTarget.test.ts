import { expect, test } from 'vitest';
import { toPixels } from '../../../../app/figures/pixelAxis.ts';
import { cursorOf, targetAt } from '../../../../app/views/figure/cursorTarget.ts';
import { exampleFrame } from '../../figures/exampleFrame.ts';

test('over curve and residuals the cursor follows the volume, over the speciation the pH', () => {
  const frame = exampleFrame();
  const { axes, panels, run } = frame;
  const x = toPixels(axes.volume, 6);
  const onCurve = cursorOf(run, targetAt(frame, x, panels.curve.top + 20));
  const onResiduals = cursorOf(run, targetAt(frame, x, (panels.residuals?.top ?? 0) + 20));
  expect(onCurve?.volume_mL).toBeCloseTo(6, 9);
  expect(onResiduals).toEqual(onCurve);
  if (axes.pH === null || panels.speciation === null) throw new Error('the example has a speciation');
  const onForms = cursorOf(run, targetAt(frame, panels.speciation.left + 20, toPixels(axes.pH, 6.2)));
  expect(onForms?.pH).toBeCloseTo(6.2, 9);
  expect(targetAt(frame, 2, 2)).toBeNull();
});

test('a point chosen by keys stays within the run when rows disappear from it', () => {
  const { run } = exampleFrame({ points: 10 });
  expect(cursorOf(run, { kind: 'point', index: 42 })?.point).toBe(9);
  expect(cursorOf(run, null)).toBeNull();
});
