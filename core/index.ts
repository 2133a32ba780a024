/** The public face of core/: what the page, the terminal command and the law tests call. */
export type { Replicate } from './inference/bootstrap.ts';
export { type BootstrapSummary, summariseBootstrap } from './inference/summariseBootstrap.ts';
export type { Doubt } from './notice/doubt.ts';
export type { Outcome } from './notice/outcome.ts';
export type { Place } from './notice/place.ts';
export type { Refusal } from './notice/refusal.ts';
export { analyseRun } from './results/analyseRun.ts';
export {
  type BootstrapReplicates,
  type BootstrapShare,
  bootstrapRun,
  type RepeatableResult,
} from './results/bootstrapRun.ts';
export type { Progress } from './results/progress.ts';
export type * from './results/runResult.ts';
export { usualSeed } from './results/usualSeed.ts';
export { applyRowDecisions } from './run/applyRowDecisions.ts';
export { type ReadExport, readExport } from './run/readExport.ts';
export type * from './run/readingChoices.ts';
export { readRuns } from './run/readRuns.ts';
export type { RowDecision, Run } from './run/run.ts';
export { completeSheet } from './sheet/completeSheet.ts';
export type { Declaration } from './sheet/declaration.ts';
export { parseSheet } from './sheet/parseSheet.ts';
export type * from './sheet/sheet.ts';
export type { AnalyteFile, QuantityFile, SheetFile } from './sheet/sheetFile.ts';
export { sheetVersion } from './sheet/sheetFile.ts';
