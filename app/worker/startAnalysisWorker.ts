import type { WorkerLike } from './analysisClient.ts';
import AnalysisWorker from './analysisWorker.ts?worker&inline';

/** Starts the worker from the page's own text, so that it runs from disk too. */
export function startAnalysisWorker(): WorkerLike {
  return new AnalysisWorker() as WorkerLike;
}
