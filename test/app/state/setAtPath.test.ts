import { expect, test } from 'vitest';
import { getAtPath, setAtPath } from '../../../app/state/setAtPath.ts';

test('sets what is missing on the way, and leaves the given data alone', () => {
  const before = { sheet: 1 };
  const after = setAtPath<object>(before, ['sample', 'analytes', 1, 'name'], 'x');
  expect(after).toEqual({ sheet: 1, sample: { analytes: [{}, { name: 'x' }] } });
  expect(before).toEqual({ sheet: 1 });
});

test('takes keys out, and objects left empty, but keeps entries of lists', () => {
  const data = { a: { b: { c: 1 } }, list: [{ d: 1 }, { e: 2 }] };
  expect(setAtPath(data, ['a', 'b', 'c'], undefined)).toEqual({ list: data.list });
  expect(setAtPath(data, ['list', 0, 'd'], undefined)).toEqual({ a: data.a, list: [{}, { e: 2 }] });
});

test('keys keep their order when a value is replaced', () => {
  const after = setAtPath({ first: 1, second: 2, third: 3 }, ['second'], 9);
  expect(JSON.stringify(after)).toBe('{"first":1,"second":9,"third":3}');
});

test('a path that leads nowhere gives undefined', () => {
  expect(getAtPath({ a: [1, 2] }, ['a', 1])).toBe(2);
  expect(getAtPath({ a: 1 }, ['a', 'b', 'c'])).toBe(undefined);
});
