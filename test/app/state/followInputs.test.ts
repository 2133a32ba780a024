import { beforeEach, expect, test } from 'vitest';
import { fileShelf } from '../../../app/state/fileShelf.ts';
import { followInputs } from '../../../app/state/followInputs.ts';
import { changeInputs, inputStore, noInputs, showRun, undo } from '../../../app/state/inputStore.ts';
import type { RunInput } from '../../../app/state/inputs.ts';
import { workStore } from '../../../app/state/workStore.ts';
import { analysed, markedResult, runNamed, StubClient } from './stubClient.ts';

const input = (file: string): RunInput => ({
  file,
  index: 0,
  isSample: false,
  sheet: { sheet: 1 },
  decisions: new Map(),
});
/** Lets promises that are already settled have their say. */
const settle = () => new Promise((done) => setTimeout(done));
const shownMessage = () => workStore.getState().latest?.result.ending.message ?? null;

let client: StubClient;
let work: ReturnType<typeof followInputs>;

beforeEach(() => {
  inputStore.setState({ present: noInputs, past: [], future: [] });
  workStore.setState({ work: { state: 'idle' }, latest: null });
  for (const name of ['a', 'b']) fileShelf.put(name, { name, bytes: new Uint8Array(), runs: [runNamed(name)] });
  client = new StubClient();
  work = followInputs(client);
  changeInputs('opened', () => ({ runs: [input('a'), input('b')], shown: 0 }));
});

const editSheet = (volume: number) =>
  changeInputs('edited', (inputs) => ({
    ...inputs,
    runs: [{ ...inputs.runs[0], sheet: { sheet: 1, sample: { volume_mL: volume } } }, inputs.runs[1]],
  }));

test('a change stops the work in progress and starts anew', () => {
  editSheet(20);
  expect(client.asked.map(({ stopped }) => stopped)).toEqual([true, false]);
  expect(client.asked[1].sheet.sample?.volume_mL).toBe(20);
});

test('an answer to an earlier question is never shown, whenever it comes', async () => {
  editSheet(20);
  client.asked[1].answer(analysed(markedResult('of the edited sheet')));
  await settle();
  client.asked[0].answer(analysed(markedResult('of the first sheet')));
  await settle();
  expect(shownMessage()).toBe('of the edited sheet');
});

test('undo shows the result that was had before, without computing it again', async () => {
  client.asked[0].answer(analysed(markedResult('first')));
  await settle();
  editSheet(20);
  client.asked[1].answer(analysed(markedResult('second')));
  await settle();
  undo();
  expect(shownMessage()).toBe('first');
  expect(client.asked).toHaveLength(2);
});

test('the result of one run never stands under the name of another', async () => {
  client.asked[0].answer(analysed(markedResult('of a')));
  await settle();
  showRun(1);
  expect(shownMessage()).toBe(null);
});

test('stopped work says so and can be started again', async () => {
  work.stop();
  expect(client.asked[0].stopped).toBe(true);
  client.asked[0].answer({ kind: 'stopped', job: 0 });
  await settle();
  expect(workStore.getState().work.state).toBe('stopped');
  work.retry();
  expect(workStore.getState().work.state).toBe('working');
  expect(client.asked).toHaveLength(2);
});

test('a mistake of the program is told, and the inputs stay', async () => {
  client.asked[0].answer({ kind: 'broken', job: 0, message: 'lost' });
  await settle();
  expect(workStore.getState().work).toEqual({ state: 'broken', message: 'lost' });
  expect(inputStore.getState().present.runs).toHaveLength(2);
});
