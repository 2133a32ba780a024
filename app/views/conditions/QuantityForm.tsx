import { useId, useState } from 'react';
import type { QuantityFile } from '../../../core/index.ts';
import { draftOf, type QuantityDraft, readDraft } from './quantityDraft.ts';
import type { Editor } from './sentence.ts';

interface Props {
  readonly editor: Extract<Editor, { kind: 'quantity' }>;
  /** What is wrong with this quantity in this sheet; null where it may be set. */
  readonly check: (quantity: QuantityFile) => string | null;
  /** Told at every change: the quantity where it may be set, else null. */
  readonly onDraft: (quantity: QuantityFile | null) => void;
}

const states = [
  { state: 'fixed', label: 'fixed', means: 'taken as exact' },
  { state: 'known', label: 'known', means: 'with its uncertainty' },
  { state: 'fitted', label: 'fitted', means: 'found from the run' },
] as const;

/** The three states of a quantity, with their entries. */
export function QuantityForm({ editor, check, onDraft }: Props) {
  const id = useId();
  const [draft, setDraft] = useState(() => draftOf(editor.declaration, editor.written));
  const problem = problemOf(draft, check);

  const change = (part: Partial<QuantityDraft>) => {
    const next = { ...draft, ...part };
    setDraft(next);
    const read = readDraft(next);
    onDraft(read.ok && check(read.quantity) === null ? read.quantity : null);
  };

  const entry = (
    key: 'value' | 'uncertainty' | 'k' | 'source' | 'start',
    label: string,
    options: EntryOptions = {},
  ) => (
    <label className="entry">
      <span>{label}</span>
      <input
        type="text"
        inputMode={key === 'source' ? 'text' : 'decimal'}
        autoComplete="off"
        value={draft[key]}
        placeholder={options.placeholder}
        data-first={options.first}
        aria-invalid={problem?.field === key}
        aria-describedby={problem?.field === key ? `${id}-problem` : undefined}
        onChange={(event) => change({ [key]: event.target.value })}
      />
      {options.unit !== undefined && options.unit !== '' && <span className="unit">{options.unit}</span>}
    </label>
  );

  return (
    <>
      <fieldset className="states">
        <legend className="unseen">state</legend>
        {states.map(({ state, label, means }) => (
          <label key={state}>
            <input
              type="radio"
              name={`${id}-state`}
              checked={draft.state === state}
              data-first={state === 'fitted' && draft.state === 'fitted' ? true : undefined}
              onChange={() => change({ state })}
            />
            <span>{label}</span>
            <small>{means}</small>
          </label>
        ))}
      </fieldset>
      {draft.state === 'fitted' && entry('start', 'start', { unit: editor.unit, placeholder: 'from the run' })}
      {draft.state !== 'fitted' && entry('value', 'value', { unit: editor.unit, first: true })}
      {draft.state === 'known' && (
        <>
          <label className="entry">
            <span>given as</span>
            <select
              value={draft.uncertaintyKind}
              onChange={(event) => change({ uncertaintyKind: event.target.value as QuantityDraft['uncertaintyKind'] })}
            >
              <option value="u">standard uncertainty u</option>
              <option value="U">expanded uncertainty U with k</option>
              <option value="tolerance">tolerance ±</option>
            </select>
          </label>
          {entry('uncertainty', { u: 'u', U: 'U', tolerance: '±' }[draft.uncertaintyKind], { unit: editor.unit })}
          {draft.uncertaintyKind === 'U' && entry('k', 'k')}
          {draft.uncertaintyKind === 'tolerance' && (
            <label className="entry">
              <span>spread</span>
              <select
                value={draft.distribution}
                onChange={(event) => change({ distribution: event.target.value as QuantityDraft['distribution'] })}
              >
                <option value="rectangular">rectangular: every value equally likely</option>
                <option value="triangular">triangular: the middle likelier</option>
                <option value="normal">normal: a 95 % interval</option>
              </select>
            </label>
          )}
          {entry('source', 'source', { placeholder: 'its own' })}
        </>
      )}
      <p className="problem" id={`${id}-problem`} aria-live="polite">
        {problem?.message}
      </p>
    </>
  );
}

interface EntryOptions {
  readonly unit?: string;
  readonly placeholder?: string;
  readonly first?: boolean;
}

function problemOf(
  draft: QuantityDraft,
  check: Props['check'],
): { readonly field: keyof QuantityDraft; readonly message: string } | null {
  const read = readDraft(draft);
  if (!read.ok) return read;
  const message = check(read.quantity);
  return message === null ? null : { field: draft.state === 'fitted' ? 'start' : 'value', message };
}
