import type { NumberMarks } from '../table/numberMarks.ts';
import type { TableSection } from '../table/table.ts';
import { type ColumnStatistics, columnStatistics } from './columnStatistics.ts';
import { type HeaderReading, roleFromHeader } from './roleFromHeader.ts';

/** The columns of one table, read. */
export interface SectionColumns {
  readonly section: TableSection;
  readonly marks: NumberMarks;
  readonly statistics: readonly ColumnStatistics[];
  readonly headers: readonly HeaderReading[];
}

/** Looks at the figures and the header of every column. */
export function sectionColumns(section: TableSection, marks: NumberMarks): SectionColumns {
  return {
    section,
    marks,
    statistics: section.values.map(columnStatistics),
    headers: section.names.map((name, column) => roleFromHeader(name, section.units[column])),
  };
}
