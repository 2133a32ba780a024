import type { FigureRun } from './figureRun.ts';
import { formatNumber, formatSigned } from './formatNumber.ts';

/** One point in words, for the readout and for screen readers. */
export function describePoint(run: FigureRun, index: number): string {
  const point = run.points[index];
  const kind = run.result.run.readingKind;
  const reading = formatNumber(point.reading, run.decimals.reading);
  const parts = [
    `line ${point.line}`,
    `${formatNumber(point.volume_mL, run.decimals.volume)} mL`,
    kind === 'mV' ? `${reading} mV` : `pH ${reading}`,
  ];
  if (point.residual !== null) {
    parts.push(`residual ${formatSigned(point.residual, run.decimals.residual)}${kind === 'mV' ? ' mV' : ''}`);
  }
  if (!point.used) parts.push('excluded');
  return parts.join(', ');
}
