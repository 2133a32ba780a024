import type { Outcome } from '../notice/outcome.ts';
import { readTable } from '../table/readTable.ts';
import { type ChoicesMade, choicesMade } from './choicesMade.ts';
import { formRuns } from './formRuns.ts';
import { headerShape } from './headerShape.ts';
import type { ReadingOverrules } from './readingChoices.ts';
import type { Run } from './run.ts';
import { type SetUpSuggestion, setUpSuggestions } from './setUpSuggestions.ts';
import { type TableView, tableView } from './tableView.ts';

/** An export with everything that was understood of it; plain data. */
export interface ReadExport {
  /** At least one. */
  readonly runs: readonly Run[];
  readonly choices: ChoicesMade;
  readonly view: TableView;
  /** What lines beside the table seem to say about the set-up; to be offered, never applied. */
  readonly suggestions: readonly SetUpSuggestion[];
  /** Equal for files with the same columns, so that choices can be made alike. */
  readonly headerShape: string;
}

/**
 * Reads an export and tells how: the same runs as `readRuns`, the choices with
 * who made them, and what became of every line. Refuses as `readRuns` does.
 */
export function readExport(bytes: Uint8Array, fileName: string, overrules: ReadingOverrules = {}): Outcome<ReadExport> {
  const read = readTable(bytes, fileName, overrules);
  if (!read.ok) return read;
  const table = read.value;
  const formed = formRuns(table, overrules);
  if (!formed.ok) return formed;
  const { runs, main } = formed.value;
  return {
    ok: true,
    value: {
      runs,
      choices: choicesMade(table, formed.value, overrules),
      view: tableView(table, runs),
      suggestions: setUpSuggestions([...table.preamble, ...table.remarks], table.dialect.marks),
      headerShape: headerShape(main.columns.section),
    },
  };
}
