import type { Doubt } from '../../notice/doubt.ts';
import type { Run } from '../../run/run.ts';
import type { Sheet } from '../../sheet/sheet.ts';

/** A sheet for one kind of reading over a file that holds the other. */
export function readingKindContradicted({ run, sheet }: { readonly run: Run; readonly sheet: Sheet }): Doubt[] {
  const { kind } = sheet.reading;
  if (kind === run.readingKind) return [];
  return [
    {
      code: 'reading-kind-contradicted',
      seen: `The sheet declares readings in ${kind}; those of the file look like ${run.readingKind}.`,
      means: `They were taken as ${kind}, and everything follows from that.`,
      remedy: 'Declare the kind of reading that the file holds, or choose the right column.',
      place: { key: 'reading.kind' },
    },
  ];
}
