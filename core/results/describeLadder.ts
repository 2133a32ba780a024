import { decisiveDifference, type JudgedRung, variation } from '../inference/ladderChoice.ts';
import type { Ladder } from '../inference/ladderOfRun.ts';
import { numberOrNull } from './numberOrNull.ts';
import type { LadderResult } from './runResult.ts';

/** The chosen rung is poor where its residual exceeds the least of all rungs by this factor. */
const poorFit = 1.5;
/** What is fitted in addition is worth a word where the residual without it is larger by this factor. */
const worthSaying = 1.2;
/** Evidence beyond this ratio is not written as a number: no measurement carries it. */
const largestRatio = 1e6;

/** The ladder as figures and in a few sentences. */
export function describeLadder(ladder: Ladder): LadderResult {
  const { rungs, chosen, sheets } = ladder;
  const { declared } = sheets;
  return {
    rungs: rungs.map(({ rung, cost, aicc, weight, againstIt, test }) => ({
      groups: rung.kind.groups,
      carbonate: rung.kind.carbonate,
      excess: rung.kind.excess,
      cost,
      parameters: rung.fitted,
      aicc,
      weight,
      residual: rung.residual,
      weightedResidual: rung.weightedResidual,
      pKa: rung.constants.map((id) => numberOrNull(rung.end?.values.get(id) ?? Number.NaN)),
      againstIt,
      test,
    })),
    chosen,
    groups: rungs[chosen].rung.kind.groups,
    declared,
    sentence: [
      answer(ladder, declared),
      nextGroup(ladder),
      elseFitted(ladder),
      alternatives(ladder),
      unexplained(ladder),
    ]
      .filter((sentence) => sentence !== '')
      .join(' '),
  };
}

function answer({ rungs, chosen }: Ladder, declared: number | null): string {
  const { groups } = rungs[chosen].rung.kind;
  const shown = groups === 0 ? 'no ionisable group' : counted(groups);
  if (declared === null || declared === groups) {
    const as = declared === null ? '' : ', as declared';
    return groups === 0
      ? `This run shows ${shown}${as}: a strong acid or base explains it.`
      : `This run shows ${shown}${as}.`;
  }
  const wanted = rungs.find(({ rung }) => rung.kind.groups === declared && sameVariation(rung.kind, rungs[chosen]));
  const why = wanted === undefined || declared <= groups + 1 ? '' : reasonsAgainst(wanted);
  return `This run shows ${shown}, where ${declared === 0 ? 'none is' : declared === 1 ? '1 is' : `${declared} are`} declared${why === '' ? '' : `: with ${declared}, ${why}`}.`;
}

/** What one more group would buy, and what speaks against it. */
function nextGroup({ rungs, chosen }: Ladder): string {
  const here = rungs[chosen];
  const richer = rungs.filter(({ rung }) => rung.kind.groups === here.rung.kind.groups + 1);
  const best = [...richer].sort((a, b) => (a.aicc ?? Infinity) - (b.aicc ?? Infinity));
  const next = richer.find(({ rung }) => sameVariation(rung.kind, here)) ?? best[0];
  if (next === undefined) return '';
  if (next.aicc === null) return 'One more could not be fitted.';
  const against = reasonsAgainst(next);
  const verdict = against === '' ? 'which is not enough to claim it' : `but ${against}`;
  return `One more would take the mean weighted residual from ${residualOf(here)} to ${residualOf(next)} (${evidence(next, here)}), ${verdict}.`;
}

/** Where the run asks for more than the sheet fits: what, and how strongly. */
function elseFitted({ rungs, chosen, sheets }: Ladder): string {
  const here = rungs[chosen];
  const varied = variation(here.rung, sheets);
  if (varied === 0) return '';
  const without = rungs.find(({ rung }) => rung.kind.groups === here.rung.kind.groups && variation(rung, sheets) === 0);
  const gain = (without?.rung.weightedResidual ?? Infinity) / (here.rung.weightedResidual ?? 1);
  if (gain < worthSaying) return '';
  const what = nameVariation(varied, sheets.carbonateVessel, here);
  const poorer =
    without === undefined || without.aicc === null
      ? ''
      : `: without it the mean weighted residual is ${residualOf(without)} instead of ${residualOf(here)} (${evidence(here, without)})`;
  return `It asks for ${what}${poorer}. The fit keeps to the conditions as they stand; let this be fitted there if it can be so.`;
}

