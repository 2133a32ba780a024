import type { Choice, Declaration, QuantityFile, SheetFile } from '../../../core/index.ts';
import { getAtPath, type KeyPath, setAtPath } from '../../state/setAtPath.ts';
import { declarationWords, type QuantityWords } from './declarationWords.ts';
import type { Option, SentenceField } from './sentence.ts';

interface Naming {
  readonly id: string;
  readonly label: string;
  readonly path: KeyPath;
  readonly hint?: string;
}

/** A quantity of the sheet as a field of the sentence. */
export function quantityField(
  file: SheetFile,
  naming: Naming,
  declaration: Declaration,
  words: QuantityWords,
): SentenceField {
  const { path, ...rest } = naming;
  return {
    ...rest,
    text: declarationWords(declaration, getAtPath(file, path) as QuantityFile | undefined, words),
    assumed: declaration.assumed,
    confirm: declaration.assumed ? (before) => setAtPath(before, path, asWritten(declaration)) : null,
    editor: {
      kind: 'quantity',
      unit: words.unit,
      declaration,
      written: getAtPath(file, path) as QuantityFile | undefined,
      set: (before, quantity) => setAtPath(before, path, quantity),
    },
  };
}

/** A plain number without uncertainty. */
export function numberField(
  naming: Naming,
  choice: Choice<number | null>,
  text: string,
  unit: string,
  openWords: string | null = null,
): SentenceField {
  const { path, ...rest } = naming;
  return {
    ...rest,
    text,
    assumed: choice.assumed,
    confirm: choice.assumed ? (before) => setAtPath(before, path, choice.value ?? undefined) : null,
    editor: {
      kind: 'number',
      unit,
      value: choice.value,
      openWords,
      set: (before, value) => setAtPath(before, path, value),
    },
  };
}

/** One of a few words. */
export function choiceField<Value extends string>(
  naming: Naming,
  choice: Choice<Value>,
  words: Readonly<Record<Value, { readonly label: string; readonly detail?: string }>>,
): SentenceField {
  const { path, ...rest } = naming;
  const set = (value: Value) => (before: SheetFile) => setAtPath(before, path, value);
  const options = (Object.keys(words) as Value[]).map(
    (value): Option => ({ ...words[value], isChosen: value === choice.value, edit: set(value) }),
  );
  return {
    ...rest,
    text: words[choice.value].label,
    assumed: choice.assumed,
    confirm: choice.assumed ? set(choice.value) : null,
    editor: { kind: 'choice', options },
  };
}

/** A name; names are never assumed, because no number rests on them. */
export function textField(naming: Naming, value: string, whenEmpty: string): SentenceField {
  const { path, ...rest } = naming;
  return {
    ...rest,
    text: value === '' ? whenEmpty : value,
    isName: value !== '',
    assumed: false,
    confirm: null,
    editor: {
      kind: 'text',
      value,
      set: (before, text) => setAtPath(before, path, text.trim() === '' ? undefined : text.trim()),
    },
  };
}

/** The assumed value as it would stand in the sheet. */
function asWritten(declaration: Declaration): QuantityFile {
  if (declaration.state === 'fixed') return declaration.value;
  if (declaration.state === 'fitted') return 'fitted';
  const { value, u, source } = declaration;
  return source === null ? { value, u } : { value, u, source };
}
