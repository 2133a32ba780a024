import { expect } from 'vitest';

/** Keys that scripts rely on. Later versions may add keys, never take one away. */
const keys = {
  document: ['format', 'version', 'software', 'seed', 'runs', 'refusals'],
  run: ['file', 'name', 'points', 'ending', 'quantities', 'equivalence', 'noise', 'doubts'],
  ending: ['code', 'message'],
  quantity: ['id', 'label', 'unit', 'state', 'value', 'u', 'interval95', 'whyNoU', 'restsOn'],
  equivalence: ['analyte', 'step', 'volume_mL', 'u', 'by'],
  noise: ['reading', 'setting_mL', 'dose_mL', 'unit', 'declared', 'reducedChiSquare', 'degreesOfFreedom'],
  doubt: ['code', 'message', 'remedy'],
  refusal: ['code', 'file', 'line', 'column', 'message', 'remedy'],
} as const;

interface DocumentOf<Number> {
  readonly format: string;
  readonly version: number;
  readonly software: string;
  readonly seed: number;
  readonly runs: readonly {
    readonly file: string;
    readonly name: string;
    readonly points: number;
    readonly ending: { readonly code: string; readonly message: string };
    readonly quantities: readonly {
      readonly id: string;
      readonly label: string;
      readonly unit: string;
      readonly state: string;
      readonly value: Number;
      readonly u: Number;
      readonly interval95: readonly [Number, Number] | null;
      readonly whyNoU: string | null;
      readonly restsOn: readonly string[];
    }[];
    readonly equivalence: readonly {
      readonly analyte: string;
      readonly step: number;
      readonly volume_mL: Number;
      readonly u: Number;
      readonly by: string;
    }[];
    readonly noise: Readonly<Record<(typeof keys.noise)[number], unknown>>;
    readonly doubts: readonly { readonly code: string; readonly message: string; readonly remedy: string }[];
  }[];
  readonly refusals: readonly {
    readonly code: string;
    readonly file: string | null;
    readonly line: number | null;
    readonly column: number | null;
    readonly message: string;
    readonly remedy: string;
  }[];
}

export type ResultDocument = DocumentOf<number | null>;

/** Reads the document of a call and checks that every promised key is in every entry, and means what it says. */
export function readDocument(text: string): ResultDocument {
  // JSON knows no NaN: as text it would be no JSON, as a number it would have become null.
  const document = JSON.parse(text) as ResultDocument;
  expect(text).not.toMatch(/NaN|Infinity|undefined/);
  hasKeys(document, keys.document);
  expect(document.format).toBe('stepwell-result');
  expect(document.version).toBe(1);
  expect(document.software).toMatch(/^stepwell \d+\.\d+\.\d+$/);
  for (const run of document.runs) {
    hasKeys(run, keys.run);
    expect(Number.isInteger(run.points)).toBe(true);
    hasKeys(run.ending, keys.ending);
    expect(run.ending.message).toMatch(/^\S.*\.$/);
    hasKeys(run.noise, keys.noise);
    expect(['pH', 'mV']).toContain(run.noise.unit);
    expect(new Set(run.quantities.map(({ id }) => id)).size).toBe(run.quantities.length);
    for (const quantity of run.quantities) checkQuantity(quantity);
    for (const entry of run.equivalence) {
      hasKeys(entry, keys.equivalence);
      expect(['fit', 'derivative', 'gran']).toContain(entry.by);
      isNumberOrNull(entry.volume_mL);
      isNumberOrNull(entry.u);
    }
    for (const doubt of run.doubts) {
      hasKeys(doubt, keys.doubt);
      isSentence(doubt.message);
      isSentence(doubt.remedy);
    }
  }
  for (const refusal of document.refusals) {
    hasKeys(refusal, keys.refusal);
    isSentence(refusal.message);
    isSentence(refusal.remedy);
    for (const place of [refusal.line, refusal.column]) isNumberOrNull(place);
  }
  return document;
}

function checkQuantity(quantity: ResultDocument['runs'][number]['quantities'][number]): void {
  hasKeys(quantity, keys.quantity);
  const { id, state, value, u, interval95, whyNoU } = quantity;
  expect(['fixed', 'known', 'fitted', 'assumed'], id).toContain(state);
  isNumberOrNull(value);
  isNumberOrNull(u);
  // A number without uncertainty says why; one with an uncertainty has an interval around it after a fit.
  expect(whyNoU === null, `${id} has an uncertainty or says why not`).toBe(u !== null);
  if (u !== null) expect(u, id).toBeGreaterThan(0);
  if (value !== null && u !== null && interval95 !== null) {
    const [low, high] = interval95;
    expect(low, id).toBeLessThan(value);
    expect(high, id).toBeGreaterThan(value);
  }
  expect(Array.isArray(quantity.restsOn), id).toBe(true);
}

function hasKeys(entry: object, wanted: readonly string[]): void {
  expect(Object.keys(entry)).toEqual(expect.arrayContaining([...wanted]));
}

function isNumberOrNull(value: unknown): void {
  expect(value === null || (typeof value === 'number' && Number.isFinite(value))).toBe(true);
}

function isSentence(text: string): void {
  expect(text).toMatch(/^\S.*[.!?]$/s);
}
