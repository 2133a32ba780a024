import type { Table } from '../table/table.ts';
import { roleFromHeader } from './roleFromHeader.ts';

const LONGEST_LABEL = 40;

/** Lines that may lie between a label and the header or the first row of its table. */
const LINES_BETWEEN = 2;

/**
 * What a table of several is called, from the text lines above it: the value of
 * a line such as "Sample: A", else a short line right above. Undefined where
 * nothing there can be a name, or where there is one table only.
 */
export function sectionLabel(table: Table, index: number): string | undefined {
  if (table.sections.length < 2) return undefined;
  const section = table.sections[index];
  const top = section.headerLine ?? section.rows[0].line;
  const before = table.sections[index - 1];
  const bottom = before === undefined ? 0 : before.rows[before.rows.length - 1].line;
  const between = (index === 0 ? table.preamble : table.remarks).filter(({ line }) => line > bottom && line < top);
  const named = between.findLast(({ key }) => key !== undefined && roleFromHeader(key, '').role === 'sample');
  if (named?.value !== undefined) return named.value.slice(0, LONGEST_LABEL);
  const last = between[between.length - 1];
  if (last === undefined || last.key !== undefined || top - last.line > LINES_BETWEEN) return undefined;
  const text = last.text.replace(/^[#\s]+|[;,\t|\s]+$/g, '');
  return text.length <= LONGEST_LABEL && text !== '' ? text : undefined;
}
