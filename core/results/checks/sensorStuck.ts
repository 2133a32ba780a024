import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';
import { byVolume } from '../byVolume.ts';

/** Readings in a row that are the same to the last digit. */
const fewestRepeats = 4;
/** Standard uncertainties by which the curve moves on meanwhile. */
const leastMove = 6;

/** Readings that repeat while the curve moves on. */
export function sensorStuck({ used, run, points }: Analysis): Doubt[] {
  const order = byVolume(used.volumes).map((i) => points[used.rows[i]]);
  const doubts: Doubt[] = [];
  for (let from = 0, to = 0; from < order.length; from = to) {
    to = from + 1;
    while (to < order.length && order[to].reading === order[from].reading) to++;
    const [first, last] = [order[from], order[to - 1]];
    if (to - from < fewestRepeats || first.residual === null || last.residual === null) continue;
    // The readings being equal, the curve moves by what the residuals differ.
    const moved = Math.abs(first.residual - last.residual);
    if (moved < leastMove * Math.max(first.u ?? 0, last.u ?? 0)) continue;
    const unit = run.readingKind === 'mV' ? ' mV' : '';
    doubts.push({
      code: 'sensor-stuck',
      seen: `The reading stands at ${first.reading}${unit} over ${to - from} points from ${first.volume_mL.toFixed(3)} to ${last.volume_mL.toFixed(3)} mL (lines ${first.line} to ${last.line}), where the curve moves by ${moved.toPrecision(2)}${unit}.`,
      means:
        'A sensor that does not answer says nothing of the solution; these points pull the fit towards themselves.',
      remedy: 'Exclude these points; check the electrode, its cable and the range of the meter.',
      place: { line: first.line, volume_mL: 0.5 * (first.volume_mL + last.volume_mL) },
    });
  }
  return doubts;
}
