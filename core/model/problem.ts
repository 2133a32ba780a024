import type { Outcome } from '../notice/outcome.ts';
import type { Sheet } from '../sheet/sheet.ts';
import type { Binding } from './binding.ts';
import type { Quantity } from './quantity.ts';
import { designRun, type RunDesign } from './runDesign.ts';

/** Largest number of parameters of one problem. */
export const largestParameterCount = 150;

/** A number the engine moves. */
export interface Parameter {
  /** Id of the quantity it stands for, or the source whose error it is. */
  readonly id: string;
  /** `fitted`: a quantity itself. `knowledge`: the error δ of a source, mean 0, standard deviation 1. */
  readonly kind: 'fitted' | 'knowledge';
  /** Runs (by position) that have a quantity bound to it. */
  readonly runs: readonly number[];
  /** For knowledge: the δ that was declared; 0, save in simulated problems, where declarations are drawn anew. */
  readonly declared: number;
}

/** A run with what is declared about it; volumes in mL, readings in the unit of the sheet. */
export interface DeclaredRun {
  readonly sheet: Sheet;
  readonly volumes: Float64Array;
  readonly readings: Float64Array;
}

export interface ProblemRun extends DeclaredRun {
  readonly design: RunDesign;
  /** One per quantity of the design. */
  readonly bindings: readonly Binding[];
}

/** One or more runs, their bindings, and one list of parameters. */
export interface Problem {
  readonly runs: readonly ProblemRun[];
  readonly parameters: readonly Parameter[];
}

/**
 * Binds the quantities of all runs to parameters.
 *
 * Known quantities that name the same source share one δ, in all runs. Fitted
 * quantities are each run's own unless their id is named in `shared`.
 */
export function buildProblem(runs: readonly DeclaredRun[], shared: readonly string[] = []): Outcome<Problem> {
  const parameters: (Parameter & { runs: number[] })[] = [];
  const byKey = new Map<string, number>();
  const parameterFor = (key: string, id: string, kind: Parameter['kind'], run: number): number => {
    let index = byKey.get(key);
    if (index === undefined) {
      index = parameters.length;
      parameters.push({ id, kind, runs: [], declared: 0 });
      byKey.set(key, index);
    }
    const users = parameters[index].runs;
    if (users.at(-1) !== run) users.push(run);
    return index;
  };
  const bind = (quantity: Quantity, run: number): Binding => {
    const declaration = quantity.declaration;
    switch (declaration.state) {
      case 'fixed':
        return { kind: 'constant', value: declaration.value };
      case 'fitted': {
        const key = shared.includes(quantity.id) ? `fitted ${quantity.id}` : `fitted ${run} ${quantity.id}`;
        return { kind: 'parameter', parameter: parameterFor(key, quantity.id, 'fitted', run) };
      }
      case 'known': {
        const own = declaration.source === null;
        const key = own ? `known ${run} ${quantity.id}` : `source ${declaration.source}`;
        const parameter = parameterFor(key, own ? quantity.id : (declaration.source ?? ''), 'knowledge', run);
        return { kind: 'known', nominal: declaration.value, terms: [{ parameter, sensitivity: declaration.u }] };
      }
    }
  };
  const bound = runs.map((run, index) => {
    const design = designRun(run.sheet);
    return { ...run, design, bindings: design.quantities.map((quantity) => bind(quantity, index)) };
  });
  if (parameters.length > largestParameterCount)
    return {
      ok: false,
      refusals: [
        {
          code: 'problem-too-large',
          message: `These runs together have ${parameters.length} fitted and known quantities; at most ${largestParameterCount} can be handled in one problem.`,
          remedy: 'Fix some quantities, share more of them between the runs, or fit fewer runs together.',
          place: {},
        },
      ],
    };
  return { ok: true, value: { runs: bound, parameters } };
}
