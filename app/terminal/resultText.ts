import type { EquivalenceResult, QuantityResult, Refusal, RunResult } from '../../core/index.ts';
import { formatWithUncertainty } from './formatWithUncertainty.ts';

/** Not-accepted rows printed one by one; more are counted. */
const mostRows = 5;

/** The results of a call as text for people. */
export function resultText(results: readonly RunResult[], refusals: readonly Refusal[]): string {
  return [...results.map(describeRun), ...refusals.map(describeRefusal)].join('\n');
}

function describeRun(result: RunResult): string {
  const { run, ending, quantities, equivalence, noise, doubts, ladder, points } = result;
  const lines = [run.name, '='.repeat(run.name.length), ''];
  lines.push(
    `${points.filter((point) => point.used).length} points used of ${points.length + run.notAccepted.length} rows. ${ending.message}`,
  );
  if (ladder !== null) lines.push(ladder.sentence);
  const shown = quantities.filter(({ state }) => state === 'fitted' || state === 'known');
  const assumed = quantities.filter(({ state }) => state === 'assumed');
  if (shown.length > 0) lines.push('', ...shown.map(describeQuantity));
  if (equivalence.length > 0) lines.push('', ...equivalence.map(describeEquivalence));
  if (noise !== null)
    lines.push(
      '',
      `Noise of a reading ${noise.reading.toPrecision(2)} ${noise.unit} (${noise.declared ? 'declared' : 'estimated'}), setting ${noise.setting_mL.toPrecision(2)} mL; reduced chi-square ${noise.reducedChiSquare?.toFixed(2) ?? '–'} with ${noise.degreesOfFreedom.toFixed(1)} degrees of freedom.`,
    );
  if (assumed.length > 0)
    lines.push('', 'Assumed, confirmed by nobody:', ...assumed.map((quantity) => `  ${describeQuantity(quantity)}`));
  for (const { seen, means, remedy } of doubts) lines.push('', `Doubt: ${seen} ${means}`, `  ${remedy}`);
  const notAccepted = run.notAccepted.slice(0, mostRows);
  for (const refusal of notAccepted) lines.push('', describeRefusal(refusal).trimEnd());
  if (run.notAccepted.length > mostRows)
    lines.push(`… and ${run.notAccepted.length - mostRows} more rows not accepted.`);
  return `${lines.join('\n')}\n`;
}

function describeQuantity({ label, unit, state, value, u, interval95, whyNoU, restsOn }: QuantityResult): string {
  const name = label.padEnd(34);
  if (value === null) {
    const reason =
      whyNoU === 'undetermined' ? 'not determined by this run' : whyNoU === 'bound' ? 'a bound' : 'not fitted';
    const bound = interval95 === null ? '' : ` (${interval95[0] ?? '…'} to ${interval95[1] ?? '…'})`;
    return `${name} –  ${reason}${bound}`;
  }
  const figure = formatWithUncertainty(value, u);
  const suffix = unit === '' ? '' : ` ${unit}`;
  const rests = restsOn.length === 0 || state === 'assumed' ? '' : `  rests on ${restsOn.join(', ')}`;
  return `${name} ${figure}${suffix}${rests}`;
}

function describeEquivalence({ analyte, step, volume_mL, u, by, remark }: EquivalenceResult): string {
  const name = `Equivalence ${step}${analyte === '' ? '' : ` of ${analyte}`}, by ${by}`.padEnd(34);
  const figure = volume_mL === null ? '–  not determined by this run' : `${formatWithUncertainty(volume_mL, u)} mL`;
  return `${name} ${figure}${remark === '' ? '' : `  (${remark})`}`;
}

function describeRefusal({ message, remedy, place }: Refusal): string {
  const at = [
    place.file,
    place.line === undefined ? undefined : `line ${place.line}`,
    place.column === undefined ? undefined : `column ${place.column}`,
  ].filter((part) => part !== undefined);
  return `Not accepted${at.length === 0 ? '' : ` (${at.join(', ')})`}: ${message}\n  ${remedy}\n`;
}
