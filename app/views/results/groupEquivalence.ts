import type { EquivalenceResult } from '../../../core/index.ts';

/** The volumes that different ways give for one step. */
export interface EquivalenceStep {
  readonly analyte: string;
  readonly step: number;
  readonly fit: EquivalenceResult | null;
  readonly derivative: EquivalenceResult | null;
  readonly gran: EquivalenceResult | null;
}

/** Puts the ways to one step side by side, in the order of the volumes. */
export function groupEquivalence(results: readonly EquivalenceResult[]): readonly EquivalenceStep[] {
  const steps = new Map<string, EquivalenceStep>();
  for (const result of results) {
    const { analyte, step, by } = result;
    const key = JSON.stringify([analyte, step]);
    const before = steps.get(key) ?? { analyte, step, fit: null, derivative: null, gran: null };
    steps.set(key, { ...before, [by]: before[by] ?? result });
  }
  const volume = ({ fit, derivative, gran }: EquivalenceStep) =>
    fit?.volume_mL ?? derivative?.volume_mL ?? gran?.volume_mL ?? Number.POSITIVE_INFINITY;
  return [...steps.values()].sort((a, b) => volume(a) - volume(b));
}
