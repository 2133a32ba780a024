import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** A parameter takes part in a direction when it makes up at least this part of it. */
const noticeablePart = 0.05;

/** Directions that the data do not determine, named by the quantities that take part. */
export function unidentifiable({ fit }: Analysis): Doubt[] {
  const { parameters } = fit.weighted.problem;
  return fit.covariance.undetermined.map((direction): Doubt => {
    const names = parameters
      .map(({ id }, j) => ({ id, part: Math.abs(direction[j]) }))
      .filter(({ part }) => part > noticeablePart)
      .sort((a, b) => b.part - a.part)
      .map(({ id }) => id);
    const several = names.length > 1;
    return {
      code: 'unidentifiable',
      seen: several
        ? `${names.join(', ')} can be changed together without changing the curve.`
        : `${names.join('')} can be changed without changing the curve.`,
      means: several
        ? 'This run fixes only a combination of them, none of them by itself; no value is given for them.'
        : 'This run says nothing of it; no value is given for it.',
      remedy: several ? 'Declare all but one of them.' : 'Declare it.',
      place: { quantity: names[0] ?? '' },
    };
  });
}
