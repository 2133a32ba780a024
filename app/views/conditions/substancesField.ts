import type { AnalyteFile, Sheet, SheetFile } from '../../../core/index.ts';
import { setAtPath } from '../../state/setAtPath.ts';
import type { Option, SentenceField } from './sentence.ts';

const mostSubstances = 3;
const numbers = ['no substance', 'one substance', 'two substances', 'three substances'];

/** How many substances with ionisable groups the sample holds; adds a further one or takes the last away. */
export function substancesField(sheet: Sheet): SentenceField {
  const present = sheet.sample.analytes.length;
  const options = Array.from(
    { length: Math.max(mostSubstances, present) + 1 },
    (_, count): Option => ({
      label: words(count),
      ...(count === 0 ? { detail: 'A strong acid or base alone; its concentration is fitted.' } : {}),
      isChosen: count === present,
      edit: (file) => withSubstances(file, count),
    }),
  );
  return {
    id: 'sample.substances',
    label: 'number of substances in the sample',
    text: `${words(present)} with ionisable groups`,
    assumed: false,
    confirm: null,
    editor: { kind: 'choice', options },
  };
}

function withSubstances(file: SheetFile, count: number): SheetFile {
  const before: readonly AnalyteFile[] = file.sample?.analytes ?? [{}];
  const kept = before.filter((analyte) => analyte.groups !== 0).slice(0, count);
  const added = Array.from({ length: count - kept.length }, (): AnalyteFile => ({ groups: 1 }));
  const edited = setAtPath(file, ['sample', 'analytes'], [...kept, ...added]);
  // Without substances the strong acid or base is what is titrated: "none" would leave nothing to find.
  return count === 0 && edited.sample?.strongIon_M === 0
    ? setAtPath(edited, ['sample', 'strongIon_M'], undefined)
    : edited;
}

function words(count: number): string {
  return numbers[count] ?? `${count} substances`;
}
