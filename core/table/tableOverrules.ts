import type { TextEncodingName } from './decodeText.ts';
import type { NumberMarks } from './numberMarks.ts';
import type { Delimiter } from './splitCells.ts';

/** What a person has decided about the text of a file; what is left out is decided by the file. */
export interface TableOverrules {
  readonly encoding?: TextEncodingName;
  readonly delimiter?: Delimiter;
  readonly decimal?: NumberMarks['decimal'];
  readonly thousands?: NumberMarks['thousands'];
  /** Lines above the first table, counted from 1, that are its captions, header and units; none where empty. */
  readonly headerLines?: readonly number[];
}
