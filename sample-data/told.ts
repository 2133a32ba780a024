import { seededNoise } from '../test/simulator/seededNoise.ts';

/** A quantity of a run: what its sheet says about it, and what it was in truth. */
export interface Told {
  readonly declared: number | 'fitted' | Readonly<Record<string, number | string | boolean>>;
  readonly truth: number;
}

/** Everything that an error may come from; its place in the list is its seed. */
const sources = [
  'standardisation 12',
  'carbonate in bottle 12',
  'burette 7',
  'calibration of the morning',
  'calibration of the afternoon',
  'pipette 25 mL',
  'pipette 20 mL',
  'handbook',
  'weighing K3',
  'standardisation of acid 5',
  'electrode slope',
  'standardisation 9',
] as const;

type Source = (typeof sources)[number];

/** The error of a source in units of its standard uncertainty: the same wherever the source is named. */
function errorOf(source: Source): number {
  return seededNoise(4100 + sources.indexOf(source)).normal();
}

/** Digits that truth.json keeps; the simulation uses the same rounded value. */
function rounded(value: number): number {
  return Number(value.toPrecision(7));
}

export function fixed(value: number): Told {
  return { declared: value, truth: value };
}

export function fitted(truth: number, start?: number): Told {
  return { declared: start === undefined ? 'fitted' : { fitted: true, start }, truth };
}

/** Declared with a standard uncertainty; the truth is drawn accordingly. */
export function known(value: number, u: number, source: Source): Told {
  return { declared: { value, u, source }, truth: rounded(value + u * errorOf(source)) };
}

/** Declared with an expanded uncertainty U = k u. */
export function knownExpanded(value: number, U: number, k: number, source: Source): Told {
  return { declared: { value, U, k, source }, truth: rounded(value + (U / k) * errorOf(source)) };
}

/** Declared with a triangular tolerance, of which the standard deviation is a/√6. */
export function knownWithin(value: number, tolerance: number, source: Source): Told {
  return {
    declared: { value, tolerance, distribution: 'triangular', source },
    truth: rounded(value + (tolerance / Math.sqrt(6)) * errorOf(source)),
  };
}

/** The truth of everything that is not simply fixed, by id. */
export function truthOf(quantities: Readonly<Record<string, Told>>): Record<string, number> {
  return Object.fromEntries(
    Object.entries(quantities)
      .filter(([, told]) => typeof told.declared !== 'number')
      .map(([id, told]) => [id, told.truth]),
  );
}
