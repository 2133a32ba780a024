import type { Analyte, AnalyteFile, Choice, QuantityFile, SheetFile } from '../../../core/index.ts';
import { getAtPath, type KeyPath, setAtPath } from '../../state/setAtPath.ts';
import { quantityField, textField } from './fields.ts';
import { formWeighed, kindsOfGroup } from './formWeighed.ts';
import type { Option, SentenceField, SentencePart } from './sentence.ts';

const subscripts = '₀₁₂₃₄₅₆';
const mostGroups = 6;

/** One substance of the sample: "compound SW-12, 3 ionisable groups, weighed as the hydrochloride, …". */
export function analyteParts(file: SheetFile, analyte: Analyte, path: KeyPath, prefix: string): SentencePart[] {
  const name = analyte.name.assumed ? '' : analyte.name.value;
  const id = (key: string) => `${prefix}${key}`;
  const weighed =
    analyte.protonsLostAsWeighed === null
      ? []
      : [', weighed as ', formField(analyte, analyte.protonsLostAsWeighed, path, id('form'))];
  const counterIon =
    analyte.counterIon === null ? [] : [` with ${analyte.counterIon.ratio} ${analyte.counterIon.name} as counter-ion`];
  return [
    textField(
      { id: id('name'), label: 'name of the substance', path: [...path, 'name'] },
      name,
      'an unnamed substance',
    ),
    ', ',
    groupsField(analyte, path, id('groups')),
    ...weighed,
    ...counterIon,
    ', concentration ',
    quantityField(
      file,
      { id: id('concentration'), label: 'concentration in the sample', path: [...path, 'concentration_M'] },
      analyte.concentration,
      { unit: 'M', decimals: 4 },
    ),
    ...constants(file, analyte, path, prefix),
  ];
}

function constants(file: SheetFile, analyte: Analyte, path: KeyPath, prefix: string): SentencePart[] {
  return analyte.pKa.flatMap((declaration, group): SentencePart[] => {
    const label = `pKa${subscripts[group + 1]}`;
    const field = quantityField(
      file,
      {
        id: `${prefix}pKa${group + 1}`,
        label,
        path: [...path, 'pKa', group],
        hint: 'At infinite dilution where activities are computed, else of this medium.',
      },
      declaration,
      { unit: '', decimals: 2 },
    );
    const editor =
      field.editor.kind !== 'quantity' ? field.editor : { ...field.editor, set: setConstant(analyte, path, group) };
    const last = group > 0 && group === analyte.pKa.length - 1;
    return [`${last ? ' and ' : ', '}${label} `, { ...field, editor }];
  });
}

/** Constants stand in a list, which must be whole: naming one writes "fitted" for those not named yet. */
function setConstant(analyte: Analyte, path: KeyPath, group: number) {
  return (before: SheetFile, quantity: QuantityFile | undefined): SheetFile => {
    const written = getAtPath(before, [...path, 'pKa']) as readonly QuantityFile[] | undefined;
    const list = analyte.pKa.map((_, k) => (k === group ? quantity : written?.[k]) ?? 'fitted');
    return setAtPath(before, [...path, 'pKa'], list);
  };
}

function groupsField(analyte: Analyte, path: KeyPath, id: string): SentenceField {
  const { value, assumed } = analyte.groups;
  const set = (groups: number) => (before: SheetFile) => withGroups(before, path, groups);
  const options: Option[] = [
    {
      label: 'let the run show how many',
      detail: 'Fitted with none, one, two … groups; the smallest number that explains the run is taken.',
      isChosen: assumed,
      edit: (before) => withGroups(before, path, undefined),
    },
    ...Array.from({ length: mostGroups }, (_, index) => ({
      label: groupWords(index + 1),
      isChosen: !assumed && value === index + 1,
      edit: set(index + 1),
    })),
  ];
  return {
    id,
    label: 'number of ionisable groups',
    text: groupWords(value),
    assumed,
    confirm: assumed ? set(value) : null,
    editor: { kind: 'choice', options },
  };
}

/** Sets the number of groups and keeps what depends on it in order: one constant each, no more protons lost. */
function withGroups(before: SheetFile, path: KeyPath, groups: number | undefined): SheetFile {
  const file = setAtPath(before, [...path, 'groups'], groups);
  const analyte = getAtPath(file, path) as AnalyteFile | undefined;
  if (groups === undefined) return setAtPath(file, [...path, 'pKa'], undefined);
  const pKa = analyte?.pKa;
  const list = pKa === undefined ? undefined : Array.from({ length: groups }, (_, k) => pKa[k] ?? ('fitted' as const));
  const lost = analyte?.protonsLostAsWeighed;
  return setAtPath(
    setAtPath(file, [...path, 'pKa'], list),
    [...path, 'protonsLostAsWeighed'],
    lost === undefined ? undefined : Math.min(lost, groups),
  );
}

function formField(analyte: Analyte, lost: Choice<number>, path: KeyPath, id: string): SentenceField {
  const groups = analyte.groups.value;
  const current = { chargeFullyProtonated: analyte.chargeFullyProtonated.value, protonsLost: lost.value };
  const set = (chargeFullyProtonated: number, protonsLost: number) => (before: SheetFile) =>
    setAtPath(
      setAtPath(before, [...path, 'chargeFullyProtonated'], chargeFullyProtonated),
      [...path, 'protonsLostAsWeighed'],
      protonsLost,
    );
  const usual = Array.from({ length: groups + 1 }, (_, charge) => charge);
  const charges = usual.includes(current.chargeFullyProtonated) ? usual : [...usual, current.chargeFullyProtonated];
  const options = charges.flatMap((charge) =>
    Array.from(
      { length: groups + 1 },
      (_, protonsLost): Option => ({
        ...(protonsLost === 0 ? { heading: kindsOfGroup(groups, charge) } : {}),
        label: formWeighed(groups, { chargeFullyProtonated: charge, protonsLost }),
        detail: lostWords(groups, protonsLost),
        isChosen: charge === current.chargeFullyProtonated && protonsLost === current.protonsLost,
        edit: set(charge, protonsLost),
      }),
    ),
  );
  const assumed = lost.assumed || analyte.chargeFullyProtonated.assumed;
  return {
    id,
    label: 'form weighed',
    text: `${formWeighed(groups, current)} (${lostWords(groups, lost.value)})`,
    assumed,
    confirm: assumed ? set(current.chargeFullyProtonated, current.protonsLost) : null,
    hint: 'It decides which counter-ions came along, and so where the curve begins.',
    editor: { kind: 'choice', options },
  };
}

function lostWords(groups: number, lost: number): string {
  if (lost === 0) return 'no proton lost';
  return lost === groups && groups > 1 ? `all ${groups} protons lost` : `${lost} proton${lost === 1 ? '' : 's'} lost`;
}

function groupWords(groups: number): string {
  return `${groups} ionisable group${groups === 1 ? '' : 's'}`;
}
