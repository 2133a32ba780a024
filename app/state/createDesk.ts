import { completeSheet, parseSheet, type Refusal, type SheetFile, sheetVersion } from '../../core/index.ts';
import type { AnalysisClient } from '../worker/analysisClient.ts';
import { changeShownRun } from './changeShownRun.ts';
import { decidedRun } from './decidedRun.ts';
import { fileShelf } from './fileShelf.ts';
import { followInputs } from './followInputs.ts';
import { changeInputs } from './inputStore.ts';
import type { RunInput } from './inputs.ts';
import { samples } from './samples.ts';
import { workStore } from './workStore.ts';

/** A file as it is handed over; the part of the browser's File that is used. */
export interface HandedFile {
  readonly name: string;
  arrayBuffer(): Promise<ArrayBuffer>;
}

/** What can be done with files and with the work on the shown run. */
export interface Desk {
  /** Opens exports and sheets; what is not accepted is told, and all else stays as it was. */
  readonly open: (files: readonly HandedFile[]) => Promise<void>;
  /** Opens one of the samples by its position. */
  readonly openSample: (index: number) => Promise<void>;
  readonly stop: () => void;
  readonly retry: () => void;
}

const emptySheet: SheetFile = { sheet: sheetVersion };

/** Puts the page to work with a client of the worker. */
export function createDesk(client: Pick<AnalysisClient, 'read' | 'analyse'>): Desk {
  const { stop, retry } = followInputs(client);

  /** The runs of one export as inputs, or why there are none. */
  const read = async (name: string, bytes: Uint8Array, sheet: SheetFile, isSample: boolean) => {
    const reply = await client.read(bytes, name);
    if (reply.kind !== 'read') {
      const message = reply.kind === 'broken' ? reply.message : 'Reading was stopped.';
      return { inputs: [], refusals: [unreadable(name, message)] };
    }
    if (!reply.outcome.ok) return { inputs: [], refusals: reply.outcome.refusals };
    const file = `${reply.sha256} ${name}`;
    fileShelf.put(file, { name, bytes, runs: reply.outcome.value });
    const inputs = reply.outcome.value.map(
      (_, index): RunInput => ({ file, index, isSample, sheet, decisions: new Map() }),
    );
    return { inputs, refusals: [] };
  };

  const open = async (files: readonly HandedFile[]) => {
    if (files.length === 0) return;
    const names = files.map(({ name }) => name);
    workStore.setState(({ reading }) => ({ reading: [...reading, ...names], notAccepted: null }));
    const refusals: Refusal[] = [];
    const sheets: { readonly name: string; readonly sheet: SheetFile }[] = [];
    const opened: RunInput[] = [];
    const exports = files.filter(({ name }) => !isSheetName(name));
    for (const file of files.filter(({ name }) => isSheetName(name))) {
      const bytes = await bytesOf(file);
      const parsed = bytes === null ? null : parseSheet(new TextDecoder().decode(bytes), file.name);
      if (parsed === null) refusals.push(unreadable(file.name, 'The browser could not read it.'));
      else if (!parsed.ok) refusals.push(...parsed.refusals);
      else {
        const contradictions = contradictionsIn(parsed.value, file.name);
        if (contradictions.length === 0) sheets.push({ name: file.name, sheet: parsed.value });
        else refusals.push(...contradictions);
      }
    }
    for (const file of exports) {
      const bytes = await bytesOf(file);
      if (bytes === null) {
        refusals.push(unreadable(file.name, 'The browser could not read it.'));
        continue;
      }
      const answer = await read(file.name, bytes, sheetFor(file.name, sheets), false);
      opened.push(...answer.inputs);
      refusals.push(...answer.refusals);
    }
    if (opened.length > 0) showOpened(opened);
    // A sheet that comes alone is about the run on the page.
    else if (exports.length === 0 && sheets.length > 0) {
      const { name, sheet } = sheets[sheets.length - 1];
      changeShownRun(`opened the conditions ${name}`, (run) => ({ ...run, sheet }));
    }
    workStore.setState(({ reading }) => ({
      reading: without(reading, names),
      notAccepted: refusals.length === 0 ? null : { what: names.join(', '), refusals },
    }));
  };

  const openSample = async (index: number) => {
    const sample = samples[index];
    const sheet = parseSheet(sample.sheet, `sheet of ${sample.fileName}`);
    if (!sheet.ok) throw new Error(`The sheet of ${sample.fileName} is not in order: ${sheet.refusals[0].message}`);
    workStore.setState(({ reading }) => ({ reading: [...reading, sample.fileName], notAccepted: null }));
    const answer = await read(sample.fileName, new TextEncoder().encode(sample.text), sheet.value, true);
    if (answer.inputs.length > 0) showOpened(answer.inputs);
    workStore.setState(({ reading }) => ({
      reading: without(reading, [sample.fileName]),
      notAccepted: answer.refusals.length === 0 ? null : { what: sample.fileName, refusals: answer.refusals },
    }));
  };

  return { open, openSample, stop, retry };
}

/** Adds runs and shows the first of them. A sample makes room for whatever is opened next. */
function showOpened(opened: readonly RunInput[]): void {
  const first = decidedRun(opened[0]);
  changeInputs(`opened ${first.file}`, (inputs) => {
    const kept = inputs.runs.filter((run) => !run.isSample && !opened.some(({ file }) => file === run.file));
    return { runs: [...kept, ...opened], shown: kept.length };
  });
}

function isSheetName(name: string): boolean {
  return /\.json$/i.test(name);
}

/** A sheet named after the export is for it; a single sheet is for every export that came with it. */
function sheetFor(name: string, sheets: readonly { readonly name: string; readonly sheet: SheetFile }[]): SheetFile {
  const stem = name.replace(/\.\w+$/, '');
  const own = sheets.find((sheet) => sheet.name === `${stem}.sheet.json` || sheet.name === `${stem}.json`);
  return own?.sheet ?? (sheets.length === 1 ? sheets[0].sheet : emptySheet);
}

/** What in a sheet contradicts itself; that does not depend on the run. */
function contradictionsIn(sheet: SheetFile, file: string): readonly Refusal[] {
  const completed = completeSheet(sheet, { readingKind: 'pH', titrantKind: 'base', groupsIfOpen: 1 });
  return completed.ok ? [] : completed.refusals.map((refusal) => ({ ...refusal, place: { ...refusal.place, file } }));
}

async function bytesOf(file: HandedFile): Promise<Uint8Array | null> {
  try {
    return new Uint8Array(await file.arrayBuffer());
  } catch {
    // A folder, or a file that was taken away meanwhile.
    return null;
  }
}

function unreadable(file: string, why: string): Refusal {
  return {
    code: 'file-unreadable',
    message: `${file} could not be read: ${why}`,
    remedy: 'Try again; if it is a folder, open the files in it.',
    place: { file },
  };
}

function without(list: readonly string[], taken: readonly string[]): readonly string[] {
  const left = [...list];
  for (const name of taken) {
    const at = left.indexOf(name);
    if (at >= 0) left.splice(at, 1);
  }
  return left;
}
