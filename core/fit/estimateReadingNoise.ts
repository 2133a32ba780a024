import { type NoiseDeclaration, noiseAt } from './noise.ts';
import type { Whitening } from './whitening.ts';

/** Halvings of the bracket: six decades to below one part in 10⁹. */
const halvings = 50;

/**
 * Reading noise at which the whitened sum of squares of a run equals the
 * degrees of freedom that its data leave. Leaves the whitening changed.
 *
 * @param misses curve minus reading, in the unit of the reading
 * @param slopes d reading/dV of the curve, unit/mL
 * @param smallest noise that is not undercut, in the unit of the reading: no instrument shows less than its last digit
 */
export function estimateReadingNoise(
  declaration: NoiseDeclaration,
  misses: Float64Array,
  whitening: Whitening,
  slopes: Float64Array,
  degreesOfFreedom: number,
  smallest: number,
): number {
  if (declaration.kind === 'declared') return declaration.reading;
  const whitened = new Float64Array(misses.length);
  const sumOfSquaresAt = (reading: number) => {
    whitening.set(noiseAt(declaration, reading), slopes);
    whitened.set(misses);
    whitening.apply(whitened, 0);
    let sum = 0;
    for (const value of whitened) sum += value ** 2;
    return sum;
  };
  if (declaration.kind === 'scale-estimated')
    return Math.max(smallest, Math.sqrt(sumOfSquaresAt(1) / degreesOfFreedom));

  let low = smallest;
  if (sumOfSquaresAt(low) <= degreesOfFreedom) return smallest;
  let high = 2 * low;
  while (sumOfSquaresAt(high) > degreesOfFreedom) high *= 4;
  for (let i = 0; i < halvings && high / low > 1 + 1e-9; i++) {
    const middle = Math.sqrt(low * high);
    if (sumOfSquaresAt(middle) > degreesOfFreedom) low = middle;
    else high = middle;
  }
  return Math.sqrt(low * high);
}
