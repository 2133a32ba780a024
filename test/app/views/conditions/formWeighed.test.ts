import { expect, test } from 'vitest';
import { formWeighed, kindsOfGroup } from '../../../../app/views/conditions/formWeighed.ts';

test.each([
  [3, 0, 0, 'the free acid'],
  [3, 0, 1, 'the monosodium salt'],
  [2, 0, 2, 'the disodium salt'],
  [1, 0, 1, 'the sodium salt'],
  [1, 1, 0, 'the hydrochloride'],
  [3, 2, 0, 'the dihydrochloride'],
  [2, 2, 2, 'the free base'],
  [2, 1, 1, 'the zwitterion or neutral form'],
  [2, 1, 2, 'the monosodium salt'],
  [1, -1, 0, 'the form of charge −1'],
])(
  '%d groups, charge %d fully protonated, %d protons lost: %s',
  (groups, chargeFullyProtonated, protonsLost, words) => {
    expect(formWeighed(groups, { chargeFullyProtonated, protonsLost })).toBe(words);
  },
);

test('the charge of the fully protonated form says which groups there are', () => {
  expect([0, 1, 3, -1].map((charge) => kindsOfGroup(3, charge))).toEqual([
    'three acid groups',
    'two acid and one basic group',
    'three basic groups',
    'fully protonated form of charge −1',
  ]);
});
