import { decomposeSingular } from '../numerics/decomposeSingular.ts';
import { triangularise } from '../numerics/triangularise.ts';

/**
 * The problem at one point, made linear: the cost after a step δ is
 * ‖S·w + c‖² + (cost − ‖c‖²), where w = Vᵀ D δ, D are the column scales and
 * J D⁻¹ = U S Vᵀ. In these *principal coordinates* w the problem falls apart
 * into one independent equation per direction.
 */
export interface Linearisation {
  /** D: largest norm of each column of J so far; 0 for a column that was always zero. */
  readonly scales: Float64Array;
  /** S, descending; those beyond `rank` are set to 0. */
  readonly singularValues: Float64Array;
  /** V, column k at [k·p, (k + 1)·p). */
  readonly rightVectors: Float64Array;
  /** c = Uᵀr; entries beyond `rank` are set to 0. */
  readonly projected: Float64Array;
  readonly rank: number;
  /** ‖c‖²: what the cost would fall by if the problem were linear. */
  readonly attainable: number;
  /** Largest |cosine| between the residuals and a single column. */
  readonly columnCosine: number;
}

/**
 * Directions whose singular value is below this part of the largest are left
 * alone: derivatives from an iterated model are good to about 1e-12 of their
 * column, so that such a direction holds nothing but their errors.
 */
const RANK_TOLERANCE = 1e-11;

/** Makes linearisations of one problem, in arrays that are allocated once. */
export function createLineariser(residualCount: number, parameterCount: number) {
  const rowCount = Math.max(residualCount, parameterCount);
  const columns = new Float64Array(rowCount * (parameterCount + 1));
  const norms = new Float64Array(parameterCount);
  const scales = new Float64Array(parameterCount);
  const compressed = {
    triangle: new Float64Array(parameterCount * parameterCount),
    rightHand: new Float64Array(parameterCount),
  };

  /** @returns null where a derivative is not finite. The cost is ‖residuals‖². */
  return function linearise(jacobian: Float64Array, residuals: Float64Array, cost: number): Linearisation | null {
    let columnCosine = 0;
    for (let j = 0; j < parameterCount; j++) {
      let sum = 0;
      let product = 0;
      for (let i = 0, at = j * residualCount; i < residualCount; i++, at++) {
        sum += jacobian[at] * jacobian[at];
        product += jacobian[at] * residuals[i];
      }
      if (!Number.isFinite(sum)) return null;
      norms[j] = Math.sqrt(sum);
      if (sum > 0 && cost > 0) columnCosine = Math.max(columnCosine, Math.abs(product) / (norms[j] * Math.sqrt(cost)));
    }

    let smallestShare = 1;
    columns.fill(0);
    for (let j = 0; j < parameterCount; j++) {
      scales[j] = Math.max(scales[j], norms[j]);
      if (norms[j] === 0) continue;
      smallestShare = Math.min(smallestShare, norms[j] / scales[j]);
      const factor = 1 / scales[j];
      for (let i = 0; i < residualCount; i++) columns[j * rowCount + i] = jacobian[j * residualCount + i] * factor;
    }
    columns.set(residuals, parameterCount * rowCount);
    triangularise(columns, rowCount, parameterCount, compressed);
    const { singularValues, leftVectors, rightVectors } = decomposeSingular(compressed.triangle, parameterCount);

    // A column that is small only beside its own past is not a missing direction.
    const threshold = singularValues[0] * Math.max(RANK_TOLERANCE * smallestShare, parameterCount * Number.EPSILON);
    const projected = new Float64Array(parameterCount);
    let rank = 0;
    let attainable = 0;
    for (let k = 0; k < parameterCount; k++) {
      if (singularValues[k] <= threshold) {
        singularValues[k] = 0;
        continue;
      }
      rank++;
      let sum = 0;
      for (let i = 0; i < parameterCount; i++) sum += leftVectors[k * parameterCount + i] * compressed.rightHand[i];
      projected[k] = sum;
      attainable += sum * sum;
    }
    return { scales: scales.slice(), singularValues, rightVectors, projected, rank, attainable, columnCosine };
  };
}

/** Length of a change of the parameters in units of the column scales. */
export function scaledLength(parameters: Float64Array, scales: Float64Array): number {
  let sum = 0;
  for (let j = 0; j < parameters.length; j++) sum += (scales[j] * parameters[j]) ** 2;
  return Math.sqrt(sum);
}
