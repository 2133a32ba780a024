import type { RowDecision, SheetFile } from '../../core/index.ts';

/** What the chemist decided about one run. The run itself is read again from its file. */
export interface RunInput {
  /** Key of its file on the shelf. */
  readonly file: string;
  /** Position among the runs of that file. */
  readonly index: number;
  /** True for a run that came with the page. */
  readonly isSample: boolean;
  readonly sheet: SheetFile;
  /** By line of the source file; lines that are not named keep what the reader decided. */
  readonly decisions: ReadonlyMap<number, RowDecision>;
}

/** All inputs of the page. Never changed, only replaced. */
export interface Inputs {
  readonly runs: readonly RunInput[];
  /** Position of the run that is shown; −1 where there is none. */
  readonly shown: number;
}
