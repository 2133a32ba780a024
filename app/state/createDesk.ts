import {
  completeSheet,
  type Outcome,
  parseSheet,
  type Refusal,
  type SheetFile,
  sheetVersion,
} from '../../core/index.ts';
import type { AnalysisClient } from '../worker/analysisClient.ts';
import { changeShownRun } from './changeShownRun.ts';
import { followInputs } from './followInputs.ts';
import { samples } from './samples.ts';
import { type OpenedFile, showOpened } from './showOpened.ts';
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

  /** Reads one export, or says why it cannot be read. */
  const read = async (
    name: string,
    bytes: Uint8Array,
    sheet: SheetFile,
    isSample: boolean,
  ): Promise<Outcome<OpenedFile>> => {
    const reply = await client.read(bytes, name);
    if (reply.kind !== 'read') {
      const message = reply.kind === 'broken' ? reply.message : 'Reading was stopped.';
      return { ok: false, refusals: [unreadable(name, message)] };
    }
    if (!reply.outcome.ok) return reply.outcome;
    const key = `${reply.sha256} ${name}`;
    return { ok: true, value: { key, file: { name, bytes, runs: reply.outcome.value }, sheet, isSample } };
  };

  const open = async (files: readonly HandedFile[]) => {
    if (files.length === 0) return;
    const names = files.map(({ name }) => name);
    workStore.setState(({ reading }) => ({ reading: [...reading, ...names], notAccepted: null }));
    const refusals: Refusal[] = [];
    const sheets: { readonly name: string; readonly sheet: SheetFile }[] = [];
    const opened: OpenedFile[] = [];
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
      if (answer.ok) opened.push(answer.value);
      else refusals.push(...answer.refusals);
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
    if (answer.ok) showOpened([answer.value]);
    workStore.setState(({ reading }) => ({
      reading: without(reading, [sample.fileName]),
      notAccepted: answer.ok ? null : { what: sample.fileName, refusals: answer.refusals },
    }));
  };

  return { open, openSample, stop, retry };
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
