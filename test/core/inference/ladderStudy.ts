import { type Ladder, ladderOfRun } from '../../../core/inference/ladderOfRun.ts';
import { completeSheet } from '../../../core/sheet/completeSheet.ts';
import type { Sheet } from '../../../core/sheet/sheet.ts';
import type { SheetFile } from '../../../core/sheet/sheetFile.ts';
import { randomDesign, type SimpleDesign, simpleSheet, simulateDesign } from '../../laws/simulatedDesign.ts';

/** Noise of a good automatic titrator. */
export const studyErrors = { uReading: 0.005, uSetting_mL: 0.003 } as const;

/** How the ladder answered over many runs of known numbers of groups. */
export interface LadderCounts {
  readonly runs: number;
  readonly right: number;
  readonly tooMany: number;
  readonly tooFew: number;
  /** Seeds of the runs answered wrongly. */
  readonly wrong: readonly number[];
  /** Most curves computed for one ladder, and their mean. */
  readonly mostEvaluations: number;
  readonly meanEvaluations: number;
}

/** Runs the whole ladder at once. */
export function climb(sheet: Sheet, volumes: Float64Array, readings: Float64Array): Ladder {
  const work = ladderOfRun(sheet, volumes, readings);
  let step = work.next();
  while (step.done !== true) step = work.next();
  if (step.value === null) throw new Error('too few points for a ladder');
  return step.value;
}

/** A complete sheet for a ladder; groups left open count as one. */
export function ladderSheet(file: SheetFile): Sheet {
  const complete = completeSheet(file, {
    readingKind: file.reading?.kind ?? 'pH',
    titrantKind: 'base',
    groupsIfOpen: 1,
  });
  if (!complete.ok) throw new Error(JSON.stringify(complete.refusals));
  return complete.value;
}

/** The ladder of one random run of 1–3 groups at least 1 apart. */
export function ladderOfDesign(design: SimpleDesign, seed: number, noise: 'declared' | 'undeclared'): Ladder {
  const { volumes_mL, readings } = simulateDesign(design, { ...studyErrors, seed });
  const reading = { kind: 'pH', scale: 'activity', offset: 0, slope: 1 } as const;
  const sheet = simpleSheet(1, noise === 'declared' ? { ...reading, u: studyErrors.uReading } : reading);
  const burette = noise === 'declared' ? { gain: 1, uSetting_mL: studyErrors.uSetting_mL } : { gain: 1 };
  return climb(ladderSheet({ ...sheet, burette }), volumes_mL, readings);
}

/** Whether every group lies at a pH that was read. */
function isInsideReadings(design: SimpleDesign): boolean {
  const { readings } = simulateDesign(design);
  return design.pKa.every((pKa) => pKa > Math.min(...readings) && pKa < Math.max(...readings));
}

/**
 * Counts right and wrong numbers of groups over random runs whose groups lie
 * inside the readings, from the first seed on.
 */
export function countLadders(runs: number, firstSeed: number, noise: 'declared' | 'undeclared'): LadderCounts {
  let right = 0;
  let tooMany = 0;
  let tooFew = 0;
  let sum = 0;
  let most = 0;
  const wrong: number[] = [];
  for (let seed = firstSeed, done = 0; done < runs; seed++) {
    const design = randomDesign(seed);
    if (!isInsideReadings(design)) continue;
    done++;
    const { rungs, chosen, curveEvaluations } = ladderOfDesign(design, seed, noise);
    const { groups } = rungs[chosen].rung.kind;
    if (groups === design.pKa.length) right++;
    else wrong.push(seed);
    if (groups > design.pKa.length) tooMany++;
    if (groups < design.pKa.length) tooFew++;
    sum += curveEvaluations;
    most = Math.max(most, curveEvaluations);
  }
  return { runs, right, tooMany, tooFew, wrong, mostEvaluations: most, meanEvaluations: sum / runs };
}
