import type { NoiseResult } from '../../../../core/index.ts';
import type { ComparedQuantity } from './compareIntervals.ts';
import { withThousands } from './withThousands.ts';

/** A doubt that the simulation gives reason to; shown as the doubts of the results are. */
export interface BootstrapRemark {
  readonly seen: string;
  readonly means: string;
  readonly remedy: string;
}

/** A larger part of repetitions without a fit could be the very ones that would widen the intervals. */
const fewFailures = 0.02;

/** What is to be said where the simulation does not bear out the intervals of the fit. */
export function bootstrapRemarks(
  compared: readonly ComparedQuantity[],
  failed: number,
  count: number,
  noise: NoiseResult | null,
): readonly BootstrapRemark[] {
  const remarks: BootstrapRemark[] = [];
  const different = compared.filter(({ agrees }) => !agrees);
  if (different.length > 0) {
    const isNarrower = different.every(({ moved: [low, high] }) => low >= 0 && high <= 0);
    const isEstimated = noise !== null && !noise.declared;
    remarks.push({
      seen: `By simulation, ${different.map(differenceWords).join('; ')}.`,
      means:
        isNarrower && isEstimated
          ? `The profile counts that the noise had to be estimated, with ${Math.round(noise.degreesOfFreedom)} degrees of freedom; simulation repeats the noise as it was found, and is too sure.`
          : 'The curve is not straight in these quantities over the width of their intervals, or repetitions end in more than one place; the standard uncertainty does not say enough there.',
      remedy: 'State the interval, not the standard uncertainty, and the wider of the two.',
    });
  }
  if (failed > fewFailures * count)
    remarks.push({
      seen: `${withThousands(failed)} of ${withThousands(count)} repetitions could not be fitted.`,
      means: 'Those that are left may look more alike than repetitions of the run would.',
      remedy: 'Do not rely on the simulated intervals; declare more, or measure more points.',
    });
  return remarks;
}

function differenceWords({ quantity, moved: [low, high] }: ComparedQuantity): string {
  const ends = [endWords('lower', low), endWords('upper', high)].filter((words) => words !== null);
  return `${quantity.label} has its ${ends.join(' and its ')} of the width`;
}

/** Ends that moved by less than this part of the width are not worth words beside one that moved by far more. */
const worthWords = 0.1;

function endWords(end: string, moved: number): string | null {
  if (Math.abs(moved) < worthWords) return null;
  return `${end} end ${moved > 0 ? 'higher' : 'lower'} by ${Math.round(100 * Math.abs(moved))} %`;
}
