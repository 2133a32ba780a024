import type { SectionColumns } from './sectionColumns.ts';

/** A column tells samples apart if each of its labels stands in this many rows on average. */
const ROWS_PER_LABEL = 3;

/**
 * The column whose labels tell stacked runs apart, found by its header or, where
 * no header says what it is, as a column of words that repeat. Columns that
 * number the rows or give the time of day have no repeating labels.
 */
export function sampleColumn({ section, headers, statistics }: SectionColumns): number | undefined {
  const decided = headers.findIndex(({ role, roleDecided }) => role === 'sample' && roleDecided === true);
  if (decided >= 0) return decided;
  const named = headers.findIndex(({ role }, column) => role === 'sample' && labelsRepeat(section.rows, column));
  if (named >= 0) return named;
  const worded = headers.findIndex(({ role }, column) => {
    return role === undefined && statistics[column].count === 0 && labelsRepeat(section.rows, column);
  });
  return worded >= 0 ? worded : undefined;
}

function labelsRepeat(rows: SectionColumns['section']['rows'], column: number): boolean {
  const labels = new Set<string>();
  let labelled = 0;
  for (const { cells } of rows) {
    const label = (cells[column] ?? '').trim();
    if (label === '') continue;
    labelled += 1;
    labels.add(label);
    if (labels.size * ROWS_PER_LABEL > rows.length) return false;
  }
  return labelled > 0 && labels.size >= 2;
}