/** Where no rung that can be defended explains the run to its noise. */
function unexplained({ rungs, chosen }: Ladder): string {
  const here = rungs[chosen].rung.weightedResidual;
  const least = Math.min(...rungs.map(({ rung }) => rung.weightedResidual ?? Number.POSITIVE_INFINITY));
  if (here === null || here <= poorFit * least) return '';
  return 'Something else than groups is amiss: compare volumes, strengths, pKw and the electrode with what is declared.';
}

/** What else explains the run as well with no more fitted quantities. */
function alternatives({ rungs, chosen, sheets }: Ladder): string {
  const here = rungs[chosen];
  const equal = rungs.filter(
    (other, i) =>
      i !== chosen &&
      other.aicc !== null &&
      here.aicc !== null &&
      other.againstIt.length === 0 &&
      other.rung.fitted <= here.rung.fitted &&
      other.aicc - here.aicc <= decisiveDifference,
  );
  if (equal.length === 0) return '';
  const words = equal.map((other) => {
    const { groups } = other.rung.kind;
    const varied = variation(other.rung, sheets);
    const extra = varied === 0 ? '' : nameVariation(varied, sheets.carbonateVessel, other);
    if (groups === 0) return `${extra === '' ? 'a strong acid or base' : extra} alone`;
    return extra === '' ? counted(groups) : `${counted(groups)} with ${extra}`;
  });
  return `${capital(words.join(', or '))} would explain it equally well (${evidence(here, equal[0])}).`;
}

function counted(groups: number): string {
  return groups === 1 ? '1 ionisable group' : `${groups} ionisable groups`;
}

function sameVariation(kind: { readonly carbonate: boolean; readonly excess: boolean }, { rung }: JudgedRung): boolean {
  // With no group the strong ion is always fitted, so that the plain rung above it is the one without.
  const excess = rung.kind.groups === 0 ? kind.excess === false : kind.excess === rung.kind.excess;
  return kind.carbonate === rung.kind.carbonate && excess;
}

function reasonsAgainst({ againstIt }: JudgedRung): string {
  return againstIt.slice(0, 2).join(' and ');
}

function residualOf({ rung }: JudgedRung): string {
  return rung.weightedResidual?.toPrecision(3) ?? 'none';
}

/** How much better the first explains the run than the second, allowing for what it fits in addition. */
function evidence(first: JudgedRung, second: JudgedRung): string {
  const ratio = Math.exp(0.5 * ((second.aicc ?? 0) - (first.aicc ?? 0)));
  const large = Math.max(ratio, 1 / ratio);
  const words = large > largestRatio ? 'more than a million to 1' : `${large.toPrecision(2)} to 1`;
  const plain = large < 100 ? words : large > largestRatio ? words : `${Number(large.toPrecision(1))} to 1`;
  return `evidence ${plain} ${ratio >= 1 ? 'for it' : 'against it'}`;
}

function nameVariation(varied: number, vessel: 'sample' | 'titrant', { rung }: JudgedRung): string {
  const carbonate = `carbonate in the ${vessel} (${amount(rung.end?.values.get(`${vessel}.carbonate`))})`;
  const strongIon = rung.end?.values.get('sample.strongIon') ?? 0;
  const excess = `an excess of strong ${strongIon < 0 ? 'acid' : 'base'} in the sample (${amount(Math.abs(strongIon))})`;
  return varied === 1 ? carbonate : varied === 2 ? excess : `${carbonate} and ${excess}`;
}

function amount(value: number | undefined): string {
  return value === undefined ? 'not fitted' : `${value.toPrecision(2)} mol/L`;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
