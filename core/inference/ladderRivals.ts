import type { Declaration } from '../sheet/declaration.ts';
import type { Sheet } from '../sheet/sheet.ts';
import { readingsReach, shiftOf } from './ladderReach.ts';
import type { LadderRung } from './ladderRung.ts';

/** A group is at the edge where it lies this near to an end of the readings, or beyond it, in pH. */
const edge = 0.5;

/** A slope of an electrode in use, over the ideal one; beyond it the electrode is broken, which shows otherwise. */
const plausibleSlope = [0.95, 1.05] as const;
/** Water to cover the electrode, at most so many times the sample. */
const mostWater = 5;
/** How far pKw may be from its assumed value: a few kelvin, or a medium other than thought. */
const pKwMargin = 0.3;

/** Something of a sheet that nobody has confirmed, and the sheet with it to be fitted. */
export interface LadderRival {
  /** What it is and what is assumed of it, in words. */
  readonly name: string;
  readonly id: string;
  readonly sheet: Sheet;
  /** Values that can be; a fit beyond them explains nothing. */
  readonly range: readonly [number, number];
}

const fitted: Declaration = { state: 'fitted', start: null, assumed: false };

/**
 * What is only assumed and may look like a group at an end of the readings: the
 * slope of the electrode, water in the vessel, the ion product. Empty where all
 * of it is declared.
 */
export function ladderRivals(sheet: Sheet): LadderRival[] {
  const { reading, sample, medium } = sheet;
  const rivals: LadderRival[] = [];
  if (isAssumed(reading.slope))
    rivals.push({
      name: 'the slope of the electrode, which is only assumed,',
      id: 'reading.slope',
      sheet: { ...sheet, reading: { ...reading, slope: fitted } },
      range: plausibleSlope,
    });
  if (isAssumed(sample.extraWater))
    rivals.push({
      name: 'water in the vessel, which is only assumed to be none,',
      id: 'sample.extraWater',
      sheet: { ...sheet, sample: { ...sample, extraWater: fitted } },
      range: [0, mostWater * (nominal(sample.volume) ?? 0)],
    });
  if (isAssumed(medium.pKw)) {
    const assumed = nominal(medium.pKw) ?? 0;
    rivals.push({
      name: 'the pKw, which is only assumed,',
      id: 'medium.pKw',
      sheet: { ...sheet, medium: { ...medium, pKw: fitted } },
      range: [assumed - pKwMargin, assumed + pKwMargin],
    });
  }
  return rivals;
}

function isAssumed(declaration: Declaration): boolean {
  return declaration.state === 'fixed' && declaration.assumed;
}

function nominal(declaration: Declaration): number | null {
  return declaration.state === 'fitted' ? declaration.start : declaration.value;
}

/** Whether a rung has a fitted group at an end of the readings. */
export function hasGroupAtEdge(rung: LadderRung): boolean {
  const { lowest, highest, ionicStrength } = readingsReach(rung);
  return rung.constants.some((id, k) => {
    if (!rung.problem.parameters.some((parameter) => parameter.id === id)) return false;
    const crossing = (rung.end?.values.get(id) ?? 0) - shiftOf(rung, k, ionicStrength);
    return crossing < lowest + edge || crossing > highest - edge;
  });
}
