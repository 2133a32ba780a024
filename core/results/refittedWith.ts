import { objectiveOf } from '../fit/fitFromScratch.ts';
import { fitProblem, type ProblemFit } from '../fit/fitProblem.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import { buildProblem } from '../model/problem.ts';
import type { Declaration } from '../sheet/declaration.ts';
import type { Sheet } from '../sheet/sheet.ts';
import { byVolume } from './byVolume.ts';
import { wandering, wanders } from './checks/wandering.ts';

/**
 * A run fitted again with one more quantity free: where it goes, and how many
 * standard deviations of chance the gain comes to. Null where there is no fit,
 * or what it leaves still wanders.
 */
export function refittedWith(
  fit: ProblemFit,
  index: number,
  id: string,
  start: number,
): { readonly wanted: number; readonly strength: number } | null {
  const { run, values } = fit.weighted.runs[index];
  const freed = buildProblem([
    { sheet: sheetFreeing(run.sheet, id, start), volumes: run.volumes, readings: run.readings },
  ]);
  if (!freed.ok) return null;
  const [{ design }] = freed.value.runs;
  const first = Float64Array.from(freed.value.parameters, (parameter) => {
    const position = run.design.quantities.findIndex((quantity) => quantity.id === parameter.id);
    if (parameter.kind === 'knowledge') return 0;
    return parameter.id === id || position < 0 ? start : values[position];
  });
  const again = fitProblem(freed.value, first);
  const [weighted] = again.weighted.runs;
  if (!endings[again.ending].usable) return null;
  const left = byVolume(run.volumes).map((i) => again.residuals[i]);
  if (wanders(wandering(left))) return null;
  return {
    wanted: weighted.values[design.quantities.findIndex((quantity) => quantity.id === id)],
    strength: Math.sqrt(Math.max(0, objectiveOf(fit) - objectiveOf(again))),
  };
}

function sheetFreeing(sheet: Sheet, id: string, start: number): Sheet {
  const free: Declaration = { state: 'fitted', start, assumed: false };
  switch (id) {
    case 'sample.carbonate':
      return { ...sheet, sample: { ...sheet.sample, carbonate: free } };
    case 'titrant.carbonate':
      return { ...sheet, titrant: { ...sheet.titrant, carbonate: free } };
    case 'reading.offset':
      return { ...sheet, reading: { ...sheet.reading, offset: free } };
    case 'reading.E0':
      return { ...sheet, reading: { ...sheet.reading, standardPotential: free } };
    case 'reading.slope':
      return { ...sheet, reading: { ...sheet.reading, slope: free } };
    case 'reading.junctionHydroxide':
      return { ...sheet, reading: { ...sheet.reading, junctionHydroxide: free } };
    default:
      throw new Error(`no way to free ${id}`);
  }
}
