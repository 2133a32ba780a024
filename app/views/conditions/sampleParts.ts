import type { Sheet, SheetFile } from '../../../core/index.ts';
import { setAtPath } from '../../state/setAtPath.ts';
import { analyteParts } from './analyteParts.ts';
import { analytePaths } from './analytePaths.ts';
import { quantityField } from './fields.ts';
import type { Option, SentenceField, SentencePart } from './sentence.ts';

/** "25.00 mL of sample holding …, in 0.10 M background electrolyte". */
export function sampleParts(file: SheetFile, sheet: Sheet): SentencePart[] {
  const { sample } = sheet;
  const paths = analytePaths(file, sheet);
  const substances = sample.analytes.flatMap((analyte, index): SentencePart[] => [
    index === 0 ? '' : '; and ',
    ...analyteParts(file, analyte, paths[index], index === 0 ? '' : `analyte${index + 1}.`),
  ]);
  const strongIon = strongIonField(file, sheet);
  return [
    quantityField(file, { id: 'sample.volume', label: 'sample volume', path: ['sample', 'volume_mL'] }, sample.volume, {
      unit: 'mL',
      decimals: 2,
    }),
    ' of sample holding ',
    ...(substances.length > 0 ? substances : [noSubstanceField(), ' but a strong acid or base, ', strongIon]),
    '; in ',
    quantityField(
      file,
      {
        id: 'sample.background',
        label: 'background electrolyte in the sample',
        path: ['sample', 'background_M'],
        hint: 'An inert salt of singly charged ions, such as KCl; it sets the ionic strength.',
      },
      sample.background,
      { unit: 'M', decimals: 2, whenZero: 'no background electrolyte', noun: 'background electrolyte' },
    ),
  ];
}

/** Strong charge beyond the counter-ions; a sentence of its own where there are substances, the subject where not. */
export function strongIonField(file: SheetFile, sheet: Sheet): SentenceField {
  return quantityField(
    file,
    {
      id: 'sample.strongIon',
      label: 'strong acid or base in the sample',
      path: ['sample', 'strongIon_M'],
      hint: 'Beyond the counter-ions: positive for a strong base, negative for a strong acid.',
    },
    sheet.sample.strongIon,
    { unit: 'M', decimals: 4, whenZero: 'no strong acid or base' },
  );
}

/** Stands in place of the substances where there are none. */
function noSubstanceField(): SentenceField {
  const options: Option[] = [
    { label: 'no substance with ionisable groups', isChosen: true, edit: (file) => file },
    {
      label: 'one substance with ionisable groups',
      detail: 'The strong acid or base then counts as none, unless declared.',
      isChosen: false,
      edit: (file) => setAtPath(file, ['sample', 'analytes'], [{ groups: 1 }]),
    },
  ];
  return {
    id: 'sample.analytes',
    label: 'substances in the sample',
    text: 'nothing',
    assumed: false,
    confirm: null,
    editor: { kind: 'choice', options },
  };
}
