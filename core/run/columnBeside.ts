import type { SectionColumns } from './sectionColumns.ts';

/**
 * The column of temperature or time that goes with a column of volumes: of
 * tables side by side the one between it and the next volume, else the first
 * of the table. Undefined where there is none.
 */
export function columnBeside(
  { headers, section }: SectionColumns,
  role: 'temperature' | 'time',
  volume: number,
): number | undefined {
  const found = headers.flatMap((header, column) => {
    return header.role === role && section.rows.some(({ cells }) => (cells[column] ?? '').trim() !== '')
      ? [column]
      : [];
  });
  const next = headers.findIndex((header, column) => column > volume && header.role === 'volume');
  const beside = found.find((column) => column > volume && (next < 0 || column < next));
  return beside ?? found[0];
}
