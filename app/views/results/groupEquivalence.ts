import type { EquivalenceResult } from '../../../core/index.ts';

/** The volumes that different ways give for one step; a way may give several, as Gran's lines on either side do. */
export interface EquivalenceStep {
  /** Empty for a step of the readings that the model has no name for. */
  readonly analyte: string;
  readonly step: number;
  readonly fit: readonly EquivalenceResult[];
  readonly derivative: readonly EquivalenceResult[];
  readonly gran: readonly EquivalenceResult[];
}

/** Puts the ways to one step side by side, in the order of the volumes. */
export function groupEquivalence(results: readonly EquivalenceResult[]): readonly EquivalenceStep[] {
  const steps = new Map<string, EquivalenceStep>();
  for (const result of results) {
    const { analyte, step, by } = result;
    const key = JSON.stringify([analyte, step]);
    const before = steps.get(key) ?? { analyte, step, fit: [], derivative: [], gran: [] };
    steps.set(key, { ...before, [by]: [...before[by], result] });
  }
  const volume = ({ fit, derivative, gran }: EquivalenceStep) =>
    [...fit, ...derivative, ...gran].find(({ volume_mL }) => volume_mL !== null)?.volume_mL ?? Number.POSITIVE_INFINITY;
  return [...steps.values()].sort((a, b) => volume(a) - volume(b));
}
