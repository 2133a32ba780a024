import type { Sheet, SheetFile } from '../../../core/index.ts';
import { moreParts } from './moreParts.ts';
import { readingParts } from './readingParts.ts';
import { sampleParts } from './sampleParts.ts';
import type { Sentence } from './sentence.ts';
import { titrantParts } from './titrantParts.ts';

/**
 * The sheet as a sentence of a method section.
 *
 * @param file what the chemist declared
 * @param sheet the same, completed with what is assumed
 */
export function buildSentence(file: SheetFile, sheet: Sheet): Sentence {
  return {
    main: [...sampleParts(file, sheet), ...titrantParts(file, sheet), ...readingParts(file, sheet)],
    more: moreParts(file, sheet),
  };
}
