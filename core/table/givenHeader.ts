import { type HeaderFound, isUnitsRow, leadingRows, spread } from './findHeader.ts';
import type { LineFacts } from './lineFacts.ts';

/**
 * The header of a table from the lines that a person declared to be it: the
 * last one holds units if it reads so, the one before it the names, and one
 * above that captions. `between` are the lines from there to the first full row.
 */
export function givenHeader(facts: LineFacts, headerLines: readonly number[], between: readonly number[]): HeaderFound {
  const rows = leadingRows(facts, between);
  const left = headerLines.slice(-3);
  const cellsOf = (line: number) => facts.cells[line].map((cell) => cell.trim());
  const last = left[left.length - 1];
  const unitsLine = left.length > 1 && isUnitsRow(facts.cells[last]) ? left.pop() : undefined;
  const headerLine = left.pop();
  const captionsLine = left.pop();
  return {
    ...(headerLine === undefined ? {} : { headerLine }),
    ...(unitsLine === undefined ? {} : { unitsLine }),
    ...(captionsLine === undefined ? {} : { captionsLine }),
    names: headerLine === undefined ? [] : cellsOf(headerLine),
    units: unitsLine === undefined ? [] : cellsOf(unitsLine),
    captions: captionsLine === undefined ? [] : spread(cellsOf(captionsLine)),
    rows,
  };
}
