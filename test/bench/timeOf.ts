/** Time of a task over several rounds, in milliseconds per call. */
export interface Timing {
  readonly median: number;
  readonly fastest: number;
  readonly slowest: number;
}

/** Calls a task `calls` times in each of `rounds` rounds after one round to warm up. */
export function timeOf(task: () => void, calls: number, rounds = 9): Timing {
  const times: number[] = [];
  for (let round = -1; round < rounds; round++) {
    const start = performance.now();
    for (let call = 0; call < calls; call++) task();
    if (round >= 0) times.push((performance.now() - start) / calls);
  }
  times.sort((a, b) => a - b);
  return { median: times[rounds >> 1], fastest: times[0], slowest: times[rounds - 1] };
}

export function printTiming({ median, fastest, slowest }: Timing): string {
  return `${median.toPrecision(3)} ms (${fastest.toPrecision(3)}–${slowest.toPrecision(3)})`;
}
