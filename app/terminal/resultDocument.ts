import { type Doubt, type Refusal, type RunResult, usualSeed } from '../../core/index.ts';
import { software } from './software.ts';

/** The JSON document of a call: format "stepwell-result", version 1. Keys may be added; none changes its meaning. */
export function resultDocument(results: readonly RunResult[], refusals: readonly Refusal[]) {
  return {
    format: 'stepwell-result',
    version: 1,
    software,
    // Nothing that is printed by this command draws numbers yet; the seed is stated all the same.
    seed: usualSeed,
    runs: results.map(describeRun),
    refusals: [
      ...refusals.map(describeRefusal),
      ...results.flatMap(({ run }) =>
        run.notAccepted.map((refusal) => describeRefusal({ ...refusal, place: { file: run.file, ...refusal.place } })),
      ),
    ],
  };
}

function describeRun(result: RunResult) {
  const { run, ending, quantities, equivalence, noise, doubts, points, ladder, correlation, robust } = result;
  return {
    file: run.file,
    name: run.name,
    points: points.filter((point) => point.used).length,
    ending,
    quantities: quantities.map(
      ({ id, label, unit, state, value, u, interval95, whyNoU, restsOn, shares, constant }) => ({
        id,
        label,
        unit,
        state,
        value,
        u,
        interval95,
        whyNoU,
        restsOn,
        shares,
        constant,
      }),
    ),
    equivalence,
    noise: noise ?? {
      reading: null,
      setting_mL: null,
      dose_mL: null,
      unit: run.readingKind,
      declared: false,
      reducedChiSquare: null,
      degreesOfFreedom: null,
    },
    doubts: doubts.map(describeDoubt),
    ladder,
    correlation,
    robust,
  };
}

function describeDoubt({ code, seen, means, remedy, place }: Doubt) {
  return { code, message: `${seen} ${means}`, remedy, place };
}

function describeRefusal({ code, message, remedy, place }: Refusal) {
  return {
    code,
    file: place.file ?? null,
    line: place.line ?? null,
    column: place.column ?? null,
    key: place.key ?? null,
    message,
    remedy,
  };
}
