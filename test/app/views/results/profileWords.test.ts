import { expect, test } from 'vitest';
import { profileCurve } from '../../../../app/figures/profileCurve.ts';
import { profileWords } from '../../../../app/views/results/profileWords.ts';
import type { QuantityResult } from '../../../../core/index.ts';
import { fittedConstant } from './fittedConstant.ts';

const words = (quantity: QuantityResult) => {
  const profile = profileCurve(quantity);
  return profile === null ? null : profileWords(quantity, profile);
};
const at = (value: number, rise: number) => ({ value, rise });

test('a profile that is a parabola says that both give the same', () => {
  const even = { ...fittedConstant, interval95: [2.91, 2.95] as const };
  expect(words({ ...even, profile: [at(2.91, 4), at(2.93, 0), at(2.95, 4)] })).toContain(
    'Both give the same interval.',
  );
});

test('a lopsided profile tells how far it reaches on either side', () => {
  const lopsided = { ...fittedConstant, profile: [at(2.91, 4), at(2.93, 0), at(2.96, 4)] };
  expect(words(lopsided)).toContain('0.020 down and 0.030 up, where the standard uncertainty alone would say 0.020');
});

test('a bound tells on which side the profile stays open', () => {
  const bound = { ...fittedConstant, value: null, u: null, whyNoU: 'bound', interval95: [null, 2.1] } as const;
  expect(words({ ...bound, profile: [at(-4, 1), at(0, 0.5), at(1.5, 0), at(2.1, 4)] })).toContain(
    'Towards lower values',
  );
});
