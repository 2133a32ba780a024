import type { Declaration, Sheet, SheetFile } from '../../../core/index.ts';
import { buildSentence } from './buildSentence.ts';

/** What the sheet says of each quantity, by the id under which results name it. */
export function declaredQuantities(file: SheetFile, sheet: Sheet): ReadonlyMap<string, Declaration> {
  const { main, more } = buildSentence(file, sheet);
  const declared = new Map<string, Declaration>();
  for (const part of [...main, ...more]) {
    if (typeof part !== 'string' && part.editor.kind === 'quantity') declared.set(part.id, part.editor.declaration);
  }
  return declared;
}
