import { expect, test } from 'vitest';
import { constantWords } from '../../../../app/views/results/constantWords.ts';

const constant = {
  kind: 'thermodynamic',
  temperature_C: 25,
  ionicStrength_M: 0.1004,
  thermodynamic: 9.5222,
  concentration: 9.307,
  mixed: 9.4146,
} as const;

/** With breaking spaces. */
const plain = (text: string) => text.replaceAll('\u00a0', ' ');

test('a constant says what it is, where it holds, and what the other kinds are', () => {
  expect(plain(constantWords(constant, 3))).toBe(
    'thermodynamic, 25.0 °C; at I = 0.100 M: concentration 9.307, mixed 9.415',
  );
  expect(plain(constantWords({ ...constant, kind: 'mixed', thermodynamic: null, concentration: null }, 2))).toBe(
    'mixed constant, 25.0 °C, I = 0.100 M',
  );
});
