import { changeShownRun } from './changeShownRun.ts';
import { decidedRun } from './decidedRun.ts';
import { fileShelf } from './fileShelf.ts';

/** Takes a row of the shown run out of the fit, or back into it, by its line in the source file. */
export function toggleRow(line: number): void {
  changeShownRun(`switched the point of line ${line}`, (input) => {
    const row = decidedRun(input).rows.find((candidate) => candidate.line === line);
    const asRead = fileShelf.get(input.file).runs[input.index].rows.find((candidate) => candidate.line === line);
    if (row === undefined || asRead === undefined) return input;
    const decisions = new Map(input.decisions);
    const use = row.decision.use === 'used' ? 'excluded' : 'used';
    if (asRead.decision.use === use) decisions.delete(line);
    else if (use === 'used') decisions.set(line, { use });
    else decisions.set(line, { use, by: 'person', why: 'taken out by hand' });
    return { ...input, decisions };
  });
}
