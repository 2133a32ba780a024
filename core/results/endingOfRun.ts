import type { ShapeOfRun } from '../endpoints/shapeOfRun.ts';
import type { FitFromScratch } from '../fit/fitFromScratch.ts';
import { type EndingCode, endings } from '../fit/leastSquaresEnding.ts';
import { buildProblem } from '../model/problem.ts';
import type { Run } from '../run/run.ts';
import type { Sheet } from '../sheet/sheet.ts';
import { nernstSlope_mV } from '../units/nernstSlope.ts';
import { directionOfTitrant } from './directionOfTitrant.ts';
import type { RunEnding, RunEndingCode } from './runResult.ts';
import type { UsedPoints } from './usedPoints.ts';

/** Fewer points show no step, whatever is fitted. */
const fewestPoints = 5;
/** Readings that change by less than this in the whole run, in pH, show neither a step nor a buffer region. */
const flatRange = 0.1;
/** Points beyond the fitted quantities, so that there is something left to judge the noise by. */
const sparePoints = 2;

/** Why a run is not even tried; null where nothing stands against it. */
export function obstacleToFit(run: Run, used: UsedPoints, shape: ShapeOfRun, sheet: Sheet): RunEnding | null {
  const count = used.volumes.length;
  if (count === 0)
    return {
      code: 'all-rows-excluded',
      message: 'Every row is excluded or not accepted. Take rows back, or mend the file at the lines named.',
    };
  if (shape.volumesRunBackwards) {
    const line = run.rows[used.rows[Math.min(1, count - 1)]].line;
    return {
      code: 'volumes-run-backwards',
      message: `The volumes fall from row to row (from line ${line} on), so that they are no volumes added. Export the volume dispensed, or turn burette readings that count down into it.`,
    };
  }
  const problem = buildProblem([{ sheet, volumes: used.volumes, readings: used.readings }]);
  if (!problem.ok) return null;
  const fitted = problem.value.parameters.filter(({ kind }) => kind === 'fitted').length;
  const distinct = new Set(used.volumes).size;
  const needed = Math.max(fewestPoints, fitted + sparePoints);
  if (fitted > 0 && distinct < needed) return tooFewPoints(distinct, needed);
  const [lowest, highest] = shape.readingRange ?? [0, 0];
  const unitsPerPH = sheet.reading.kind === 'mV' ? nernstSlope_mV(sheet.medium.temperature.value) : 1;
  if (fitted > 0 && highest - lowest < flatRange * unitsPerPH)
    return {
      code: 'flat-readings',
      message: `The readings stay between ${lowest} and ${highest} while the volume runs on, so that nothing follows from them. Look whether the sensor was connected and in the solution, and whether the right column was taken for the reading.`,
    };
  return null;
}

function tooFewPoints(count: number, needed: number): RunEnding {
  return {
    code: 'too-few-points',
    message: `${count === 1 ? '1 point' : `${count} points`} at different volumes cannot be fitted; at least ${needed} are needed for what is to be found. Titrate with smaller increments or declare more of the quantities.`,
  };
}

const codes: Record<EndingCode, RunEndingCode> = {
  'gradient-converged': 'fitted',
  'step-converged': 'fitted',
  'cost-converged': 'fitted',
  'no-parameters': 'predicted',
  'iteration-limit': 'not-converged',
  stuck: 'not-converged',
  'start-not-computable': 'no-solution',
  stopped: 'stopped',
};

/** What helps where a fit has no usable end. */
const remedies: Partial<Record<RunEndingCode, string>> = {
  'not-converged':
    'Compare what is declared with the run: the titrant, the form weighed, the number of groups, concentrations and the electrode; or give a start for what is fitted.',
  'no-solution': 'Compare what is declared with the run: unit of the readings, electrode, volumes and concentrations.',
  stopped: 'Start it again to have results.',
};

/** What the end of a fit means for its run. */
export function endingOfFit({ fit }: FitFromScratch, run: Run, shape: ShapeOfRun, sheet: Sheet): RunEnding {
  const fitted = fit.weighted.problem.parameters.some(({ kind }) => kind === 'fitted');
  const code = codes[fit.ending];
  const { message } = endings[fit.ending];
  const remedy = remedies[code];
  if (remedy === undefined) return { code: code === 'fitted' && !fitted ? 'predicted' : code, message };
  return { code, message: [message, ...contradictions(run, shape, sheet), remedy].join(' ') };
}

/** What the sheet says and the readings deny. */
function contradictions(run: Run, shape: ShapeOfRun, sheet: Sheet): string[] {
  const { reading, titrant } = sheet;
  if (reading.kind !== run.readingKind)
    return [`Readings in ${reading.kind} are declared, but those of the file look like ${run.readingKind}.`];
  const seen = directionOfTitrant(shape, run.readingKind);
  const { value: declared } = titrant.kind;
  if (shape.direction === 'flat') return ['The readings hardly change.'];
  if (declared === 'solution' || declared === seen) return [];
  return [
    `The pH ${seen === 'base' ? 'rises' : 'falls'}, as with ${seen === 'base' ? 'a base' : 'an acid'}, but the titrant is declared as ${declared === 'base' ? 'a base' : 'an acid'}.`,
  ];
}
