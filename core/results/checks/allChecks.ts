import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';
import { activityOutOfRange } from './activityOutOfRange.ts';
import { alkalineEndLow } from './alkalineEndLow.ts';
import { beyondReach } from './beyondReach.ts';
import { carbonateLikely } from './carbonateLikely.ts';
import { concentrationOfNothing } from './concentrationOfNothing.ts';
import { constantsOverlap } from './constantsOverlap.ts';
import { declarationContradicted } from './declarationContradicted.ts';
import { declaredNoiseTooSmall } from './declaredNoiseTooSmall.ts';
import { electrodeLikelyOff } from './electrodeLikelyOff.ts';
import { fewPoints } from './fewPoints.ts';
import { fewPointsAtConstant } from './fewPointsAtConstant.ts';
import { intervalsDisagree } from './intervalsDisagree.ts';
import { noiseFarAboveUsual } from './noiseFarAboveUsual.ts';
import { noVisibleStep } from './noVisibleStep.ts';
import { pointsDistrusted } from './pointsDistrusted.ts';
import { poorlyDetermined } from './poorlyDetermined.ts';
import { readingKindContradicted } from './readingKindContradicted.ts';
import { residualsNotNormal } from './residualsNotNormal.ts';
import { residualsWander } from './residualsWander.ts';
import { restsOnAssumption } from './restsOnAssumption.ts';
import { sensorStuck } from './sensorStuck.ts';
import { solidLikely } from './solidLikely.ts';
import { startsDisagree } from './startsDisagree.ts';
import { stillDrifting } from './stillDrifting.ts';
import { temperatureOutOfRange } from './temperatureOutOfRange.ts';
import { unidentifiable } from './unidentifiable.ts';
import { volumesDisagree } from './volumesDisagree.ts';

/** Every check of a fitted run, in the order in which its doubts are shown: the gravest first. */
export const allChecks: readonly ((analysis: Analysis) => Doubt[])[] = [
  readingKindContradicted,
  unidentifiable,
  startsDisagree,
  residualsWander,
  carbonateLikely,
  electrodeLikelyOff,
  alkalineEndLow,
  solidLikely,
  sensorStuck,
  volumesDisagree,
  pointsDistrusted,
  residualsNotNormal,
  noiseFarAboveUsual,
  declaredNoiseTooSmall,
  poorlyDetermined,
  constantsOverlap,
  beyondReach,
  concentrationOfNothing,
  noVisibleStep,
  fewPointsAtConstant,
  fewPoints,
  intervalsDisagree,
  activityOutOfRange,
  temperatureOutOfRange,
  stillDrifting,
  declarationContradicted,
  restsOnAssumption,
];
