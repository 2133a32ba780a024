import { expect, test } from 'vitest';
import { formLabel, symbolOfSystem } from '../../../app/figures/formLabel.ts';
import { toMarkup, toUnicode } from '../../../app/figures/richText.ts';
import type { SpeciationResult } from '../../../core/index.ts';

type System = SpeciationResult['systems'][number];

function system(name: string, role: System['role'], groups: number, charge: number): System {
  return {
    name,
    prefix: name,
    role,
    forms: Array.from({ length: groups + 1 }, (_, lost) => ({
      charge: charge - lost,
      protons: groups - lost,
      fraction: new Float64Array(0),
    })),
    crossings: [],
    isoelectricPoint: null,
  };
}

function labelsOf(systems: readonly System[]): string[][] {
  const speciation: SpeciationResult = { pH: new Float64Array(0), systems };
  return systems.map((one) => one.forms.map((_, form) => toUnicode(formLabel(speciation, one, form))));
}

test('forms say their protons and their charge', () => {
  expect(labelsOf([system('ampholyte', 'analyte', 3, 2)])).toEqual([['H₃X²⁺', 'H₂X⁺', 'HX', 'X⁻']]);
  expect(labelsOf([system('acid', 'analyte', 6, 2)])).toEqual([
    ['H₆X²⁺', 'H₅X⁺', 'H₄X', 'H₃X⁻', 'H₂X²⁻', 'HX³⁻', 'X⁴⁻'],
  ]);
});

test('carbonate has its formulas, and takes no letter from the others', () => {
  expect(
    labelsOf([
      system('first', 'analyte', 1, 1),
      system('carbonate', 'carbonate', 2, 0),
      system('counter', 'counterIon', 1, 0),
    ]),
  ).toEqual([
    ['HX⁺', 'X'],
    ['CO₂', 'HCO₃⁻', 'CO₃²⁻'],
    ['HY', 'Y⁻'],
  ]);
});

test.each([
  'sodium carbonate',
  'Carbonate',
  'potassium hydrogencarbonate',
  'sodium bicarbonate',
  'sodium hydrogen carbonate',
])('an analyte named %s has the forms of carbonic acid', (name) => {
  expect(labelsOf([system(name, 'analyte', 2, 0)])[0][1]).toBe('HCO₃⁻');
});

test.each([
  ['phenyl carbonate', 2, 0],
  ['sodium carbonate', 1, 0],
  ['sodium carbonate', 2, 1],
])('%s with %i groups and charge %i keeps a letter', (name, groups, charge) => {
  const one = system(name, 'analyte', groups, charge);
  expect(symbolOfSystem({ pH: new Float64Array(0), systems: [one] }, one)).toBe('X');
});

test('the plotting library gets tags, and no character of ours is taken for one', () => {
  const one = system('ampholyte', 'analyte', 3, 2);
  expect(toMarkup(formLabel({ pH: new Float64Array(0), systems: [one] }, one, 0))).toBe('H<sub>3</sub>X<sup>2+</sup>');
  expect(toMarkup([{ text: 'a<b & c', at: 'line' }])).toBe('a&lt;b &amp; c');
});
