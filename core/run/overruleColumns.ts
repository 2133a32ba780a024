import type { ColumnRole } from './columnRole.ts';
import type { ReadingOverrules } from './readingChoices.ts';
import type { HeaderReading } from './roleFromHeader.ts';

/** Roles of which a run has one column; they make room for one another. */
const RIVALS: readonly (readonly ColumnRole[])[] = [
  ['volume', 'increment'],
  ['pH', 'mV', 'reading'],
  ['temperature'],
  ['time'],
  ['sample'],
];

/**
 * What the headers say, corrected by what a person has decided. A column that
 * is given a role takes the place of those that were found in it, unless runs
 * are to stand side by side.
 */
export function overruleColumns(
  headers: readonly HeaderReading[],
  { columns = {}, runSplit }: ReadingOverrules,
): readonly HeaderReading[] {
  if (Object.keys(columns).length === 0) return headers;
  const taken = Object.values(columns).flatMap(({ role }) => (role === undefined || role === 'ignored' ? [] : [role]));
  return headers.map((header, column): HeaderReading => {
    const decided = columns[column];
    if (decided === undefined) {
      const rivals = RIVALS.find((roles) => header.role !== undefined && roles.includes(header.role)) ?? [];
      const displaced = runSplit !== 'sideBySide' && taken.some((role) => rivals.includes(role));
      return displaced ? { ...header, role: 'other' } : header;
    }
    const { unit: found, ...rest } = header;
    const unit = decided.unit === undefined ? found : (decided.unit ?? undefined);
    return {
      ...rest,
      ...(decided.role === undefined ? {} : { role: decided.role === 'ignored' ? 'other' : decided.role }),
      ...(unit === undefined ? {} : { unit }),
      roleDecided: decided.role !== undefined,
      unitDecided: decided.unit !== undefined && decided.unit !== null,
    };
  });
}
