import type { NumberMarks } from '../table/numberMarks.ts';
import { parseNumber } from '../table/parseNumber.ts';
import type { TableSection } from '../table/table.ts';
import { type ColumnStatistics, columnStatistics } from './columnStatistics.ts';
import { type HeaderReading, roleFromHeader } from './roleFromHeader.ts';

/** The columns of one table, read. */
export interface SectionColumns {
  readonly section: TableSection;
  readonly marks: NumberMarks;
  /** Values of each column, NaN where a cell is no number. */
  readonly values: readonly Float64Array[];
  readonly statistics: readonly ColumnStatistics[];
  readonly headers: readonly HeaderReading[];
}

/** Reads every cell of a table once. */
export function sectionColumns(section: TableSection, marks: NumberMarks): SectionColumns {
  const values = Array.from({ length: section.width }, () => new Float64Array(section.rows.length).fill(Number.NaN));
  section.rows.forEach(({ cells }, row) => {
    const filled = Math.min(cells.length, section.width);
    for (let column = 0; column < filled; column++) {
      const value = parseNumber(cells[column], marks);
      if (typeof value === 'number') values[column][row] = value;
    }
  });
  return {
    section,
    marks,
    values,
    statistics: values.map(columnStatistics),
    headers: section.names.map((name, column) => roleFromHeader(name, section.units[column])),
  };
}
