import { expect, test } from 'vitest';
import { crossedFigure } from '../../../app/figures/crossedFigure.ts';
import type { Figure } from '../../../app/figures/figure.ts';
import type { FigureFrame } from '../../../app/figures/figureFrame.ts';
import { defaultFrontSystems } from '../../../app/figures/frontSystems.ts';
import { paperStyle } from '../../../app/figures/paperStyle.ts';
import { toPixels } from '../../../app/figures/pixelAxis.ts';
import { textWidth } from '../../../app/figures/textWidth.ts';
import { nernstSlope_mV } from '../../simulator/simulateRun.ts';
import { exampleFrame } from './exampleFrame.ts';

function figureOf(frame: FigureFrame, front = defaultFrontSystems(frame.run.result)): Figure {
  return crossedFigure(frame, front, paperStyle);
}

function trace(figure: Figure, name: string) {
  const found = figure.data.find((one) => one.name === name);
  if (found === undefined) throw new Error(`no trace ${name} among ${figure.data.map((one) => one.name).join(', ')}`);
  return found;
}

/** Labels of the figure as text, without tags. */
function texts(figure: Figure): string[] {
  return (figure.layout.annotations ?? []).map((one) => String(one.text).replaceAll(/<[^>]*>/g, ''));
}

const everyKind = [
  ['pH, wide', {}, 1200],
  ['pH, narrow', {}, 366],
  ['mV, wide', { kind: 'mV' }, 1200],
  ['mV, narrow', { kind: 'mV' }, 366],
  ['two systems, wide', { carbonate: true }, 900],
  ['two systems, narrow', { carbonate: true }, 366],
  ['six groups, wide', { pKa: [2, 2.7, 4, 6.2, 9, 9.6], chargeFullyProtonated: 2 }, 760],
  ['six groups, narrow', { pKa: [2, 2.7, 4, 6.2, 9, 9.6], chargeFullyProtonated: 2 }, 366],
  ['not fitted', { fitted: false }, 1200],
  ['no system', { speciation: false }, 1200],
  ['many points', { points: 8000, excluded: [17] }, 1200],
] as const;

test.each(everyKind)('%s: every number in traces and layout is a number', (_, wanted, width) => {
  const figure = figureOf(exampleFrame(wanted, width));
  const isSound = (value: unknown): boolean => {
    if (typeof value === 'number') return Number.isFinite(value);
    if (Array.isArray(value)) return value.every(isSound);
    return typeof value === 'object' && value !== null ? Object.values(value).every(isSound) : true;
  };
  for (const one of figure.data) expect([one.name, isSound(one)]).toEqual([one.name, true]);
  expect(isSound(figure.layout)).toBe(true);
});

test('used points are circles, excluded ones crosses, and none is missing', () => {
  const frame = exampleFrame({ excluded: [5, 9] });
  const figure = figureOf(frame);
  const used = trace(figure, 'points used');
  const excluded = trace(figure, 'points excluded');
  expect(used.marker?.symbol).toBe('circle-open');
  expect(excluded.marker?.symbol).toBe('x-thin');
  const points = frame.run.result.points;
  expect(used.x).toEqual(points.filter((point) => point.used).map((point) => point.volume_mL));
  expect(used.y).toEqual(points.filter((point) => point.used).map((point) => point.reading));
  expect(excluded.x).toEqual([points[3].volume_mL, points[7].volume_mL]);
  expect(excluded.y).toEqual([points[3].reading, points[7].reading]);
});

test('the curve and the residuals are those of the result, on one volume axis', () => {
  const frame = exampleFrame();
  const figure = figureOf(frame);
  const { curve, points } = frame.run.result;
  expect(trace(figure, 'fitted curve').x).toEqual([...(curve?.volume_mL ?? [])]);
  expect(trace(figure, 'fitted curve').y).toEqual([...(curve?.reading ?? [])]);
  const residuals = trace(figure, 'residuals');
  expect(residuals.y).toEqual(points.map((point) => point.residual));
  expect([residuals.xaxis, residuals.yaxis]).toEqual(['x', 'y2']);
  expect(figure.layout.yaxis2?.anchor).toBe('x');
});

