import { derivativeEndpoints } from '../endpoints/derivativeEndpoints.ts';
import { startingValues } from '../fit/startingValues.ts';
import { buildProblem } from '../model/problem.ts';
import type { Nesting } from './ladderNesting.ts';
import { type ReadingsReach, shiftOf } from './ladderReach.ts';
import type { LadderRung } from './ladderRung.ts';

/** Distances from the readings at which an added group is tried, in pH. */
const outside = [0.5, 1.5];
/** A constant this far outside, in pH, changes no reading by a digit that counts. */
const outOfReach = 12;

/** pKa of the group in that place of a rung that is half lost at a p[H⁺]. */
function constantAt(rung: LadderRung, place: number, pH: number, ionicStrength: number): number {
  return pH + shiftOf(rung, place, ionicStrength);
}

/** Parameters of a rung with values from another one, groups by their names; what the other does not have is changed. */
export function carriedOver(
  from: LadderRung,
  to: LadderRung,
  changes: Readonly<Record<string, number>> = {},
): Float64Array {
  const { end } = from;
  if (end === null) throw new Error('a rung without an end has nothing to carry over');
  const knowledge = new Map(
    from.problem.parameters.flatMap(({ id, kind }, j) => (kind === 'knowledge' ? [[id, end.parameters[j]]] : [])),
  );
  return Float64Array.from(to.problem.parameters, ({ id, kind }) => {
    if (kind === 'knowledge') return knowledge.get(id) ?? 0;
    if (id in changes) return changes[id];
    const place = to.constants.indexOf(id);
    const source = place < 0 ? id : from.constants[from.kind.keys.indexOf(to.kind.keys[place])];
    return end.values.get(source) ?? 0;
  });
}

/** Parameters at which the larger rung makes the curve of the smaller. */
export function limitOf(nesting: Nesting, smaller: LadderRung, larger: LadderRung, reach: ReadingsReach): Float64Array {
  const far = (end: 'upper' | 'lower', place: number) =>
    end === 'upper'
      ? constantAt(larger, place, reach.highest + outOfReach, reach.ionicStrength)
      : constantAt(larger, place, reach.lowest - outOfReach, reach.ionicStrength);
  switch (nesting.kind) {
    case 'same-groups':
      return carriedOver(smaller, larger);
    case 'group-out-of-reach':
      return carriedOver(smaller, larger, { [larger.constants[nesting.place]]: far(nesting.end, nesting.place) });
    case 'nothing-there':
      return carriedOver(smaller, larger, { [larger.concentration]: 0, [larger.constants[0]]: middle(larger, reach) });
    case 'strong':
      return carriedOver(smaller, larger, {
        [larger.concentration]: Math.abs(smaller.end?.values.get('sample.strongIon') ?? 0),
        [larger.constants[0]]: far(nesting.end, 0),
      });
  }
}

/** Starts of a rung from the end of one with a group less: the new group just outside the readings. */
export function startsBesideReadings(smaller: LadderRung, larger: LadderRung, reach: ReadingsReach): Float64Array[] {
  const place = larger.kind.keys.findIndex((key) => !smaller.kind.keys.includes(key));
  const upper = place === larger.kind.keys.length - 1;
  return outside.map((distance) =>
    carriedOver(smaller, larger, {
      [larger.constants[place]]: constantAt(
        larger,
        place,
        upper ? reach.highest + distance : reach.lowest - distance,
        reach.ionicStrength,
      ),
    }),
  );
}

/**
 * A start with an excess from the end of a rung with a group more and none: its
 * outermost group was the strong acid (or, for a titrant that is an acid, base).
 */
export function startFromOutermostGroup(richer: LadderRung, rung: LadderRung, acid: boolean): Float64Array {
  const amount = richer.end?.values.get(richer.concentration) ?? 0;
  const shifted: Record<string, number> = { 'sample.strongIon': acid ? amount : -amount };
  rung.constants.forEach((id, k) => {
    const value = richer.end?.values.get(richer.constants[acid ? k : k + 1]);
    if (value !== undefined) shifted[id] = value;
  });
  return carriedOver(richer, rung, shifted);
}

