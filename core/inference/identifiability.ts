import type { ProblemFit } from '../fit/fitProblem.ts';
import type { Quantity } from '../model/quantity.ts';

/** A parameter takes part in a direction when it makes up at least this part of it. */
const noticeablePart = 0.02;
/** Entries of a reduced basis below this are rounding. */
const rounding = 1e-6;

/** One quantity in a direction of which the data say nothing. */
export interface OpenMember {
  readonly quantity: Quantity;
  readonly value: number;
  /** How it changes along the direction, in its own unit; only ratios mean something. */
  readonly change: number;
}

/** Quantities that can be changed together without changing the curve, the one that moves most first. */
export interface OpenDirection {
  readonly members: readonly OpenMember[];
}

/**
 * Directions in which the data leave the quantities of a run open, from the
 * singular vectors of the scaled, whitened Jacobian. Where there are several,
 * the vectors may be any mixture of them; elimination gives a basis in which
 * each touches as few quantities as can be had.
 */
export function openDirections(fit: ProblemFit, index: number): OpenDirection[] {
  const { columnScales, undetermined } = fit.covariance;
  return sparseBasis(undetermined).map((direction) => ({ members: membersOf(fit, index, direction, columnScales) }));
}

/** Direction in which a parameter moves with the others along the valley of the cost, whatever its length. */
export function valleyOf(fit: ProblemFit, index: number, parameter: number): OpenDirection {
  const { columnScales, covariance, parameterCount } = fit.covariance;
  const direction = Float64Array.from(
    { length: parameterCount },
    (_, j) => covariance[j * parameterCount + parameter] * columnScales[j],
  );
  const length = Math.hypot(...direction);
  return {
    members: membersOf(
      fit,
      index,
      direction.map((d) => (length > 0 ? d / length : 0)),
      columnScales,
    ),
  };
}

/** Quantities of the run behind the parameters of a direction given in scaled parameters. */
function membersOf(
  fit: ProblemFit,
  index: number,
  direction: Float64Array,
  columnScales: Float64Array,
): readonly OpenMember[] {
  const { run, values } = fit.weighted.runs[index];
  return run.design.quantities
    .flatMap((quantity, q) => {
      const binding = run.bindings[q];
      if (binding.kind !== 'parameter') return [];
      const part = direction[binding.parameter];
      return Math.abs(part) < noticeablePart
        ? []
        : [{ quantity, value: values[q], change: part / columnScales[binding.parameter], part: Math.abs(part) }];
    })
    .sort((a, b) => b.part - a.part);
}

/** Gauss–Jordan elimination with full pivoting, rows of length one. */
function sparseBasis(vectors: readonly Float64Array[]): Float64Array[] {
  const rows = vectors.map((vector) => vector.slice());
  const used = new Set<number>();
  for (let round = 0; round < rows.length; round++) {
    let pivot = { row: -1, column: -1, size: 0 };
    rows.forEach((row, r) => {
      if (used.has(r)) return;
      row.forEach((entry, column) => {
        if (Math.abs(entry) > pivot.size) pivot = { row: r, column, size: Math.abs(entry) };
      });
    });
    if (pivot.row < 0) break;
    used.add(pivot.row);
    const chosen = rows[pivot.row];
    rows.forEach((row, r) => {
      if (r === pivot.row) return;
      const factor = row[pivot.column] / chosen[pivot.column];
      for (let j = 0; j < row.length; j++) row[j] -= factor * chosen[j];
    });
  }
  return rows.map((row) => {
    const length = Math.hypot(...row);
    return row.map((entry) => (Math.abs(entry) < rounding * length ? 0 : entry / length));
  });
}
