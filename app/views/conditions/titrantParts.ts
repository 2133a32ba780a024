import type { Sheet, SheetFile, StrengthMeaning, TitrantKind } from '../../../core/index.ts';
import { analyteParts } from './analyteParts.ts';
import { choiceField, quantityField, textField } from './fields.ts';
import type { SentencePart } from './sentence.ts';

const kinds: Readonly<Record<Exclude<TitrantKind, 'solution'>, { readonly label: string }>> = {
  base: { label: 'a strong base' },
  acid: { label: 'a strong acid' },
};

const meanings: Readonly<Record<StrengthMeaning, { readonly label: string; readonly detail: string }>> = {
  hydroxide: { label: 'hydroxide alone', detail: 'Carbonate comes on top of the stated strength.' },
  toHydrogencarbonate: {
    label: 'hydroxide and carbonate, to hydrogencarbonate',
    detail: 'What a standardisation against a primary acid to about pH 8 gives.',
  },
  totalBase: {
    label: 'all base, carbonate counted twice',
    detail: 'What a titration with strong acid to about pH 4 gives.',
  },
};

/** "titrated with 0.1002 M (u = 0.0002 M) NaOH, a strong base, carrying no carbonate". */
export function titrantParts(file: SheetFile, sheet: Sheet): SentencePart[] {
  const { titrant } = sheet;
  const carbonate = quantityField(
    file,
    { id: 'titrant.carbonate', label: 'carbonate in the titrant', path: ['titrant', 'carbonate_M'] },
    titrant.carbonate,
    { unit: 'M', decimals: 4, whenZero: 'no carbonate', noun: 'carbonate' },
  );
  if (titrant.kind.value === 'solution' || titrant.concentration === null) return solutionParts(file, sheet);
  const carries = titrant.carbonate.state !== 'fixed' || titrant.carbonate.value !== 0;
  const meaning =
    titrant.kind.value === 'base' && carries
      ? [
          ', its strength meaning ',
          choiceField(
            { id: 'titrant.strengthMeans', label: 'what the strength counts', path: ['titrant', 'strengthMeans'] },
            titrant.strengthMeans,
            meanings,
          ),
        ]
      : [];
  return [
    ', titrated with ',
    quantityField(
      file,
      { id: 'titrant.concentration', label: 'titrant strength', path: ['titrant', 'concentration_M'] },
      titrant.concentration,
      { unit: 'M', decimals: 4 },
    ),
    ' ',
    textField(
      { id: 'titrant.name', label: 'name of the titrant', path: ['titrant', 'name'] },
      titrant.name ?? '',
      'titrant',
    ),
    ', ',
    choiceField(
      { id: 'titrant.kind', label: 'kind of titrant', path: ['titrant', 'kind'] },
      { value: titrant.kind.value, assumed: titrant.kind.assumed },
      kinds,
    ),
    ', carrying ',
    carbonate,
    ...meaning,
  ];
}

/** A titrant that is described by all it holds. */
function solutionParts(file: SheetFile, { titrant }: Sheet): SentencePart[] {
  const ions = (['cations', 'anions'] as const).flatMap((ion): SentencePart[] => {
    const declaration = titrant[ion];
    if (declaration === null) return [];
    return [
      quantityField(
        file,
        { id: `titrant.${ion}`, label: `strong ${ion} in the titrant`, path: ['titrant', `${ion}_M`] },
        declaration,
        { unit: 'M', decimals: 4, whenZero: `no strong ${ion}`, noun: `strong ${ion}` },
      ),
      ', ',
    ];
  });
  const systems = titrant.systems.flatMap((system, index): SentencePart[] => [
    '; and ',
    ...analyteParts(file, system, ['titrant', 'systems', index], `titrant.system${index + 1}.`),
  ]);
  return [
    ', titrated with ',
    textField(
      { id: 'titrant.name', label: 'name of the titrant', path: ['titrant', 'name'] },
      titrant.name ?? '',
      'a solution',
    ),
    ' holding ',
    ...ions,
    quantityField(
      file,
      { id: 'titrant.carbonate', label: 'carbonate in the titrant', path: ['titrant', 'carbonate_M'] },
      titrant.carbonate,
      { unit: 'M', decimals: 4, whenZero: 'no carbonate', noun: 'carbonate' },
    ),
    ...systems,
  ];
}
