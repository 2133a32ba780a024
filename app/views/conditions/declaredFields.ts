import type { Declaration, Sheet, SheetFile } from '../../../core/index.ts';
import { buildSentence } from './buildSentence.ts';

/** What the conditions say about something that results name by the same id. */
export interface DeclaredField {
  readonly label: string;
  /** Null for choices and for numbers without an uncertainty. */
  readonly declaration: Declaration | null;
}

/** All fields of the conditions by their id. */
export function declaredFields(file: SheetFile, sheet: Sheet): ReadonlyMap<string, DeclaredField> {
  const { main, more } = buildSentence(file, sheet);
  const declared = new Map<string, DeclaredField>();
  for (const part of [...main, ...more]) {
    if (typeof part === 'string') continue;
    const { id, label, editor } = part;
    declared.set(id, { label, declaration: editor.kind === 'quantity' ? editor.declaration : null });
  }
  return declared;
}
