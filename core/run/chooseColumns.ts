import type { Doubt } from '../notice/doubt.ts';
import { unitBehind } from '../table/unitBehind.ts';
import type { ColumnGroup } from './columnGroup.ts';
import type { ColumnRole } from './columnRole.ts';
import { type ColumnPair, guessColumns } from './guessColumns.ts';
import { readingKind } from './readingKind.ts';
import { sampleColumn } from './sampleColumn.ts';
import type { SectionColumns } from './sectionColumns.ts';

export interface ColumnChoice {
  readonly groups: readonly ColumnGroup[];
  readonly doubts: readonly Doubt[];
  /** Whether the header named both the volume and the reading. */
  readonly named: boolean;
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
export function chooseColumns(columns: SectionColumns, fileName: string): ColumnChoice | undefined {
  const line = columns.section.headerLine ?? columns.section.rows[0].line;
  const pairs = namedPairs(columns);
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
    const { group, notices } = toGroup(columns, pair, swapped || guessed !== undefined, sample);
    for (const notice of notices) doubts.push({ ...notice, place: { file: fileName, line, column: notice.column } });
    const label = chosen.length > 1 ? labelOf(columns, pair, chosen) : undefined;
    return label === undefined ? group : { ...group, label };
  });
  return {
    groups,
    named,
    doubts: doubts.map(({ code, seen, means, remedy, place }) => ({ code, seen, means, remedy, place })),
  };
}

function columnsOf(columns: SectionColumns, role: ColumnRole): number[] {
  return columns.headers.flatMap((header, column) => {
    return header.role === role && columns.statistics[column].count > 0 ? [column] : [];
  });
}

/** Pairs for which the header names volume and reading. */
function namedPairs(columns: SectionColumns): ColumnPair[] {
  const volumes = columnsOf(columns, 'volume');
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
  const volumes = columnsOf(columns, 'volume');
  const readings = [...columnsOf(columns, 'pH'), ...columnsOf(columns, 'mV'), ...columnsOf(columns, 'reading')];
  return guessColumns(
    columns.statistics,
    volumes.length > 0 ? volumes : usable.filter((column) => !readings.includes(column)),
    readings.length > 0 ? readings : usable.filter((column) => !volumes.includes(column)),
  );
}

/** Headers over the wrong columns: the "pH" counts up past 14 from zero while the "volume" stays within 0–14. */
function looksSwapped({ statistics, headers }: SectionColumns, { volume, reading }: ColumnPair): boolean {
  const named = statistics[reading];
  const other = statistics[volume];
  if (headers[reading].role !== 'pH' || named.count < 5) return false;
  return (
    named.inPhRange < 0.5 && named.minimum >= 0 && named.rising >= 0.95 && other.inPhRange === 1 && other.rising >= 0.8
  );
}

type Notice = Pick<Doubt, 'code' | 'seen' | 'means' | 'remedy'> & { readonly column: number };

/** Volumes beyond these, with no unit given, are more than a burette holds or less than it can dose, mL. */
const LARGEST_USUAL_ML = 250;
const SMALLEST_USUAL_ML = 0.1;

/** Potentials that all stay within this, with no unit given, are volts. */
const LARGEST_VOLTS = 2;

function toGroup(
  columns: SectionColumns,
  { volume, reading }: ColumnPair,
  guessed: boolean,
  sample: number | undefined,
): { readonly group: ColumnGroup; readonly notices: readonly Notice[] } {
  const { headers, statistics } = columns;
  const notices: Notice[] = [];
  const volumeUnit = headers[volume].unit ?? unitInCells(columns, volume);
  const readingUnit = headers[reading].unit ?? unitInCells(columns, reading);
  const role =
    guessed && headers[reading].role === 'volume' ? undefined : (headers[reading].role ?? roleOfCells(readingUnit));
  const { kind, by } = readingKind(role, readingUnit === 'V', statistics[reading]);
  const inVolts = kind === 'mV' && staysWithinVolts(columns, reading) && readingUnit === undefined;
  const group: ColumnGroup = {
    volume,
    reading,
    readingKind: kind,
    volumeUnit: volumeUnit === 'µL' || volumeUnit === 'L' ? volumeUnit : 'mL',
    potentialUnit: kind === 'mV' && (readingUnit === 'V' || inVolts) ? 'V' : 'mV',
    ...(sample === undefined || sample === volume || sample === reading ? {} : { sample }),
  };
  const named = (column: number): string => {
    const name = columns.section.names[column];
    return name === '' ? `column ${column + 1}` : `column ${column + 1} ("${name.slice(0, 30)}")`;
  };
  if (guessed || by !== 'header') {
    const why = by === 'against-header' ? 'because its figures do not fit its header' : 'by how the figures behave';
    const taken = guessed
      ? `${capital(named(volume))} was taken for the volume and ${named(reading)} for the reading, in ${kind}, ${why}.`
      : `${capital(named(reading))} was taken for ${kind}, ${why}.`;
    notices.push({
      code: 'column-guessed',
      seen: taken,
      means: 'If a column was mistaken for another, every result is wrong.',
      remedy: 'Compare with the file; headers such as "V (mL)" and "pH" or "E (mV)" leave no doubt.',
      column: by === 'against-header' ? reading + 1 : volume + 1,
    });
  }
  const { maximum } = statistics[volume];
  if (volumeUnit === undefined && (maximum > LARGEST_USUAL_ML || (maximum > 0 && maximum < SMALLEST_USUAL_ML))) {
    notices.push({
      code: 'unit-guessed',
      seen: `No unit is given for the volume, and the largest is ${maximum}; mL was assumed.`,
      means: 'That is an unusual volume for a burette; in µL or L every concentration would change with it.',
      remedy: 'Write the unit into the header, such as "V (µL)".',
      column: volume + 1,
    });
  }
  if (inVolts) {
    notices.push({
      code: 'unit-guessed',
      seen: `No unit is given for the potential, and all of it lies within ±${LARGEST_VOLTS}; volts were assumed.`,
      means: 'In millivolts the electrode would hardly have moved.',
      remedy: 'Write the unit into the header, such as "E (V)".',
      column: reading + 1,
    });
  }
  return { group, notices };
}

function staysWithinVolts({ statistics }: SectionColumns, column: number): boolean {
  const { minimum, maximum, count } = statistics[column];
  return count >= 3 && maximum > minimum && minimum >= -LARGEST_VOLTS && maximum <= LARGEST_VOLTS;
}

/** The unit behind the first number of a column, if one stands there. */
function unitInCells(columns: SectionColumns, column: number) {
  const row = columns.values[column].findIndex((value) => !Number.isNaN(value));
  return row < 0 ? undefined : unitBehind(columns.section.rows[row].cells[column]);
}

function roleOfCells(unit: ReturnType<typeof unitInCells>): ColumnRole | undefined {
  if (unit === 'pH') return 'pH';
  return unit === 'mV' || unit === 'V' ? 'mV' : undefined;
}

/** Runs side by side are named by the caption over their columns, else by the header of their reading. */
function labelOf({ section }: SectionColumns, pair: ColumnPair, all: readonly ColumnPair[]): string | undefined {
  const caption = section.captions[pair.volume] || section.captions[pair.reading];
  if (caption) return caption;
  const sameName = all.filter(({ reading }) => section.names[reading] === section.names[pair.reading]).length;
  return sameName === 1 ? section.names[pair.reading] || undefined : undefined;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
