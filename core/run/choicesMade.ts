import type { Table } from '../table/table.ts';
import type { ExportUnit } from '../units/readUnit.ts';
import type { FormedRuns } from './formRuns.ts';
import type { ColumnUse, ReadingChoices, ReadingOverrules, VolumeMeaning } from './readingChoices.ts';

/** Who made a choice: the file itself, its figures where it says nothing, or a person. */
export type ChoiceSource = 'found' | 'guessed' | 'overruled';

export interface Made<Value> {
  readonly value: Value;
  readonly source: ChoiceSource;
}

/** One column of the main table as it was understood. */
export interface ColumnMade {
  /** Header as written, '' where there is none. */
  readonly name: string;
  readonly role: Made<ColumnUse>;
  readonly unit: Made<ExportUnit | null>;
}

/** How a file was read, each choice with who made it. */
export type ChoicesMade = {
  readonly [Key in Exclude<keyof ReadingChoices, 'columns'>]: Made<ReadingChoices[Key]>;
} & { readonly columns: readonly ColumnMade[] };

export function choicesMade(table: Table, formed: FormedRuns, overrules: ReadingOverrules): ChoicesMade {
  const { delimiter, marks } = table.dialect;
  const unclear = table.doubts.some(({ code }) => code === 'delimiter-guessed');
  const made = <Value>(value: Value, guessed: boolean, asked: unknown): Made<Value> => ({
    value,
    source: asked !== undefined ? 'overruled' : guessed ? 'guessed' : 'found',
  });
  const { columns, choice } = formed.main;
  const group = choice.groups[0];
  return {
    encoding: made(table.encoding, table.encodingGuessed, overrules.encoding),
    delimiter: made(delimiter, unclear, overrules.delimiter),
    decimal: made(marks.decimal, unclear, overrules.decimal),
    thousands: made(marks.thousands, unclear, overrules.thousands),
    headerLines: made(columns.section.headerLines, false, overrules.headerLines),
    columns: columnsMade(formed.main),
    volumeMeaning: made<VolumeMeaning>(group.volumeMeaning, group.meaningGuessed, overrules.volumeMeaning),
    runSplit: made(formed.runSplit, formed.splitGuessed, overrules.runSplit),
  };
}

function columnsMade({ columns, choice }: FormedRuns['main']): ColumnMade[] {
  const told = (code: string, column: number) =>
    choice.doubts.some((doubt) => doubt.code === code && doubt.place.column === column + 1);
  return columns.headers.map((header, column): ColumnMade => {
    const { role, unit, unitGiven } = useOf(choice.groups, column, header.unit !== undefined);
    const roleSource = header.roleDecided
      ? 'overruled'
      : isChosen(role) && (choice.guessed || told('column-guessed', column))
        ? 'guessed'
        : 'found';
    const unitSource = header.unitDecided ? 'overruled' : unit !== null && !unitGiven ? 'guessed' : 'found';
    return {
      name: columns.section.names[column],
      role: { value: role, source: roleSource },
      unit: { value: unit, source: unitSource },
    };
  });
}

type Groups = FormedRuns['main']['choice']['groups'];

function isChosen(role: ColumnUse): boolean {
  return role === 'volume' || role === 'increment' || role === 'pH' || role === 'mV';
}

function useOf(
  groups: Groups,
  column: number,
  unitGiven: boolean,
): { readonly role: ColumnUse; readonly unit: ExportUnit | null; readonly unitGiven: boolean } {
  for (const group of groups) {
    if (group.volume === column) {
      const role = group.volumeMeaning === 'increments' ? 'increment' : 'volume';
      return { role, unit: group.volumeUnit, unitGiven: group.volumeUnitGiven };
    }
    if (group.reading === column) {
      if (group.readingKind === 'pH') return { role: 'pH', unit: 'pH', unitGiven: true };
      return { role: 'mV', unit: group.potentialUnit, unitGiven: group.readingUnitGiven };
    }
  }
  for (const group of groups) {
    if (group.sample === column) return { role: 'sample', unit: null, unitGiven };
    if (group.temperature === column) {
      return { role: 'temperature', unit: group.temperatureUnit === 'K' ? 'K' : '°C', unitGiven };
    }
    if (group.time === column) return { role: 'time', unit: group.timeUnit ?? 's', unitGiven };
  }
  return { role: 'ignored', unit: null, unitGiven };
}
