import type { Ladder, Rung } from '../inference/chooseGroups.ts';
import type { LadderResult } from './runResult.ts';

/** The ladder as figures and a sentence. */
export function describeLadder({ rungs, chosen }: Ladder): LadderResult {
  return {
    rungs: rungs.map((rung) => ({
      groups: rung.groups,
      cost: rung.fitted?.fit.cost ?? null,
      parameters: rung.parameters,
      aicc: rung.aicc,
      residual: residualOf(rung),
    })),
    chosen: chosen.groups,
    sentence: describe(rungs, chosen),
  };
}

/** Standard deviation of the residuals in the unit of the reading. */
function residualOf({ fitted }: Rung): number | null {
  if (fitted === null || fitted.fit.cost === null) return null;
  const [{ run, predicted }] = fitted.fit.weighted.runs;
  const sum = predicted.reduce((total, value, i) => total + (value - run.readings[i]) ** 2, 0);
  return Math.sqrt(sum / predicted.length);
}

function describe(rungs: readonly Rung[], chosen: Rung): string {
  const shown =
    chosen.groups === 0
      ? 'This run shows no ionisable group: a strong acid or base explains it.'
      : `This run shows ${chosen.groups === 1 ? '1 ionisable group' : `${chosen.groups} ionisable groups`}.`;
  const next = rungs.find(({ groups }) => groups === chosen.groups + 1);
  const now = residualOf(chosen);
  if (next === undefined || now === null) return shown;
  const then = residualOf(next);
  if (then === null) return `${shown} One more could not be fitted.`;
  const unit = chosen.sheet.reading.kind === 'mV' ? ' mV' : ' in pH';
  return `${shown} One more would change the mean residual from ${now.toPrecision(2)} to ${then.toPrecision(2)}${unit}, which is not enough to claim it.`;
}
