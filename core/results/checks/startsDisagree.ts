import { objectiveOf } from '../../fit/fitFromScratch.ts';
import { endings } from '../../fit/leastSquaresEnding.ts';
import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** A second minimum this much above the first, in minus twice the log-likelihood, is a twentieth as likely. */
const similar = 6;
/** Standard uncertainties by which the two must differ in some result. */
const leastDifference = 2;

/** Starts that ended in different places which explain the run about equally well. */
export function startsDisagree({ fit, index, weighted, runnerUp, quantities }: Analysis): Doubt[] {
  if (runnerUp === null || !endings[runnerUp.ending].usable) return [];
  const difference = objectiveOf(runnerUp) - objectiveOf(fit);
  if (!(Math.abs(difference) < similar)) return [];
  const others = runnerUp.weighted.runs[index].values;
  const differing = quantities.flatMap(({ id, label, state, value, u }, q) =>
    state === 'fitted' && value !== null && u !== null && Math.abs(others[q] - weighted.values[q]) > leastDifference * u
      ? [{ id, text: `${label} ${value.toPrecision(4)} or ${others[q].toPrecision(4)}` }]
      : [],
  );
  if (differing.length === 0) return [];
  return [
    {
      code: 'starts-disagree',
      seen: `Two solutions explain this run about equally well: ${differing.map(({ text }) => text).join(', ')}.`,
      means: 'The first of them is reported; its intervals do not reach to the other.',
      remedy: 'Declare what is known of these quantities, or give a start near the solution that is meant.',
      place: { quantity: differing[0].id },
    },
  ];
}
