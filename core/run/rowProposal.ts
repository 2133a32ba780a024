/** What can be conspicuous about rows. The codes are stable: scripts may test them. */
export type ProposalCode =
  | 'row-duplicated'
  | 'volume-repeated'
  | 'volume-steps-back'
  | 'volume-slipped'
  | 'sensor-stuck'
  | 'reading-spike'
  | 'volume-beyond-range'
  | 'reading-beyond-range';

/** Rows that look wrong, and what could be done about them; the chemist decides. */
export interface RowProposal {
  readonly code: ProposalCode;
  /** Lines of the source file that it is about, in order; at least one. */
  readonly lines: readonly number[];
  /** 'exclude' where the point is better left out, 'keep' where it only needs to be known. */
  readonly action: 'exclude' | 'keep';
  /** What was seen, with the figures; also the reason to write down when it is followed. */
  readonly why: string;
}
