import type { Refusal } from './refusal.ts';

/**
 * What a function that handles user data returns: a value, or the reasons why
 * there is none. Programmer mistakes throw instead.
 */
export type Outcome<Value> =
  | { readonly ok: true; readonly value: Value }
  | { readonly ok: false; readonly refusals: readonly Refusal[] };
