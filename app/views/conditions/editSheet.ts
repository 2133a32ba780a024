import { completeSheet, parseSheet, type Run, type Sheet, type SheetFile } from '../../../core/index.ts';
import { changeShownRun } from '../../state/changeShownRun.ts';
import { sheetFacts } from '../../state/sheetFacts.ts';
import type { SheetEdit } from './sentence.ts';

/**
 * What is wrong with an edited sheet, in words for the person who typed it; null where nothing is.
 *
 * @param last the sheet as completed for the latest result
 */
export function whatIsWrong(file: SheetFile, run: Run, last: Sheet | null): string | null {
  const parsed = parseSheet(JSON.stringify(file), 'The sheet');
  if (!parsed.ok) {
    const { message, remedy } = parsed.refusals[0];
    // The message names the key of the sheet, which the person does not see.
    const belongs = /, where (.*) belongs\.$/.exec(message)?.[1];
    return belongs === undefined ? `${message} ${remedy}` : `Here belongs ${belongs}.`;
  }
  const completed = completeSheet(parsed.value, sheetFacts(run, last));
  if (completed.ok) return null;
  const { message, remedy } = completed.refusals[0];
  return `${message} ${remedy}`;
}

/** Makes a change of the shown run's sheet, with the words that undo will show. */
export function editSheet(words: string, edit: SheetEdit): void {
  changeShownRun(words, (input) => {
    const sheet = edit(input.sheet);
    return sheet === input.sheet ? input : { ...input, sheet };
  });
}
