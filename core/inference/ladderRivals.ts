import type { Declaration } from '../sheet/declaration.ts';
import type { Sheet } from '../sheet/sheet.ts';
import { readingsReach, shiftOf } from './ladderReach.ts';
import type { LadderRung } from './ladderRung.ts';

/** A group is at the edge where it lies this near to an end of the readings, or beyond it, in pH. */
const edge = 0.5;

/** Something of a sheet that nobody has confirmed, and the sheet with it to be fitted. */
export interface LadderRival {
  /** What it is and what is assumed of it, in words. */
  readonly name: string;
  readonly sheet: Sheet;
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
  const isAssumed = (declaration: Declaration) => declaration.state === 'fixed' && declaration.assumed;
  if (isAssumed(reading.slope))
    rivals.push({
      name: 'the slope of the electrode, which is only assumed,',
      sheet: { ...sheet, reading: { ...reading, slope: fitted } },
    });
  if (isAssumed(sample.extraWater))
    rivals.push({
      name: 'water in the vessel, which is only assumed to be none,',
      sheet: { ...sheet, sample: { ...sample, extraWater: fitted } },
    });
  if (isAssumed(medium.pKw))
    rivals.push({ name: 'the pKw, which is only assumed,', sheet: { ...sheet, medium: { ...medium, pKw: fitted } } });
  return rivals;
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
