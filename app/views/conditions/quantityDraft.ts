import type { Declaration, QuantityFile } from '../../../core/index.ts';
import { parseEntry } from '../../widgets/parseEntry.ts';

export type UncertaintyKind = 'u' | 'U' | 'tolerance';
export type Distribution = 'rectangular' | 'triangular' | 'normal';

/** A quantity while it is being typed; every number is still text. */
export interface QuantityDraft {
  readonly state: 'fixed' | 'known' | 'fitted';
  readonly value: string;
  readonly uncertaintyKind: UncertaintyKind;
  /** u, U or the half-width of the tolerance. */
  readonly uncertainty: string;
  readonly k: string;
  readonly distribution: Distribution;
  readonly source: string;
  readonly start: string;
}

export type DraftOutcome =
  | { readonly ok: true; readonly quantity: QuantityFile }
  | { readonly ok: false; readonly field: keyof QuantityDraft; readonly message: string };

/** The draft with which the form opens. */
export function draftOf(declaration: Declaration, written: QuantityFile | undefined): QuantityDraft {
  const blank: QuantityDraft = {
    state: declaration.state,
    value: declaration.state === 'fitted' ? '' : String(declaration.value),
    uncertaintyKind: 'u',
    uncertainty: declaration.state === 'known' ? String(declaration.u) : '',
    k: '2',
    distribution: 'rectangular',
    source: declaration.state === 'known' ? (declaration.source ?? '') : '',
    start: declaration.state === 'fitted' && declaration.start !== null ? String(declaration.start) : '',
  };
  if (typeof written !== 'object') return blank;
  if ('U' in written) return { ...blank, uncertaintyKind: 'U', uncertainty: String(written.U), k: String(written.k) };
  if ('tolerance' in written)
    return {
      ...blank,
      uncertaintyKind: 'tolerance',
      uncertainty: String(written.tolerance),
      distribution: written.distribution,
    };
  return blank;
}

/** The quantity that a draft describes, or which entry is not yet one. Ranges are checked by the sheet itself. */
export function readDraft(draft: QuantityDraft): DraftOutcome {
  const wrong = (field: keyof QuantityDraft, message: string): DraftOutcome => ({ ok: false, field, message });
  if (draft.state === 'fitted') {
    if (draft.start.trim() === '') return { ok: true, quantity: 'fitted' };
    const start = parseEntry(draft.start);
    if (start === null) return wrong('start', 'The start is a number, or nothing: then the run suggests one.');
    return { ok: true, quantity: { fitted: true, start } };
  }
  const value = parseEntry(draft.value);
  if (value === null) return wrong('value', 'The value is a number such as 0.1002 or 0,1002.');
  if (draft.state === 'fixed') return { ok: true, quantity: value };

  const uncertainty = parseEntry(draft.uncertainty);
  if (uncertainty === null || uncertainty <= 0)
    return wrong('uncertainty', 'The uncertainty is a positive number, in the unit of the value.');
  const source = draft.source.trim() === '' ? {} : { source: draft.source.trim() };
  if (draft.uncertaintyKind === 'u') return { ok: true, quantity: { value, u: uncertainty, ...source } };
  if (draft.uncertaintyKind === 'tolerance')
    return { ok: true, quantity: { value, tolerance: uncertainty, distribution: draft.distribution, ...source } };
  const k = parseEntry(draft.k);
  if (k === null || k <= 0) return wrong('k', 'The coverage factor k is a positive number, mostly 2.');
  return { ok: true, quantity: { value, U: uncertainty, k, ...source } };
}
