import type { QuantityResult, WhyNoU } from '../../../core/index.ts';

const words: Readonly<Record<WhyNoU, string>> = {
  fixed: 'taken as exact',
  undetermined: 'not determined by this run',
  bound: 'only one side of it is determined',
  'not-fitted': 'the run was not fitted',
  'no-degrees-of-freedom': 'no point is left to judge the noise by',
};

/** Why a quantity has no uncertainty, or no value, in a few words; null where it has both. */
export function whyNoNumber({ u, whyNoU }: QuantityResult): string | null {
  if (u !== null) return null;
  return whyNoU === null ? 'no uncertainty could be computed' : words[whyNoU];
}
