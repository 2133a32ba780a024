/** More workers would each hold a run of their own and leave nothing of the machine to anybody else. */
const mostWorkers = 4;

/** Workers for long work on this machine: 1 to 4. */
export function workerCount(): number {
  return Math.max(1, Math.min(mostWorkers, navigator.hardwareConcurrency || 1));
}