/** Shares of the base that a vessel holds which carbonate may make up where it is first fitted. */
const carbonateShares = { titrant: [0.02, 0.2], sample: [0.2, 1] } as const;

/** The same as far as it was declared: a rung that lacks something has bent what is known to make up for it. */
function asDeclared(rung: LadderRung, start: Float64Array): Float64Array {
  return start.map((value, j) => (rung.problem.parameters[j].kind === 'knowledge' ? 0 : value));
}

/**
 * Starts with carbonate from the end of a rung without. In the titrant it comes
 * on top of its strength; in the sample it takes the place of strong base.
 */
export function startsWithCarbonate(
  without: LadderRung,
  rung: LadderRung,
  vessel: 'sample' | 'titrant',
): Float64Array[] {
  const value = (id: string) => without.end?.values.get(id) ?? 0;
  const start = (changes: Readonly<Record<string, number>>) => asDeclared(rung, carriedOver(without, rung, changes));
  if (vessel === 'titrant')
    return carbonateShares.titrant.map((share) =>
      start({ 'titrant.carbonate': share * value('titrant.concentration') }),
    );
  const strongIon = value('sample.strongIon');
  if (without.constants.length === 0) {
    // Nothing but carbonate: each step of the curve may be that of its second proton.
    const { volumes, readings } = rung.run.run;
    const perVolume = (0.5 * value('titrant.concentration')) / value('sample.volume');
    return derivativeEndpoints(volumes, readings).map(({ volume_mL }) =>
      start({ 'sample.carbonate': perVolume * volume_mL, 'sample.strongIon': 0 }),
    );
  }
  const base = Math.max(strongIon, value(without.concentration) * without.constants.length);
  return carbonateShares.sample.map((share) =>
    start({
      'sample.carbonate': 0.5 * share * base,
      'sample.strongIon': strongIon - Math.min(1, share) * Math.max(0, strongIon),
    }),
  );
}

/** Shares of the protons of all groups that an excess may amount to where it is first fitted; acid is negative. */
const excessShares = [-0.15, -0.35, -0.6, 0.25];
/** Of the starts that the readings suggest at a given excess, the first ones are the likeliest. */
const likeliest = 4;

/** Starts with an excess of several sizes, and the groups as the readings suggest them beside it. */
export function startsWithExcess(rung: LadderRung, plain: LadderRung | undefined): Float64Array[] {
  const { sheet, volumes, readings } = rung.run.run;
  const total = (plain?.end?.values.get(rung.concentration) ?? 0) * rung.constants.length;
  if (!(total > 0)) return [];
  return excessShares.flatMap((share) => {
    const strongIon = { state: 'fitted', start: share * total, assumed: false } as const;
    const started = buildProblem([{ sheet: { ...sheet, sample: { ...sheet.sample, strongIon } }, volumes, readings }]);
    if (!started.ok) throw new Error('a start does not make a problem larger');
    return asParameters(rung, startingValues(started.value.runs[0]).slice(0, likeliest));
  });
}

/** Starts of a rung by what the readings themselves suggest. */
export function startsFromReadings(rung: LadderRung): Float64Array[] {
  return asParameters(rung, startingValues(rung.run.run));
}

/** Parameters that give the quantities of the run these values. */
function asParameters(rung: LadderRung, sets: readonly Float64Array[]): Float64Array[] {
  const { quantities } = rung.run.run.design;
  return sets.map((values) => {
    const byId = new Map(quantities.map(({ id }, q) => [id, values[q]]));
    return Float64Array.from(rung.problem.parameters, ({ id, kind }) =>
      kind === 'knowledge' ? 0 : (byId.get(id) ?? 0),
    );
  });
}

function middle(rung: LadderRung, reach: ReadingsReach): number {
  return constantAt(rung, 0, 0.5 * (reach.lowest + reach.highest), reach.ionicStrength);
}
