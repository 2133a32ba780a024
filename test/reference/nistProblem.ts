import type { LeastSquaresProblem } from '../../core/fit/leastSquaresProblem.ts';
import { Dual } from './dual.ts';
import type { NistModel } from './nistModels.ts';

/** One entry of nist-strd.json, as far as the tests read it. */
export interface NistEntry {
  readonly name: string;
  readonly start1: readonly number[];
  readonly start2: readonly number[];
  readonly certified_params: readonly number[];
  readonly certified_sd: readonly number[];
  readonly certified_rss: number;
  readonly n_obs: number;
  readonly n_params: number;
  readonly y: readonly number[];
  readonly x?: readonly number[];
  readonly x1?: readonly number[];
  readonly x2?: readonly number[];
}

/** The entry as a least-squares problem with exact derivatives. */
export function nistProblem(entry: NistEntry, model: NistModel): LeastSquaresProblem {
  const observed = entry.name === 'Nelson' ? entry.y.map(Math.log) : entry.y;
  const first = entry.x ?? entry.x1 ?? [];
  const second = entry.x2 ?? first;
  const modelled = (parameters: Float64Array) => {
    const b = Dual.variables(parameters);
    return first.map((x, i) => model(b, x, second[i]));
  };
  return {
    parameterCount: entry.n_params,
    residualCount: observed.length,
    residuals(parameters, residuals) {
      modelled(parameters).forEach(({ value }, i) => {
        residuals[i] = value - observed[i];
      });
      return true;
    },
    derivatives(parameters, jacobian) {
      modelled(parameters).forEach(({ partials }, i) => {
        partials.forEach((partial, j) => {
          jacobian[j * observed.length + i] = partial;
        });
      });
      return true;
    },
  };
}
