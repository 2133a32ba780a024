import { countLadders } from '../core/inference/ladderStudy.ts';
import { accountingStudy } from './accountingStudy.ts';
import { boundErrors } from './boundErrors.ts';
import { coverageOf } from './coverageStudy.ts';
import { studyDesigns } from './studyDesigns.ts';

/** Runs per design; a first argument of the call asks for another number. */
const usualRuns = 2000;
const firstSeed = 1;
/** Bounds are compared with dense profiles where there are this many, and so many of them. */
const fewestBounds = 10;
const comparedBounds = 40;
/** Ladders climbed with either kind of noise. */
const ladderRuns = 400;
/** Damaged files that are read; the second argument "reading" asks for them alone. */
const damagedFiles = 200_000;

const runs = Number(process.argv[2] ?? usualRuns);
const only = process.argv[3];
console.log(`95 % statements over ${runs} simulated runs per design, seeds from ${firstSeed} on`);
console.log('(true in at least 93.5 %; in at most 96.5 % where at least 99 % of the runs give a two-sided interval)\n');
for (const [number, design] of studyDesigns.entries()) {
  if (only !== undefined && Number(only) !== number + 1) continue;
  const started = performance.now();
  const { failed, quantities } = coverageOf(design, runs, firstSeed);
  console.log(
    `${number + 1} ${design.name}: ${failed} not fitted, ${((performance.now() - started) / runs).toFixed(0)} ms a run`,
  );
  for (const { id, stated, twoSided, holds, uOverLimit, bounds } of quantities) {
    console.log(
      `  ${id.padEnd(18)} true ${((100 * holds) / stated).toFixed(1).padStart(5)} %  two-sided ${((100 * twoSided) / runs).toFixed(1).padStart(5)} %  bounds ${String(bounds.length).padStart(4)}  open ${String(runs - failed - stated).padStart(4)}  u over limit ${uOverLimit?.toFixed(3) ?? '–'}`,
    );
    if (bounds.length < fewestBounds) continue;
    const errors = boundErrors(design, id, bounds.slice(0, comparedBounds));
    console.log(
      `  ${''.padEnd(18)} bounds against a dense profile: median difference ${errors[errors.length >> 1].toFixed(3)} (at most 0.3), largest ${errors[errors.length - 1].toFixed(3)}, of ${errors.length}`,
    );
  }
}

if (only === undefined)
  for (const noise of ['declared', 'undeclared'] as const) {
    const { right, tooMany, tooFew, meanEvaluations, mostEvaluations } = countLadders(ladderRuns, firstSeed, noise);
    const share = (count: number) => ((100 * count) / ladderRuns).toFixed(1);
    console.log(
      `ladder, noise ${noise}: right ${share(right)} % (at least 95), too many ${share(tooMany)} % (at most 2), too few ${share(tooFew)} %, of ${ladderRuns}; curves ${meanEvaluations.toFixed(0)} in the mean, ${mostEvaluations} at most`,
    );
  }

if (only === undefined || only === 'reading') {
  const started = performance.now();
  const { read, longest_ms } = accountingStudy(damagedFiles, firstSeed);
  console.log(
    `reading: every row of ${damagedFiles} damaged files accounted for, ${read} of them with runs; ${((performance.now() - started) / 1000).toFixed(0)} s, one file at most ${longest_ms.toFixed(0)} ms`,
  );
}
