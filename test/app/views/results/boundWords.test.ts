import { expect, test } from 'vitest';
import { boundWords } from '../../../../app/views/results/boundWords.ts';
import { fittedConstant } from './fittedConstant.ts';

const bound = { ...fittedConstant, value: null, u: null, whyNoU: 'bound' } as const;

test('a bound is rounded outwards, so that what is printed stays true', () => {
  expect(boundWords({ ...bound, interval95: [null, 2.1212] })).toBe('< 2.13');
  expect(boundWords({ ...bound, interval95: [11.2779, null] })).toBe('> 11.27');
  expect(boundWords({ ...bound, unit: 'mol/L', interval95: [null, 0.0020011] })).toBe('< 0.00201');
  expect(boundWords({ ...bound, unit: 'mol/L', interval95: [null, 0] })).toBe('< 0');
});

test('what has two ends or none has no bound', () => {
  expect(boundWords(fittedConstant)).toBe(null);
  expect(boundWords({ ...bound, whyNoU: 'undetermined', interval95: null })).toBe(null);
});
