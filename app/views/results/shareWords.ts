import type { ShareResult } from '../../../core/index.ts';

/** Parts below this are not worth their words; they are told together. */
const leastShare = 0.05;
const mostNamed = 3;

/** Where the variance of a result comes from, largest part first: "61 % reading noise, 30 % pipette 25 mL, 9 % others". */
export function shareWords(
  shares: readonly ShareResult[],
  /** What a source is called on the page, by its id. */
  labels: ReadonlyMap<string, string>,
): string | null {
  if (shares.length === 0) return null;
  const named = shares.filter(({ share }) => share >= leastShare).slice(0, mostNamed);
  const percent = (share: number) => Math.round(100 * share);
  const words = named.map(({ source, share }) => `${percent(share)}\u00a0% ${labels.get(source) ?? source}`);
  // What is left is told so that the printed parts add up to 100.
  const left = 100 - named.reduce((sum, { share }) => sum + percent(share), 0);
  if (named.length < shares.length && left > 0) words.push(`${left}\u00a0% others`);
  return words.join(', ');
}