test('the band goes out along one side and back along the other, twice the uncertainty wide', () => {
  const frame = exampleFrame();
  const band = trace(figureOf(frame), 'band of twice the uncertainty');
  const count = frame.run.points.length;
  expect(band.x?.length).toBe(2 * count);
  expect(band.y?.[0]).toBeCloseTo(0.01, 12);
  expect(band.y?.[2 * count - 1]).toBeCloseTo(-0.01, 12);
  expect(band.x?.[0]).toBe(band.x?.[2 * count - 1]);
});

test('an excluded point far off stands at the edge of the residuals as a triangle, and does not stretch them', () => {
  const frame = exampleFrame({ excluded: [20] });
  const far = { ...frame.run.points[18], residual: 2 };
  const run = { ...frame.run, points: frame.run.points.map((point, i) => (i === 18 ? far : point)) };
  const above = trace(figureOf({ ...frame, run }), 'excluded points above the panel');
  expect(above.x).toEqual([far.volume_mL]);
  expect(above.y).toEqual([frame.axes.residual?.range[1]]);
});

test('shares run sideways in per cent on the pH axis of the curve, each form with a look of its own', () => {
  const frame = exampleFrame();
  const figure = figureOf(frame);
  const names = ['H₃X⁺', 'H₂X', 'HX⁻', 'X²⁻'];
  const forms = names.map((name) => trace(figure, name));
  const { speciation } = frame.run.result;
  forms.forEach((form, k) => {
    const fraction = speciation?.systems[0].forms[k].fraction ?? new Float64Array(0);
    expect(form.x).toEqual(Array.from(fraction, (value) => 100 * value));
    expect(form.y).toEqual([...(speciation?.pH ?? [])]);
  });
  expect(new Set(forms.map((form) => `${form.line?.dash} ${form.line?.width}`)).size).toBe(4);
  expect(new Set(forms.map((form) => form.line?.color)).size).toBe(4);
  expect(figure.layout.yaxis3?.range).toEqual(figure.layout.yaxis?.range);
  expect(figure.layout.yaxis3?.domain).toEqual(figure.layout.yaxis?.domain);
  expect(figure.layout.xaxis2?.range).toEqual([0, 100]);
});

test('turned, the shares run upwards and the pH from left to right', () => {
  const figure = figureOf(exampleFrame({}, 366));
  expect(trace(figure, 'H₂X').x?.[0]).toBe(1);
  expect(figure.layout.yaxis3?.range).toEqual([0, 100]);
  expect(figure.layout.xaxis2?.range).toEqual(figure.layout.yaxis?.range);
});

test('millivolts carry the pH they mean at the right, linear and aligned', () => {
  const figure = figureOf(exampleFrame({ kind: 'mV' }));
  const mV = figure.layout.yaxis?.range as [number, number];
  const pH = figure.layout.yaxis4?.range as [number, number];
  // The electrode of the example: E = 400 mV − 59.16 mV · pH; 1e-9 for rounding.
  mV.forEach((end, k) => void expect(pH[k]).toBeCloseTo((400 - end) / nernstSlope_mV(25), 9));
  expect(figure.layout.yaxis3?.range).toEqual(pH);
  expect(texts(figure)).toEqual(expect.arrayContaining(['reading / mV', 'residual / mV', 'pH']));
  expect(figureOf(exampleFrame()).layout.yaxis4).toBeUndefined();
});

test('equivalence volumes have rules and labels; ticks of the derivative have none beside them', () => {
  const frame = exampleFrame();
  const figure = figureOf(frame);
  expect(texts(figure).filter((text) => text.endsWith('mL') && !text.includes('/'))).toEqual([
    '5.000 mL',
    '10.000 mL',
    '15.000 mL',
  ]);
  const dotted = (figure.layout.shapes ?? []).filter((shape) => shape.line?.dash === 'dot');
  expect(dotted.map((shape) => shape.x0 * frame.panels.width)).toEqual(
    [5, 10, 15].map((volume_mL) => expect.closeTo(toPixels(frame.axes.volume, volume_mL), 6)),
  );
});

test('without a fit the ticks of the derivative carry the labels', () => {
  const figure = figureOf(exampleFrame({ fitted: false }));
  expect(figure.data.map((one) => one.name)).toEqual(['points used']);
  expect(texts(figure)).toEqual(expect.arrayContaining(['5.03 mL', '10.03 mL', '15.03 mL']));
});

