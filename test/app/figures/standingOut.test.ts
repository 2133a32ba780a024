import { expect, test } from 'vitest';
import { crossedFigure } from '../../../app/figures/crossedFigure.ts';
import { figureCaption } from '../../../app/figures/figureCaption.ts';
import { defaultFrontSystems } from '../../../app/figures/frontSystems.ts';
import { paperStyle } from '../../../app/figures/paperStyle.ts';
import { exampleFrame } from './exampleFrame.ts';

test('points that stand out are marked in both panels and named in the caption', () => {
  const frame = exampleFrame({ distrusted: [5, 9], excluded: [9] });
  const { result } = frame.run;
  const { data } = crossedFigure(frame, defaultFrontSystems(result), paperStyle);
  const marked = result.points[3].volume_mL;
  // What is excluded has its cross already.
  expect(data.find(({ name }) => name === 'points that stand out')?.x).toEqual([marked]);
  expect(data.find(({ name }) => name === 'residuals that stand out')?.x).toEqual([marked]);
  expect(figureCaption(frame.run)).toContain('Diamonds: too far from the curve for chance, line 5.');
});

test('where nothing stands out nothing is marked', () => {
  const frame = exampleFrame();
  const { result } = frame.run;
  const { data } = crossedFigure(frame, defaultFrontSystems(result), paperStyle);
  expect(data.filter(({ name }) => name?.includes('stand out'))).toEqual([]);
  expect(figureCaption(frame.run)).not.toContain('Diamonds');
});
