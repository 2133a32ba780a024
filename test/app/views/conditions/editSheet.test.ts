import { expect, test } from 'vitest';
import { whatIsWrong } from '../../../../app/views/conditions/editSheet.ts';
import { runNamed } from '../../state/stubClient.ts';

const run = runNamed('a');

test('a value out of range is answered with what belongs there', () => {
  const wrong = whatIsWrong({ sheet: 1, sample: { volume_mL: { value: -3, u: 0.1 } } }, run, null);
  expect(wrong).toMatch(/^Here belongs a number above 0 .*100000\.$/);
});

test('conditions that contradict each other are answered with the contradiction', () => {
  const wrong = whatIsWrong({ sheet: 1, medium: { solvent: 'ethanol' } }, run, null);
  expect(wrong).toContain('ethanol');
});

test('what is in order has no answer', () => {
  expect(whatIsWrong({ sheet: 1, sample: { volume_mL: 20 } }, run, null)).toBe(null);
});
