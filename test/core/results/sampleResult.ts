import { readFileSync } from 'node:fs';
import { analyseRun, parseSheet, type RunResult, readRuns } from '../../../core/index.ts';

const folder = new URL('../../../sample-data/', import.meta.url);

/** The result of a sample run under its own sheet. */
export function sampleResult(name: string): RunResult {
  const sheetName = name.replace(/\.\w+$/, '.sheet.json');
  const runs = readRuns(readFileSync(new URL(name, folder)), name);
  const sheet = parseSheet(readFileSync(new URL(sheetName, folder), 'utf8'), sheetName);
  if (!runs.ok || !sheet.ok) throw new Error(`${name} cannot be read.`);
  const work = analyseRun(runs.value[0], sheet.value);
  for (;;) {
    const step = work.next();
    if (step.done !== true) continue;
    if (!step.value.ok) throw new Error(`${name} was refused.`);
    return step.value.value;
  }
}
