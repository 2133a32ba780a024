import type { Doubt } from '../notice/doubt.ts';
import type { ColumnGroup } from './columnGroup.ts';
import type { ColumnRole } from './columnRole.ts';
import { type ColumnPair, guessColumns } from './guessColumns.ts';
import type { ReadingOverrules } from './readingChoices.ts';
import { sampleColumn } from './sampleColumn.ts';
import type { SectionColumns } from './sectionColumns.ts';
import { toColumnGroup } from './toColumnGroup.ts';

export interface ColumnChoice {
  readonly groups: readonly ColumnGroup[];
  readonly doubts: readonly Doubt[];
  /** Whether the header named both the volume and the reading. */
  readonly named: boolean;
  /** Whether volume and reading were told by their figures, with or against the header. */
  readonly guessed: boolean;
}

/** Roles that a column keeps whatever its figures look like. */
const NEVER_GUESSED: ReadonlySet<ColumnRole> = new Set<ColumnRole>([
  ...(['time', 'temperature', 'sample', 'index', 'derivative', 'increment', 'other'] as const),
]);

/**
 * Decides which columns of a table are volume and reading: by their headers,
 * else by how their figures behave, which is told in a doubt. Several volume
 * columns each with a reading, or one with several readings of a kind, make
 * several groups. Undefined where two such columns cannot be found.
 */
export function chooseColumns(
  columns: SectionColumns,
  fileName: string,
  overrules: ReadingOverrules,
): ColumnChoice | undefined {
  const line = columns.section.headerLine ?? columns.section.rows[0].line;
  const all = namedPairs(columns);
  const pairs = overrules.runSplit === 'none' ? all.slice(0, 1) : all;
  const named = pairs.length > 0;
  const guessed = named ? undefined : guessedPair(columns);
  const swapped = pairs.length === 1 && looksSwapped(columns, pairs[0]);
  const chosen = swapped
    ? [{ volume: pairs[0].reading, reading: pairs[0].volume }]
    : guessed === undefined
      ? pairs
      : [guessed];
  if (chosen.length === 0) return undefined;

  const doubts: Doubt[] = [];
  const sample = sampleColumn(columns);
  const groups = chosen.map((pair): ColumnGroup => {
    const guess = swapped || guessed !== undefined;
    const { group, notices } = toColumnGroup(columns, pair, guess, sample, overrules.volumeMeaning);
    for (const { column, ...notice } of notices) doubts.push({ ...notice, place: { file: fileName, line, column } });
    const label = chosen.length > 1 ? labelOf(columns, pair, chosen) : undefined;
    return label === undefined ? group : { ...group, label };
  });
  return { groups, named, guessed: swapped || guessed !== undefined, doubts };
}

function columnsOf(columns: SectionColumns, role: ColumnRole): number[] {
  return columns.headers.flatMap((header, column) => {
    return header.role === role && columns.statistics[column].count > 0 ? [column] : [];
  });
}

/** Columns of volumes added so far, or where there are none those of single additions. */
function volumesOf(columns: SectionColumns): number[] {
  const volumes = columnsOf(columns, 'volume');
  const decided = columnsOf(columns, 'increment').filter((column) => columns.headers[column].roleDecided);
  return volumes.length > 0 && decided.length === 0 ? volumes : columnsOf(columns, 'increment');
}

/** Pairs for which the header names volume and reading. */
function namedPairs(columns: SectionColumns): ColumnPair[] {
  const volumes = volumesOf(columns);
  const pH = columnsOf(columns, 'pH');
  const mV = columnsOf(columns, 'mV');
  const either = columnsOf(columns, 'reading');
  const readings = pH.length > 0 ? pH : mV.length > 0 ? mV : either;
  if (volumes.length === 0 || readings.length === 0) return [];
  if (volumes.length > 1) {
    const beside = volumes.flatMap((volume, index): ColumnPair[] => {
      const end = volumes[index + 1] ?? columns.section.width;
      const reading = readings.find((column) => column > volume && column < end);
      return reading === undefined ? [] : [{ volume, reading }];
    });
    if (beside.length > 1) return beside;
  } else if (readings.length > 1 && readings !== either) {
    return readings.map((reading) => ({ volume: volumes[0], reading }));
  }
  const best = guessColumns(columns.statistics, volumes, readings);
  return best === undefined ? [] : [best];
}

function guessedPair(columns: SectionColumns): ColumnPair | undefined {
  const filled = columns.statistics.flatMap(({ count }, column) => (count > 0 ? [column] : []));
  const mostly = filled.filter((column) => columns.statistics[column].count * 4 >= columns.section.rows.length);
  const usable = (mostly.length >= 2 ? mostly : filled).filter((column) => {
    const role = columns.headers[column].role;
    return role === undefined || !NEVER_GUESSED.has(role);
  });
  const volumes = volumesOf(columns);
  const readings = [...columnsOf(columns, 'pH'), ...columnsOf(columns, 'mV'), ...columnsOf(columns, 'reading')];
  return guessColumns(
    columns.statistics,
    volumes.length > 0 ? volumes : usable.filter((column) => !readings.includes(column)),
    readings.length > 0 ? readings : usable.filter((column) => !volumes.includes(column)),
  );
}

/** A first value up to this share of the largest counts as "from zero". */
const NEARLY_ZERO = 0.02;

/** Headers over the wrong columns: the "pH" counts up past 14 from zero while the "volume" stays within 0–14. */
function looksSwapped({ statistics, headers }: SectionColumns, { volume, reading }: ColumnPair): boolean {
  if (headers[volume].roleDecided || headers[reading].roleDecided) return false;
  const named = statistics[reading];
  const other = statistics[volume];
  if (headers[reading].role !== 'pH' || named.count < 5 || named.maximum === named.minimum) return false;
  if (named.first > NEARLY_ZERO * named.maximum) return false;
  return (
    named.inPhRange < 0.5 && named.minimum >= 0 && named.rising >= 0.95 && other.inPhRange === 1 && other.rising >= 0.8
  );
}

/** Runs side by side are named by the caption over their columns, else by the header of their reading. */
function labelOf({ section }: SectionColumns, pair: ColumnPair, all: readonly ColumnPair[]): string | undefined {
  const caption = section.captions[pair.volume] || section.captions[pair.reading];
  if (caption) return caption;
  const sameName = all.filter(({ reading }) => section.names[reading] === section.names[pair.reading]).length;
  return sameName === 1 ? section.names[pair.reading] || undefined : undefined;
}
