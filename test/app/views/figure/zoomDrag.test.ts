import { expect, test } from 'vitest';
import { toPixels } from '../../../../app/figures/pixelAxis.ts';
import { markedByDrag, viewOfDrag } from '../../../../app/views/figure/zoomDrag.ts';
import { exampleFrame } from '../../figures/exampleFrame.ts';

const frame = exampleFrame({ kind: 'mV' });
const x = (volume_mL: number) => toPixels(frame.axes.volume, volume_mL);
const y = (reading: number) => toPixels(frame.axes.reading, reading);

test('a level drag over the curve enlarges the volume alone, over the whole height', () => {
  const drag = { panel: 'curve', from: [x(4), y(0)], to: [x(8), y(0) + 10] } as const;
  const view = viewOfDrag(frame, drag);
  expect(view.volume[0]).toBeCloseTo(4, 6);
  expect(view.volume[1]).toBeCloseTo(8, 6);
  expect(view.reading).toEqual(frame.view.reading);
  expect(markedByDrag(frame, drag)).toMatchObject({
    top: frame.panels.curve.top,
    height: frame.panels.curve.height,
  });
});

test('an upright drag enlarges the reading alone, a slanting one both', () => {
  const upright = viewOfDrag(frame, { panel: 'curve', from: [x(4), y(100)], to: [x(4) + 5, y(-100)] });
  expect(upright.volume).toEqual(frame.view.volume);
  expect(upright.reading[0]).toBeCloseTo(-100, 6);
  const both = viewOfDrag(frame, { panel: 'curve', from: [x(8), y(100)], to: [x(4), y(-100)] });
  expect(both.volume[0]).toBeCloseTo(4, 6);
  expect(both.reading[1]).toBeCloseTo(100, 6);
});

test('over the residuals only the volume is enlarged', () => {
  const top = frame.panels.residuals?.top ?? 0;
  const view = viewOfDrag(frame, { panel: 'residuals', from: [x(4), top], to: [x(8), top + 60] });
  expect(view.reading).toEqual(frame.view.reading);
  expect(view.volume[1]).toBeCloseTo(8, 6);
});

test('over the speciation the pH is enlarged, and with it the reading, beside the curve and below it', () => {
  const narrow = exampleFrame({ kind: 'mV' }, 366);
  for (const one of [frame, narrow]) {
    const { pH } = one.axes;
    const { speciation, arrangement } = one.panels;
    if (pH === null || speciation === null) throw new Error('the example has a speciation');
    const at = (value: number): readonly [number, number] =>
      arrangement === 'below'
        ? [toPixels(pH, value), speciation.top + 10]
        : [speciation.left + 10, toPixels(pH, value)];
    const view = viewOfDrag(one, { panel: 'speciation', from: at(5), to: at(8) });
    expect(view.volume).toEqual(one.view.volume);
    // The electrode of the example: 400 mV − 59.16 mV · pH.
    expect(view.reading[0]).toBeCloseTo(400 - 8 * 59.159, 1);
    expect(view.reading[1]).toBeCloseTo(400 - 5 * 59.159, 1);
  }
});
