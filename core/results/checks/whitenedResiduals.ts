import type { Analysis } from '../analysis.ts';
import { byVolume } from '../byVolume.ts';

/** A residual as the fit weighs it: independent of the others and of variance one, where the noise is right. */
export interface WhitenedResidual {
  readonly volume_mL: number;
  /** Line of the source file. */
  readonly line: number;
  /** Curve minus reading, over its standard deviation. */
  readonly residual: number;
  readonly isTrusted: boolean;
}

/** Whitened residuals of a run in order of volume. */
export function whitenedResiduals({ fit, weighted, run, used, robust }: Analysis): WhitenedResidual[] {
  const wild = new Set(robust?.distrusted.map(({ line }) => line));
  return byVolume(used.volumes).map((i) => {
    const { line, volume_mL } = run.rows[used.rows[i]];
    return { line, volume_mL, residual: fit.residuals[weighted.firstResidual + i], isTrusted: !wild.has(line) };
  });
}
