import fc from 'fast-check';
import { accountFor } from '../core/run/accountFor.ts';
import { arbitraryFile } from '../core/run/arbitraryFile.ts';

export interface AccountingStudy {
  /** Files of which runs could be formed; all others were refused as a whole. */
  readonly read: number;
  /** Longest time that one file took, ms. */
  readonly longest_ms: number;
}

/** Reads so many damaged exports and random files; throws at the first whose rows are not all accounted for. */
export function accountingStudy(files: number, seed: number): AccountingStudy {
  let read = 0;
  let longest_ms = 0;
  fc.assert(
    fc.property(arbitraryFile, (bytes) => {
      const started = performance.now();
      if (accountFor(bytes)) read += 1;
      longest_ms = Math.max(longest_ms, performance.now() - started);
    }),
    { seed, numRuns: files },
  );
  return { read, longest_ms };
}
