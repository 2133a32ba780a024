import type { RunResult, ShareResult } from '../../../core/index.ts';

/** A named part of a variance. */
export interface SharePart {
  readonly name: string;
  /** Whole per cent; all parts of a result add up to 100. */
  readonly percent: number;
  /** How it is drawn: the same for the same source everywhere; null for what is told together. */
  readonly look: number | null;
}

/** Parts below this are not worth their words; they are told together. */
const leastShare = 0.05;
const mostNamed = 3;
/** So many looks can be told apart. */
const shareLooks = 6;

/** Sources in the order of their looks, for everything on the page that has parts. */
export function resultSources({ quantities, equivalence }: RunResult): readonly string[] {
  return namedSources([...quantities.filter(({ state }) => state === 'fitted'), ...equivalence]);
}

/** Sources of variance that get a look of their own: those worth naming anywhere, the noise of the readings first. */
export function namedSources(results: readonly { readonly shares: readonly ShareResult[] }[]): readonly string[] {
  const total = new Map<string, number>();
  for (const { shares } of results)
    for (const { source, share } of worthNaming(shares)) total.set(source, (total.get(source) ?? 0) + share);
  const rank = (source: string) => (source === 'reading noise' ? Number.POSITIVE_INFINITY : (total.get(source) ?? 0));
  return [...total.keys()].sort((a, b) => rank(b) - rank(a));
}

/**
 * Where the variance of a result comes from, largest part first.
 *
 * @param sources from `namedSources` of all results that stand together
 * @param labels what a source is called on the page, by its id
 */
export function shareParts(
  shares: readonly ShareResult[],
  sources: readonly string[],
  labels: ReadonlyMap<string, string>,
): readonly SharePart[] {
  const named = worthNaming(shares);
  const parts = named.map(({ source, share }): SharePart => {
    const place = sources.indexOf(source);
    const look = place < 0 ? null : place % shareLooks;
    return { name: labels.get(source) ?? source, percent: Math.round(100 * share), look };
  });
  // What is left is told so that the printed parts add up to 100.
  const left = 100 - parts.reduce((sum, { percent }) => sum + percent, 0);
  return named.length < shares.length && left > 0 ? [...parts, { name: 'others', percent: left, look: null }] : parts;
}

function worthNaming(shares: readonly ShareResult[]): readonly ShareResult[] {
  return shares.filter(({ share }) => share >= leastShare).slice(0, mostNamed);
}
