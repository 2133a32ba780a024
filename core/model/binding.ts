/**
 * How a quantity of a run follows from the parameters of the problem.
 * `known` is declared knowledge: nominal + Σ sensitivity·δ with every δ a
 * parameter of mean 0 and standard deviation 1, which quantities may share.
 */
export type Binding =
  | { readonly kind: 'constant'; readonly value: number }
  | { readonly kind: 'parameter'; readonly parameter: number }
  | {
      readonly kind: 'known';
      readonly nominal: number;
      readonly terms: readonly { readonly parameter: number; readonly sensitivity: number }[];
    };

/** Value of a quantity at given parameters. */
export function boundValue(binding: Binding, parameters: Float64Array): number {
  switch (binding.kind) {
    case 'constant':
      return binding.value;
    case 'parameter':
      return parameters[binding.parameter];
    case 'known': {
      let value = binding.nominal;
      for (const term of binding.terms) value += term.sensitivity * parameters[term.parameter];
      return value;
    }
  }
}

/** d quantity / d parameter, one entry per parameter that has an influence; all bindings are linear. */
export function bindingTerms(
  binding: Binding,
): readonly { readonly parameter: number; readonly sensitivity: number }[] {
  switch (binding.kind) {
    case 'constant':
      return [];
    case 'parameter':
      return [{ parameter: binding.parameter, sensitivity: 1 }];
    case 'known':
      return binding.terms;
  }
}