test('constants are marked where the forms cross, through both panels', () => {
  const frame = exampleFrame();
  const figure = figureOf(frame);
  expect(texts(figure).filter((text) => text.startsWith('pK'))).toEqual(['pKa1′ 3.00', 'pKa2′ 6.00', 'pKa3′ 9.50']);
  const { curve, speciation, height, width } = frame.panels;
  const rule = (figure.layout.shapes ?? []).find(
    (shape) => Math.abs((1 - shape.y0) * height - toPixels(frame.axes.reading, 6)) < 1e-6 && shape.y0 === shape.y1,
  );
  expect(rule?.x0 * width).toBeCloseTo(curve.left, 6);
  expect(rule?.x1 * width).toBeCloseTo((speciation?.left ?? 0) + (speciation?.width ?? 0), 6);
});

test('what is zoomed out of sight has no rule and no label', () => {
  const figure = figureOf(exampleFrame({}, 1200, { volume: [7, 12], reading: [5, 8] }));
  expect(texts(figure).filter((text) => text.startsWith('pK'))).toEqual(['pKa2′ 6.00']);
  expect(texts(figure).filter((text) => /^\d.* mL$/.test(text))).toEqual(['10.000 mL']);
});

test('carbonate stays behind the analyte, without names and constants, until it is brought to the front', () => {
  const frame = exampleFrame({ carbonate: true });
  const behind = figureOf(frame);
  expect(texts(behind)).not.toContain('HCO3−');
  expect(trace(behind, 'HCO₃⁻').line?.width).toBeLessThan(1);
  expect(texts(behind)).toContain('pKa1′ 3.00');
  const front = figureOf(frame, new Set(['', 'carbonate.']));
  expect(texts(front)).toEqual(expect.arrayContaining(['CO2', 'HCO3−', 'CO32−', 'pKa1′ (CO2) 6.35', 'pKa1′ (X) 3.00']));
  const colours = front.data.slice(-7).map((one) => one.line?.color);
  expect(new Set(colours).size).toBe(7);
});

test.each(everyKind)('%s: no label lies on another or outside the figure', (_, wanted, width) => {
  const frame = exampleFrame(wanted, width);
  const every = new Set(frame.run.result.speciation?.systems.map((system) => system.prefix));
  const boxes = (figureOf(frame, every).layout.annotations ?? []).map((one) => {
    const size = one.font?.size ?? 0;
    const text = String(one.text).replaceAll(/<[^>]*>/g, '');
    const turned = one.textangle === -90;
    // Sub- and superscripts are smaller than here; the allowance of the estimate is taken off again.
    const long = textWidth(text, size) / 1.08;
    const [across, up] = turned ? [size, long] : [long, size];
    const share = { left: 0, center: 0.5, right: 1, auto: 0.5 }[one.xanchor ?? 'auto'];
    const drop = { top: 0, middle: 0.5, bottom: 1, auto: 0.5 }[one.yanchor ?? 'auto'];
    const left = one.x * frame.panels.width - share * across;
    const top = (1 - one.y) * frame.panels.height - drop * up;
    return { text, left, top, right: left + across, bottom: top + up };
  });
  const touching = boxes.flatMap((a, i) =>
    boxes
      .slice(i + 1)
      .filter((b) => a.left < b.right - 1 && b.left < a.right - 1 && a.top < b.bottom - 1 && b.top < a.bottom - 1)
      .map((b) => `${a.text} on ${b.text}`),
  );
  expect(touching).toEqual([]);
  const outside = boxes.filter(
    (box) =>
      box.left < -1 || box.top < -1 || box.right > frame.panels.width + 1 || box.bottom > frame.panels.height + 1,
  );
  expect(outside.map((box) => box.text)).toEqual([]);
});

test.each(everyKind.filter(([, wanted]) => !('fitted' in wanted) && !('speciation' in wanted)))(
  '%s: every form of the analyte is named',
  (_, wanted, width) => {
    const frame = exampleFrame(wanted, width);
    const figure = figureOf(frame);
    const forms = frame.run.result.speciation?.systems[0].forms.length ?? 0;
    expect(texts(figure).filter((text) => /^H?\d?X/.test(text)).length).toBe(forms);
  },
);

test('thousands of points are thinned in the drawing and come back on enlarging', () => {
  const count = (view: { volume?: [number, number] }) =>
    trace(figureOf(exampleFrame({ points: 8000 }, 1200, view)), 'points used').x?.length ?? 0;
  expect(count({})).toBeLessThanOrEqual(3000);
  // 8,000 points over 18 mL: some 890 in 2 mL, and one on either side.
  expect(count({ volume: [4, 6] })).toBe(891);
});
