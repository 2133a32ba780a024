import { beforeEach, expect, test } from 'vitest';
import { createDesk, type Desk, type HandedFile } from '../../../app/state/createDesk.ts';
import { decidedRun } from '../../../app/state/decidedRun.ts';
import { fileShelf } from '../../../app/state/fileShelf.ts';
import { inputStore, noInputs, undo } from '../../../app/state/inputStore.ts';
import { samples } from '../../../app/state/samples.ts';
import { toggleRow } from '../../../app/state/toggleRow.ts';
import { workStore } from '../../../app/state/workStore.ts';
import { StubClient } from './stubClient.ts';

const file = (name: string, text: string): HandedFile => ({
  name,
  arrayBuffer: async () => new TextEncoder().encode(text).buffer as ArrayBuffer,
});
const present = () => inputStore.getState().present;
const names = () => present().runs.map((run) => decidedRun(run).file);
const sheetOf20mL = JSON.stringify({ sheet: 1, sample: { volume_mL: 20 } });

let desk: Desk;

beforeEach(async () => {
  inputStore.setState({ present: noInputs, past: [], future: [] });
  workStore.setState({ work: { state: 'idle' }, latest: null, notAccepted: null, reading: [] });
  desk = createDesk(new StubClient());
  await desk.openSample(0);
});

test('a sample opens with its own sheet, and gives way to the first file of the person', async () => {
  expect(names()).toEqual([samples[0].fileName]);
  expect(present().runs[0].sheet.sample?.analytes?.[0].name).toBe('OM-217');
  await desk.open([file('a.csv', 'A')]);
  await desk.open([file('b.csv', 'B')]);
  expect(names()).toEqual(['a.csv', 'b.csv']);
  expect(present().shown).toBe(1);
});

test('what is refused is told and changes nothing; what came with it is opened', async () => {
  await desk.open([file('empty.csv', '')]);
  expect(names()).toEqual([samples[0].fileName]);
  expect(workStore.getState().notAccepted?.refusals.map(({ code }) => code)).toEqual(['file-empty']);
  await desk.open([file('empty.csv', ''), file('a.csv', 'A')]);
  expect(names()).toEqual(['a.csv']);
  expect(workStore.getState().notAccepted?.refusals.map(({ code }) => code)).toEqual(['file-empty']);
});

test('a sheet alone is for the run that is shown; one that is refused leaves its sheet as it was', async () => {
  const before = present().runs[0].sheet;
  await desk.open([file('bad.json', '{ "sheet": 1, "sample": { "volume_mL": -1 } }')]);
  expect(present().runs[0].sheet).toBe(before);
  expect(workStore.getState().notAccepted?.refusals[0].code).toBe('sheet-out-of-range');
  await desk.open([file('contradicting.json', '{ "sheet": 1, "medium": { "solvent": "ethanol" } }')]);
  expect(present().runs[0].sheet).toBe(before);
  expect(workStore.getState().notAccepted?.refusals[0]).toMatchObject({
    code: 'sheet-inconsistent',
    place: { file: 'contradicting.json' },
  });
  await desk.open([file('good.json', sheetOf20mL)]);
  expect(present().runs[0].sheet.sample?.volume_mL).toBe(20);
  undo();
  expect(present().runs[0].sheet).toBe(before);
});

test('a sheet that comes with exports is for the one of its name, a single one for all', async () => {
  await desk.open([
    file('a.csv', 'A'),
    file('b.csv', 'B'),
    file('a.sheet.json', sheetOf20mL),
    file('c.json', '{"sheet":1}'),
  ]);
  expect(present().runs.map(({ sheet }) => sheet.sample?.volume_mL)).toEqual([20, undefined]);
  await desk.open([file('d.csv', 'D'), file('e.csv', 'E'), file('any.json', sheetOf20mL)]);
  expect(
    present()
      .runs.slice(2)
      .map(({ sheet }) => sheet.sample?.volume_mL),
  ).toEqual([20, 20]);
});

test('a file that the browser cannot read is told', async () => {
  const gone: HandedFile = { name: 'folder', arrayBuffer: () => Promise.reject(new Error('NotFoundError')) };
  await desk.open([gone]);
  expect(workStore.getState().notAccepted?.refusals[0].code).toBe('file-unreadable');
  expect(workStore.getState().reading).toEqual([]);
});

test('a row is taken out and back, and a row that a rule took out can be put in', async () => {
  await desk.open([file('a.csv', 'A')]);
  const uses = () => decidedRun(present().runs[0]).rows.map(({ decision }) => decision.use);
  expect(uses()).toEqual(['used', 'used', 'excluded']);
  toggleRow(2);
  toggleRow(4);
  expect(uses()).toEqual(['excluded', 'used', 'used']);
  toggleRow(2);
  expect(present().runs[0].decisions.has(2)).toBe(false);
  undo();
  undo();
  undo();
  expect(uses()).toEqual(['used', 'used', 'excluded']);
});

test('files that nothing refers to any more are forgotten; those that undo can bring back are kept', async () => {
  await desk.open([file('a.csv', 'A')]);
  undo();
  expect(fileShelf.get('A a.csv').name).toBe('a.csv');
  await desk.open([file('b.csv', 'B')]);
  expect(() => fileShelf.get('A a.csv')).toThrow('never read');
  expect(fileShelf.get('B b.csv').name).toBe('b.csv');
});
