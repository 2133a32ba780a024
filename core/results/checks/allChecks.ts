import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';
import { activityOutOfRange } from './activityOutOfRange.ts';
import { beyondReach } from './beyondReach.ts';
import { concentrationOfNothing } from './concentrationOfNothing.ts';
import { constantsOverlap } from './constantsOverlap.ts';
import { fewPoints } from './fewPoints.ts';
import { noiseFarAboveUsual } from './noiseFarAboveUsual.ts';
import { residualsWander } from './residualsWander.ts';
import { restsOnAssumption } from './restsOnAssumption.ts';
import { temperatureOutOfRange } from './temperatureOutOfRange.ts';
import { unidentifiable } from './unidentifiable.ts';
import { volumesDisagree } from './volumesDisagree.ts';

/** Every check of a fitted run, in the order in which its doubts are shown: the gravest first. */
export const allChecks: readonly ((analysis: Analysis) => Doubt[])[] = [
  unidentifiable,
  residualsWander,
  volumesDisagree,
  noiseFarAboveUsual,
  constantsOverlap,
  beyondReach,
  concentrationOfNothing,
  fewPoints,
  activityOutOfRange,
  temperatureOutOfRange,
  restsOnAssumption,
];
