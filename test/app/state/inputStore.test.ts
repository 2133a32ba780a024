import { beforeEach, expect, test } from 'vitest';
import { changeInputs, inputStore, noInputs, redo, showRun, undo } from '../../../app/state/inputStore.ts';
import type { Inputs, RunInput } from '../../../app/state/inputs.ts';

const run = (file: string): RunInput => ({
  file,
  index: 0,
  isSample: false,
  sheet: { sheet: 1 },
  decisions: new Map(),
});
const withRuns = (...files: string[]): Inputs => ({ runs: files.map(run), shown: files.length - 1 });
const files = () => inputStore.getState().present.runs.map(({ file }) => file);

beforeEach(() => inputStore.setState({ present: noInputs, past: [], future: [] }));

test('history begins with the run with which the page opens', () => {
  changeInputs('opened a', () => withRuns('a'));
  undo();
  expect(files()).toEqual(['a']);
});

test('changes are undone and done again in their order, with their words', () => {
  changeInputs('opened a', () => withRuns('a'));
  changeInputs('opened b', () => withRuns('a', 'b'));
  changeInputs('opened c', () => withRuns('a', 'b', 'c'));
  undo();
  expect(inputStore.getState().future[0].words).toBe('opened c');
  undo();
  expect(files()).toEqual(['a']);
  redo();
  expect(inputStore.getState().past.at(-1)?.words).toBe('opened b');
  redo();
  expect(files()).toEqual(['a', 'b', 'c']);
  redo();
  expect(files()).toEqual(['a', 'b', 'c']);
});

test('a new change ends the way forward', () => {
  changeInputs('opened a', () => withRuns('a'));
  changeInputs('opened b', () => withRuns('b'));
  undo();
  changeInputs('opened c', () => withRuns('c'));
  redo();
  expect(files()).toEqual(['c']);
});

test('neither looking at another run nor changing nothing is a step of history', () => {
  changeInputs('opened two', () => withRuns('a', 'b'));
  showRun(0);
  changeInputs('did nothing', (inputs) => inputs);
  expect(inputStore.getState().past).toEqual([]);
  expect(inputStore.getState().present.shown).toBe(0);
});
