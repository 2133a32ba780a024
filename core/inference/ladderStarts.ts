import { startingValues } from '../fit/startingValues.ts';
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
function carriedOver(from: LadderRung, to: LadderRung, changes: Readonly<Record<string, number>> = {}): Float64Array {
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

/** Starts of a rung by what the readings themselves suggest. */
export function startsFromReadings(rung: LadderRung): Float64Array[] {
  const { run } = rung.run;
  return startingValues(run).map((values) => {
    const byId = new Map(run.design.quantities.map(({ id }, q) => [id, values[q]]));
    return Float64Array.from(rung.problem.parameters, ({ id, kind }) =>
      kind === 'knowledge' ? 0 : (byId.get(id) ?? 0),
    );
  });
}

function middle(rung: LadderRung, reach: ReadingsReach): number {
  return constantAt(rung, 0, 0.5 * (reach.lowest + reach.highest), reach.ionicStrength);
}
