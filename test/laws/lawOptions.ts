/**
 * Options of a law: the same inputs in every run, and the first counterexample
 * as it was found, because making it smaller takes minutes with the simulator.
 */
export function lawOptions(numRuns: number) {
  return { seed: 20261, numRuns, endOnFailure: true };
}
