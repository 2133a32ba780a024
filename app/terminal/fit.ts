import { readFileSync } from 'node:fs';
import { basename, resolve } from 'node:path';
import {
  analyseRun,
  parseSheet,
  type Refusal,
  type RunResult,
  readRuns,
  type SheetFile,
  sheetVersion,
} from '../../core/index.ts';
import { parseArguments } from './parseArguments.ts';
import { resultDocument } from './resultDocument.ts';
import { resultText } from './resultText.ts';

/** Exit statuses that scripts rely on. A refused row counts; one whose value was never measured does not. */
const allFitted = 0;
const somethingFailed = 1;
const callWasWrong = 2;

/** npm starts a script in the folder of the package; names of files are meant from where the user stands. */
const startFolder = process.env['INIT_CWD'] ?? process.cwd();

function main(): number {
  const call = parseArguments(process.argv.slice(2));
  if (!call.ok) {
    process.stderr.write(`${call.message}\n`);
    return callWasWrong;
  }
  const sheet = readSheet(call.sheet);
  const refusals: Refusal[] = sheet.ok ? [] : [...sheet.refusals];
  const results: RunResult[] = [];
  if (sheet.ok) for (const file of call.files) work(file, sheet.value, results, refusals);
  const output = call.json
    ? `${JSON.stringify(resultDocument(results, refusals), null, 2)}\n`
    : resultText(results, refusals);
  process.stdout.write(output);
  const allAccepted =
    refusals.length === 0 && results.every(({ run }) => run.notAccepted.every(({ code }) => code === 'cell-missing'));
  const succeeded = results.every(({ ending }) => ending.code === 'fitted' || ending.code === 'predicted');
  return allAccepted && succeeded ? allFitted : somethingFailed;
}

type ReadSheet = { ok: true; value: SheetFile } | { ok: false; refusals: readonly Refusal[] };

function readSheet(file: string | null): ReadSheet {
  if (file === null) return { ok: true, value: { sheet: sheetVersion } };
  const bytes = readBytes(file);
  return bytes.ok ? parseSheet(new TextDecoder('utf-8').decode(bytes.value), basename(file)) : bytes;
}

function work(file: string, sheet: SheetFile, results: RunResult[], refusals: Refusal[]): void {
  const bytes = readBytes(file);
  if (!bytes.ok) {
    refusals.push(...bytes.refusals);
    return;
  }
  const runs = readRuns(bytes.value, basename(file));
  if (!runs.ok) {
    refusals.push(...runs.refusals);
    return;
  }
  for (const run of runs.value) {
    const analysis = analyseRun(run, sheet);
    let step = analysis.next();
    while (step.done !== true) step = analysis.next();
    if (step.value.ok) results.push(step.value.value);
    else
      refusals.push(
        ...step.value.refusals.map((refusal) => ({ ...refusal, place: { file: run.file, ...refusal.place } })),
      );
  }
}

type ReadBytes = { ok: true; value: Uint8Array } | { ok: false; refusals: readonly Refusal[] };

function readBytes(file: string): ReadBytes {
  try {
    return { ok: true, value: readFileSync(resolve(startFolder, file)) };
  } catch (error) {
    const reason = error instanceof Error && 'code' in error ? String(error.code) : 'unknown';
    return {
      ok: false,
      refusals: [
        {
          code: 'file-unreadable',
          message: `${file} cannot be read (${reason}).`,
          remedy: 'Check the name of the file and that it may be read.',
          place: { file },
        },
      ],
    };
  }
}

process.exitCode = main();
