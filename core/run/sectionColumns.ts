import type { Dialect } from '../table/dialect.ts';
import type { NumberMarks } from '../table/numberMarks.ts';
import type { TableSection } from '../table/table.ts';
import { type ColumnStatistics, columnStatistics } from './columnStatistics.ts';
import { overruleColumns } from './overruleColumns.ts';
import type { ReadingOverrules } from './readingChoices.ts';
import { type HeaderReading, roleFromHeader } from './roleFromHeader.ts';

/** The columns of one table, read. */
export interface SectionColumns {
  readonly section: TableSection;
  readonly marks: NumberMarks;
  readonly statistics: readonly ColumnStatistics[];
  readonly headers: readonly HeaderReading[];
}

/** Looks at the figures and the header of every column, and at what a person has decided about it. */
export function sectionColumns(
  section: TableSection,
  { delimiter, marks }: Dialect,
  overrules: ReadingOverrules,
): SectionColumns {
  const headers = section.names.map((name, column) => roleFromHeader(name, section.units[column]));
  // Parted at blanks, a title such as "pH titration" looks like a header; a real one names both columns.
  const isTitle = delimiter === 'spaces' && !namesBoth(headers);
  return {
    section,
    marks,
    statistics: section.values.map(columnStatistics),
    headers: overruleColumns(isTitle ? headers.map(() => ({})) : headers, overrules),
  };
}

function namesBoth(headers: readonly HeaderReading[]): boolean {
  const names = (...roles: readonly HeaderReading['role'][]) => headers.some(({ role }) => roles.includes(role));
  return names('volume') && names('pH', 'mV', 'reading');
}
