import { expect, test } from 'vitest';
import { draftOf, readDraft } from '../../../../app/views/conditions/quantityDraft.ts';
import type { Declaration, QuantityFile } from '../../../../core/index.ts';

const known: Declaration = { state: 'known', value: 0.1002, u: 0.0001, source: 'bottle', assumed: false };

test.each<[string, Declaration, QuantityFile]>([
  ['a number', { state: 'fixed', value: 25, assumed: false }, 25],
  ['u', known, { value: 0.1002, u: 0.0001, source: 'bottle' }],
  ['U with k', known, { value: 0.1002, U: 0.0002, k: 2, source: 'bottle' }],
  ['a tolerance', known, { value: 0.1002, tolerance: 0.0003, distribution: 'triangular', source: 'bottle' }],
  ['fitted', { state: 'fitted', start: null, assumed: false }, 'fitted'],
  ['fitted from a start', { state: 'fitted', start: 4.8, assumed: false }, { fitted: true, start: 4.8 }],
])('opening and setting again leaves %s as it was written', (_, declaration, written) => {
  expect(readDraft(draftOf(declaration, written))).toEqual({ ok: true, quantity: written });
});

test('an entry that is no number is named, and only where it counts', () => {
  const draft = draftOf(known, undefined);
  expect(readDraft({ ...draft, value: 'x' })).toMatchObject({ ok: false, field: 'value' });
  expect(readDraft({ ...draft, uncertainty: '-1' })).toMatchObject({ ok: false, field: 'uncertainty' });
  expect(readDraft({ ...draft, uncertaintyKind: 'U', k: '0' })).toMatchObject({ ok: false, field: 'k' });
  expect(readDraft({ ...draft, state: 'fixed', uncertainty: 'x' })).toEqual({ ok: true, quantity: 0.1002 });
  expect(readDraft({ ...draft, state: 'fitted', value: 'x', start: 'y' })).toMatchObject({ ok: false, field: 'start' });
});

test('decimal commas are numbers too, and an empty source is none', () => {
  const draft = { ...draftOf(known, undefined), value: '0,2', source: ' ' };
  expect(readDraft(draft)).toEqual({ ok: true, quantity: { value: 0.2, u: 0.0001 } });
});
