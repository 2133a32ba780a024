import type { Doubt } from '../notice/doubt.ts';
import { unitBehind } from '../table/unitBehind.ts';
import type { ExportUnit } from '../units/readUnit.ts';
import { columnBeside } from './columnBeside.ts';
import type { ColumnGroup } from './columnGroup.ts';
import type { ColumnRole } from './columnRole.ts';
import type { ColumnPair } from './guessColumns.ts';
import { plainWords } from './plainWords.ts';
import type { VolumeMeaning } from './readingChoices.ts';
import { readingKind } from './readingKind.ts';
import type { SectionColumns } from './sectionColumns.ts';
import { volumeMeaning } from './volumeMeaning.ts';

/** A doubt about a column, without its place but for the column, counted from 1. */
export type ColumnNotice = Pick<Doubt, 'code' | 'seen' | 'means' | 'remedy'> & { readonly column: number };

/** Volumes beyond these, with no unit given, are more than a burette holds or less than it can dose, mL. */
const LARGEST_USUAL_ML = 250;
const SMALLEST_USUAL_ML = 0.1;

/** Potentials that all stay within this, with no unit given, are volts. */
const LARGEST_VOLTS = 2;

/**
 * Kind and units of the chosen columns, from header, units row and cells, with
 * a notice for everything that the file left open. `guessed` tells that the
 * columns were chosen by their figures.
 */
export function toColumnGroup(
  columns: SectionColumns,
  { volume, reading }: ColumnPair,
  guessed: boolean,
  sample: number | undefined,
  askedMeaning: VolumeMeaning | undefined,
): { readonly group: ColumnGroup; readonly notices: readonly ColumnNotice[] } {
  const { headers, statistics } = columns;
  const notices: ColumnNotice[] = [];
  const volumeUnit = headers[volume].unit ?? unitInCells(columns, volume);
  const readingUnit = headers[reading].unit ?? unitInCells(columns, reading);
  const headerRole = headers[reading].role;
  const role =
    guessed && headerRole === 'volume'
      ? undefined
      : headerRole === undefined || headerRole === 'reading'
        ? roleOfCells(readingUnit)
        : headerRole;
  const decidedKind = headers[reading].roleDecided && (role === 'pH' || role === 'mV') ? role : undefined;
  const { kind, by } =
    decidedKind === undefined
      ? readingKind(role, readingUnit === 'V', statistics[reading])
      : { kind: decidedKind, by: 'header' as const };
  const { meaning, guessed: meaningGuessed } =
    askedMeaning === undefined ? meaningOf(columns, volume, reading) : { meaning: askedMeaning, guessed: false };
  const temperature = columnBeside(columns, 'temperature', volume);
  const time = columnBeside(columns, 'time', volume);
  const inVolts = kind === 'mV' && staysWithinVolts(columns, reading) && readingUnit === undefined;
  const group: ColumnGroup = {
    volume,
    reading,
    readingKind: kind,
    volumeUnit: volumeUnit === 'µL' || volumeUnit === 'L' ? volumeUnit : 'mL',
    potentialUnit: kind === 'mV' && (readingUnit === 'V' || inVolts) ? 'V' : 'mV',
    volumeUnitGiven: volumeUnit !== undefined,
    readingUnitGiven: readingUnit !== undefined,
    volumeUnitDecided: headers[volume].unitDecided === true,
    readingUnitDecided: headers[reading].unitDecided === true,
    volumeMeaning: meaning,
    meaningGuessed,
    ...(temperature === undefined ? {} : { temperature, ...unitOf(headers[temperature].unit, 'temperatureUnit') }),
    ...(time === undefined ? {} : { time, ...unitOf(headers[time].unit, 'timeUnit') }),
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
  if (meaningGuessed) notices.push(meaningNotice(named(volume), meaning, volume + 1));
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

const MEANINGS: Readonly<Record<VolumeMeaning, string>> = {
  cumulative: 'for the volume added so far, because its figures rise all along',
  increments: 'for single additions, because its figures do not go on rising while the readings go one way',
  burette: 'for the scale of a burette that did not start at zero: the first figure was subtracted',
  countingDown: 'for a burette that counts down: what it shows was subtracted from the first figure',
};

function meaningNotice(column: string, meaning: VolumeMeaning, number: number): ColumnNotice {
  return {
    code: 'volume-meaning-guessed',
    seen: `${capital(column)} was taken ${MEANINGS[meaning]}.`,
    means: 'If its figures mean something else, every volume is wrong.',
    remedy:
      'Compare with the record; a header such as "V added (mL)", "increment (mL)" or "burette reading (mL)" settles it.',
    column: number,
  };
}

/** A person who says that a column holds additions, or sums, is believed. */
function meaningOf({ headers, section }: SectionColumns, volume: number, reading: number) {
  const { role, roleDecided } = headers[volume];
  if (roleDecided && role === 'increment') return { meaning: 'increments' as const, guessed: false };
  const name = plainWords(section.names[volume]);
  return volumeMeaning(section.values[volume], section.values[reading], name, role === 'increment');
}

function unitOf<Key extends string>(unit: ExportUnit | undefined, key: Key): { readonly [K in Key]?: ExportUnit } {
  return unit === undefined ? {} : ({ [key]: unit } as { [K in Key]?: ExportUnit });
}

function staysWithinVolts({ statistics }: SectionColumns, column: number): boolean {
  const { minimum, maximum, count } = statistics[column];
  return count >= 3 && maximum > minimum && minimum >= -LARGEST_VOLTS && maximum <= LARGEST_VOLTS;
}

/** The unit behind the first number of a column, if one stands there. */
function unitInCells(columns: SectionColumns, column: number) {
  const row = columns.section.values[column].findIndex((value) => !Number.isNaN(value));
  return row < 0 ? undefined : unitBehind(columns.section.rows[row].cells[column]);
}

function roleOfCells(unit: ReturnType<typeof unitInCells>): ColumnRole | undefined {
  if (unit === 'pH') return 'pH';
  return unit === 'mV' || unit === 'V' ? 'mV' : undefined;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
