import type { Sheet, SheetFile } from '../../../core/index.ts';
import type { KeyPath } from '../../state/setAtPath.ts';

/**
 * Where in the sheet file each substance of the completed sheet stands. A substance without groups is left out of the
 * completed sheet, and a file that says nothing of substances means one.
 */
export function analytePaths(file: SheetFile, sheet: Sheet): readonly KeyPath[] {
  const sample = file.sample ?? {};
  const inFull = sample.cations_M !== undefined || sample.anions_M !== undefined || sample.systems !== undefined;
  const declared = sample.analytes ?? (inFull ? [] : [{}]);
  const systems = (sample.systems ?? []).map((_, index): KeyPath => ['sample', 'systems', index]);
  const present = sheet.sample.analytes.length - systems.length;
  const groups = declared.map((analyte) => analyte.groups ?? analyte.pKa?.length ?? null);
  const withOpen = groups.filter((count) => count !== 0).length;
  // Where the run shows no group at all, those whose number is left open are left out too.
  const isKept = (count: number | null) => count !== 0 && (count !== null || withOpen === present);
  const analytes = groups.flatMap((count, index): KeyPath[] => (isKept(count) ? [['sample', 'analytes', index]] : []));
  return [...analytes, ...systems];
}
