import type { Declaration, QuantityFile, SheetFile } from '../../../core/index.ts';

/** A change of the sheet. */
export type SheetEdit = (file: SheetFile) => SheetFile;

export interface Option {
  /** Stands above the first option of its kind. */
  readonly heading?: string;
  readonly label: string;
  readonly detail?: string;
  readonly isChosen: boolean;
  readonly edit: SheetEdit;
}

/** How a field of the sentence is changed. */
export type Editor =
  | {
      readonly kind: 'quantity';
      /** As printed behind the number: "mL", "M", "mV" or "". */
      readonly unit: string;
      readonly declaration: Declaration;
      /** As it stands in the sheet; undefined where it was left out. */
      readonly written: QuantityFile | undefined;
      /** Undefined takes it out of the sheet. */
      readonly set: (file: SheetFile, quantity: QuantityFile | undefined) => SheetFile;
    }
  | {
      readonly kind: 'number';
      readonly unit: string;
      /** Null: left open. */
      readonly value: number | null;
      /** What leaving the number out means; null where it only means the usual value. */
      readonly openWords: string | null;
      readonly set: (file: SheetFile, value: number | undefined) => SheetFile;
    }
  | { readonly kind: 'text'; readonly value: string; readonly set: (file: SheetFile, text: string) => SheetFile }
  | { readonly kind: 'choice'; readonly options: readonly Option[] };

/** A part of the sentence that can be changed in place. */
export interface SentenceField {
  /** Stable, for focus and tests: "sample.volume". */
  readonly id: string;
  /** What it is, for the head of its form and for screen readers: "sample volume". */
  readonly label: string;
  /** As it reads in the sentence. */
  readonly text: string;
  /** True for a name, which is set in italics. */
  readonly isName?: boolean;
  /** Nobody has confirmed it yet. */
  readonly assumed: boolean;
  /** Writes the assumed value into the sheet; null where there is nothing to confirm. */
  readonly confirm: SheetEdit | null;
  /** One sentence for those who do not know the quantity. */
  readonly hint?: string;
  readonly editor: Editor;
}

export type SentencePart = string | SentenceField;

/** The conditions as a sentence of a method section, and the rarely used ones that follow it. */
export interface Sentence {
  readonly main: readonly SentencePart[];
  readonly more: readonly SentencePart[];
}
