import { expect, test } from 'vitest';
import { samples } from '../../../../app/state/samples.ts';
import { buildSentence } from '../../../../app/views/conditions/buildSentence.ts';
import type { SentenceField, SentencePart } from '../../../../app/views/conditions/sentence.ts';
import { completeSheet, parseSheet, type Sheet, type SheetFile } from '../../../../core/index.ts';

const facts = { readingKind: 'pH', titrantKind: 'base', groupsIfOpen: 3 } as const;

function completed(file: SheetFile): Sheet {
  const outcome = completeSheet(file, facts);
  if (!outcome.ok) throw new Error(outcome.refusals[0].message);
  return outcome.value;
}

function sheetOf(sample: number): SheetFile {
  const parsed = parseSheet(samples[sample].sheet, samples[sample].fileName);
  if (!parsed.ok) throw new Error(parsed.refusals[0].message);
  return parsed.value;
}

const isField = (part: SentencePart): part is SentenceField => typeof part !== 'string';
const fieldsOf = (file: SheetFile): SentenceField[] => {
  const { main, more } = buildSentence(file, completed(file));
  return [...main, ...more].filter(isField);
};
const read = (parts: readonly SentencePart[]) =>
  parts
    .map((part) => (typeof part === 'string' ? part : part.text))
    .join('')
    .replaceAll('\u00a0', ' ');
const field = (file: SheetFile, id: string): SentenceField => {
  const found = fieldsOf(file).find((candidate) => candidate.id === id);
  if (found === undefined) throw new Error(`no field ${id}`);
  return found;
};

test('a sheet that says all reads as a sentence of a method section', () => {
  const file = sheetOf(0);
  const { main } = buildSentence(file, completed(file));
  expect(read(main)).toBe(
    '25.00 mL (tolerance ±0.03 mL, triangular) of sample holding OM-217, 3 ionisable groups, ' +
      'weighed as the dihydrochloride (no proton lost), concentration to be fitted, ' +
      'pKa₁ to be fitted, pKa₂ to be fitted and pKa₃ to be fitted; in 0.10 M background electrolyte, ' +
      'titrated with 0.1002 M (u = 0.0001 M) NaOH, a strong base, carrying 0.0003 M (u = 0.0001 M) carbonate, ' +
      'its strength meaning hydroxide and carbonate, to hydrogencarbonate, at 25.0 °C, ' +
      'read as pH on the activity scale, electrode offset 0 (u = 0.01); activity coefficients by Davies, pKw 13.997.',
  );
  expect(fieldsOf(file).filter(({ assumed }) => assumed)).toEqual([]);
});

test('ids of fields are unique, so that results and focus find them', () => {
  for (const sample of samples.keys()) {
    const ids = fieldsOf(sheetOf(sample)).map(({ id }) => id);
    expect(new Set(ids).size, samples[sample].fileName).toBe(ids.length);
  }
});

test('confirming all that an empty sheet assumes leaves nothing assumed and changes no value', () => {
  const empty: SheetFile = { sheet: 1 };
  const assumed = fieldsOf(empty).filter(({ confirm }) => confirm !== null);
  expect(assumed.length).toBeGreaterThan(10);
  const confirmed = assumed.reduce((file, { confirm }) => confirm?.(file) ?? file, empty);
  expect(parseSheet(JSON.stringify(confirmed), 'confirmed')).toMatchObject({ ok: true });
  expect(fieldsOf(confirmed).filter((candidate) => candidate.assumed)).toEqual([]);
  const words = (file: SheetFile) => read(buildSentence(file, completed(file)).main);
  expect(words(confirmed)).toBe(words(empty));
});

test('naming one constant of several writes the others as fitted', () => {
  const { editor } = field({ sheet: 1 }, 'pKa2');
  if (editor.kind !== 'quantity') throw new Error('a constant is a quantity');
  const edited = editor.set({ sheet: 1 }, 6.4);
  expect(edited.sample?.analytes).toEqual([{ pKa: ['fitted', 6.4, 'fitted'] }]);
});

test('changing the number of groups keeps constants and lost protons in step', () => {
  const file: SheetFile = {
    sheet: 1,
    sample: { analytes: [{ groups: 3, chargeFullyProtonated: 0, protonsLostAsWeighed: 3, pKa: [2, 'fitted', 9] }] },
  };
  const { editor } = field(file, 'groups');
  if (editor.kind !== 'choice') throw new Error('a number of groups is a choice');
  const choose = (label: RegExp) =>
    editor.options.find((option) => label.test(option.label))?.edit(file).sample?.analytes;
  expect(choose(/^2 /)).toMatchObject([{ groups: 2, protonsLostAsWeighed: 2, pKa: [2, 'fitted'] }]);
  expect(choose(/^4 /)).toMatchObject([{ groups: 4, protonsLostAsWeighed: 3, pKa: [2, 'fitted', 9, 'fitted'] }]);
  expect(choose(/let the run show/)).toEqual([{ chargeFullyProtonated: 0, protonsLostAsWeighed: 3 }]);
});

test('every way in which a substance can be chosen to be weighed is accepted', () => {
  const file = sheetOf(0);
  const { editor } = field(file, 'form');
  if (editor.kind !== 'choice') throw new Error('a form is a choice');
  expect(editor.options).toHaveLength(16);
  expect(editor.options.filter(({ isChosen }) => isChosen)).toHaveLength(1);
  for (const { label, edit } of editor.options) {
    expect(completeSheet(edit(file), facts), label).toMatchObject({ ok: true });
  }
});

test('fields of two substances write each to its own place', () => {
  const file: SheetFile = {
    sheet: 1,
    sample: { analytes: [{ groups: 0 }, { groups: 1 }, { name: 'second', groups: 2 }] },
  };
  const { editor } = field(file, 'analyte2.concentration');
  if (editor.kind !== 'quantity') throw new Error('a concentration is a quantity');
  expect(editor.set(file, 0.5).sample?.analytes?.[2].concentration_M).toBe(0.5);
});

test('taking the last substance away leaves its strong acid or base to be fitted', () => {
  const file: SheetFile = { sheet: 1, sample: { strongIon_M: 0, analytes: [{ groups: 1 }] } };
  const { editor } = field(file, 'sample.substances');
  if (editor.kind !== 'choice') throw new Error('a number of substances is a choice');
  const without = editor.options[0].edit(file);
  expect(completed(without).sample.strongIon.state).toBe('fitted');
  expect(editor.options[2].edit(file).sample).toEqual({ strongIon_M: 0, analytes: [{ groups: 1 }, { groups: 1 }] });
});

test('a run without substances offers its strong acid or base, and a substance', () => {
  const file = sheetOf(4);
  const ids = fieldsOf(file).map(({ id }) => id);
  expect(ids.filter((id) => id === 'sample.strongIon')).toHaveLength(1);
  expect(read(buildSentence(file, completed(file)).main)).toContain(
    'holding nothing but a strong acid or base, to be fitted',
  );
});
