import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { fitProblem } from '../../core/fit/fitProblem.ts';
import { benchProblem, benchSheet } from './benchRun.ts';
import { firstStart } from './fitBench.ts';
import { printTiming, type Timing, timeOf } from './timeOf.ts';

const python = '/usr/bin/python3';
const script = fileURLToPath(new URL('peer.py', import.meta.url));

/** How much longer SciPy is to take for the whole job, at least. */
const sizes = [
  { points: 100, leastRatio: 20, repetitions: 25, calls: 100 },
  { points: 10_000, leastRatio: 5, repetitions: 7, calls: 2 },
] as const;

interface PeerAnswer extends Timing {
  readonly job: 'once' | 'whole';
  readonly method: string;
  readonly curves: number;
  readonly derivatives: number;
  readonly newtonRounds: number;
  readonly searches: number;
  readonly success: boolean;
  readonly parameters: Readonly<Record<string, number>>;
}

/**
 * The same model, data and start in SciPy, which is given exact derivatives
 * and does the whole job, weights included, or only the last minimisation.
 */
export function peerBench(): string[] {
  const title = 'SciPy least_squares: same model, data and start, exact derivatives';
  if (spawnSync(python, ['-c', 'import scipy.optimize']).status !== 0) return [title, '  skipped: no SciPy'];
  const folder = mkdtempSync(join(tmpdir(), 'stepwell-bench-'));
  try {
    return [title, ...sizes.flatMap((size) => compare(size, join(folder, 'problem.json')))];
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function compare({ points, leastRatio, repetitions, calls }: (typeof sizes)[number], file: string): string[] {
  const problem = benchProblem(points);
  const start = firstStart(problem);
  const fit = fitProblem(problem, start);
  const [{ run, whitening }] = fit.weighted.runs;
  const ids = problem.parameters.map(({ id }) => id);
  const stated = {
    sheet: benchSheet,
    debyeHueckelA: run.design.coefficientA,
    volumes_mL: Array.from(run.volumes),
    readings: Array.from(run.readings),
    ids,
    start: Array.from(start),
    sigma: Array.from(whitening.sigma),
    repetitions,
  };
  writeFileSync(file, JSON.stringify(stated));
  // One after the other and on one core each, so that neither takes time from the other.
  const env = { ...process.env, OMP_NUM_THREADS: '1', OPENBLAS_NUM_THREADS: '1' };
  const answers: readonly PeerAnswer[] = JSON.parse(execFileSync(python, [script, file], { encoding: 'utf8', env }));
  const own = timeOf(() => fitProblem(problem, start), calls);
  const { curveEvaluations, derivativeEvaluations } = fit.weighted;
  const lines = answers.map((answer) => {
    const shifts = ids.map(
      (id, j) =>
        Math.abs(answer.parameters[id] - fit.parameters[j]) / Math.sqrt(fit.covariance.covariance[j * ids.length + j]),
    );
    const rounds = (answer.newtonRounds / answer.curves).toFixed(1);
    const demanded = answer.job === 'whole' ? ` (at least ${leastRatio})` : '';
    return [
      `    ${answer.method}, ${answer.job === 'whole' ? 'whole job' : 'last weights given'}`.padEnd(46) +
        printTiming(answer),
      `      ${answer.curves} curves of ${rounds} Newton rounds, ${answer.derivatives} derivatives, ${answer.searches} searches; ends ${answer.success ? '' : 'unsuccessfully '}${Math.max(...shifts).toPrecision(2)} u away`,
      '      its fastest time over ours'.padEnd(46) + (answer.fastest / own.fastest).toFixed(1) + demanded,
    ];
  });
  return [
    `  ${points} points, our whole fit`.padEnd(46) + printTiming(own),
    `      ${curveEvaluations} curves, ${derivativeEvaluations} derivatives`,
    ...lines.flat(),
  ];
}
