import { expect, test } from 'vitest';
import { groupRefusals } from '../../../app/widgets/groupRefusals.ts';
import type { Refusal } from '../../../core/index.ts';

const cell = (line: number, file = 'a.csv'): Refusal => ({
  code: 'cell-not-a-number',
  message: `cell of line ${line}`,
  remedy: 'write a number',
  place: { file, line, column: 2 },
});

test('rows refused for the same reason are told together, with all their lines', () => {
  const groups = groupRefusals([cell(3), cell(5), { ...cell(7), remedy: 'another' }, cell(9)]);
  expect(groups.map(({ lines }) => lines)).toEqual([[3, 5, 9], [7]]);
  expect(groups[0].first.message).toBe('cell of line 3');
});

test('neither different files nor different keys are told together', () => {
  const key = (name: string): Refusal => ({ code: 'sheet-unknown-key', message: '', remedy: '', place: { key: name } });
  expect(groupRefusals([cell(3), cell(3, 'b.csv'), key('x'), key('y')])).toHaveLength(4);
});
