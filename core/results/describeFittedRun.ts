import type { ShapeOfRun } from '../endpoints/shapeOfRun.ts';
import type { FitFromScratch } from '../fit/fitFromScratch.ts';
import type { Ladder } from '../inference/ladderOfRun.ts';
import { settledFit } from '../inference/settledFit.ts';
import type { Run } from '../run/run.ts';
import type { Sheet } from '../sheet/sheet.ts';
import { Speciation } from '../speciation/speciation.ts';
import type { Analysis } from './analysis.ts';
import { allChecks } from './checks/allChecks.ts';
import { describeCorrelation } from './describeCorrelation.ts';
import { equivalenceByFit, equivalenceByReadings } from './describeEquivalence.ts';
import { describeLadder } from './describeLadder.ts';
import { describePoints } from './describePoints.ts';
import { describeQuantities } from './describeQuantities.ts';
import { describeRobust } from './describeRobust.ts';
import { describeSpeciation } from './describeSpeciation.ts';
import { directionOfTitrant } from './directionOfTitrant.ts';
import { drawCurve } from './drawCurve.ts';
import { misfitCauses } from './misfitCauses.ts';
import { readingAsPH } from './readingAsPH.ts';
import type { CurveResult, RunEnding, RunResult } from './runResult.ts';
import { stepsOfReadings } from './stepsOfReadings.ts';
import type { UsedPoints } from './usedPoints.ts';

/** Everything that follows from a fit. */
export function describeFittedRun(
  run: Run,
  sheet: Sheet,
  used: UsedPoints,
  shape: ShapeOfRun,
  fitted: FitFromScratch,
  ladder: Ladder | null,
  ending: RunEnding,
): RunResult {
  const index = 0;
  const { fit, intervals } = settledFit(fitted.fit, index);
  const weighted = fit.weighted.runs[index];
  const { design } = weighted.run;
  const noise = fit.noise[index];
  const asPH = readingAsPH(design, weighted.values, middle(weighted.model.ionicStrength));
  const titrant = directionOfTitrant(shape, design.readingKind);
  const readSteps = stepsOfReadings(design, used, asPH, titrant, noise.reading);
  const curveSteps = stepsOfReadings(design, { ...used, readings: weighted.predicted }, asPH, titrant, noise.reading);
  const byFit = equivalenceByFit(fit, weighted);
  const equivalence = [...byFit, ...equivalenceByReadings(readSteps, byFit, used.volumes)];
  const stepVolumes = byFit.flatMap(({ volume_mL }) => (volume_mL === null ? [] : [volume_mL]));
  const curve = drawCurve(weighted, stepVolumes, asPH.pH);
  const speciation = new Speciation(design, weighted.values, alongCurve(curve));
  const freedomOfNoise = noise.declared ? Number.POSITIVE_INFINITY : noise.degreesOfFreedom;
  const quantities = describeQuantities(fit, weighted, sheet, intervals, freedomOfNoise, speciation);
  const points = describePoints(run, used, asPH, weighted);
  const robust = describeRobust(fit, weighted, run, used, quantities);
  const wild = new Set(robust?.distrusted.map(({ line }) => line));
  const leftOut = used.rows.flatMap((row, i) => (wild.has(run.rows[row].line) ? [i] : []));
  const analysis: Analysis = {
    run,
    sheet,
    fit,
    index,
    weighted,
    runnerUp: fitted.runnerUp,
    intervals,
    used,
    robust,
    causes: misfitCauses(fit, index, sheet, leftOut),
    speciation,
    readSteps,
    curveSteps,
    quantities,
    equivalence,
    points,
  };
  const pH = points.filter((point) => point.used).map((point) => point.pH);
  return {
    run,
    sheet,
    ending,
    quantities,
    equivalence,
    noise: {
      reading: noise.reading,
      setting_mL: noise.setting_mL,
      dose_mL: noise.dose_mL,
      unit: design.readingKind,
      declared: noise.declared,
      reducedChiSquare: noise.reducedChiSquare,
      degreesOfFreedom: noise.degreesOfFreedom,
    },
    doubts: [...run.doubts, ...allChecks.flatMap((check) => check(analysis))],
    ladder: ladder === null ? null : describeLadder(ladder),
    correlation: describeCorrelation(fit, weighted),
    curve,
    points,
    speciation: describeSpeciation(design, speciation, [Math.min(...pH), Math.max(...pH)]),
    robust,
  };
}

/** Ionic strength against pH along the drawn curve, in order of rising pH; where pH turns back, the first visit counts. */
function alongCurve(curve: CurveResult | null): { pH: Float64Array; ionicStrength_M: Float64Array } {
  if (curve === null) return { pH: new Float64Array(0), ionicStrength_M: new Float64Array(0) };
  const order = Array.from(curve.pH.keys()).sort((a, b) => curve.pH[a] - curve.pH[b]);
  return {
    pH: Float64Array.from(order, (i) => curve.pH[i]),
    ionicStrength_M: Float64Array.from(order, (i) => curve.ionicStrength_M[i]),
  };
}

function middle(values: Float64Array): number {
  return values.slice().sort()[values.length >> 1];
}
