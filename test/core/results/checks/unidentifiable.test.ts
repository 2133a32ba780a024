import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { RunResult } from '../../../../core/results/runResult.ts';
import { type Experiment, perform, runOf, type SheetChanges, sheetOf, usualErrors } from '../../../experiment.ts';
import { lawOptions } from '../../../laws/lawOptions.ts';
import { fitAsDeclared, fitExperiment } from './soundRuns.ts';

const acid: Experiment = { pKa: [4.8], end_mL: 3.6, errors: { seed: 11, ...usualErrors }, decimals: 3 };
const diprotic: Experiment = { ...acid, pKa: [3.5, 7.5], end_mL: 6.5 };
const fittedFrom = (start: number) => ({ fitted: true, start }) as const;

const open = (result: RunResult) =>
  result.quantities.filter(({ whyNoU }) => whyNoU === 'undetermined').map(({ id }) => id);
const words = (result: RunResult) =>
  result.doubts.flatMap(({ code, seen }) => (code === 'unidentifiable' ? [seen] : []));

describe('unidentifiable, in words', () => {
  it.each([
    [
      'volume and gain',
      { sample: { volume_mL: fittedFrom(25) }, burette: { gain: 'fitted' } },
      'Only the ratio of burette gain and sample volume is fixed by this run.',
    ],
    [
      'an electrolyte that no constant feels',
      { sample: { background_M: fittedFrom(0.1) } },
      'This run says nothing of the background electrolyte in the sample.',
    ],
  ] as [string, SheetChanges, string][])('%s', (_, changes, sentence) => {
    expect(words(fitExperiment(acid, changes))).toEqual([sentence]);
  });

  it('everything free at once: what nothing sets the scale of, and apart from it what only scales the volumes', () => {
    const result = fitExperiment(acid, {
      sample: { volume_mL: fittedFrom(25) },
      burette: { gain: 'fitted' },
      titrant: { concentration_M: fittedFrom(0.1) },
      reading: { offset: fittedFrom(0) },
      medium: { pKw: fittedFrom(14) },
    });
    const [scale, volumes, ...more] = words(result);
    expect(more).toEqual([]);
    for (const name of ['titrant concentration', 'sample concentration', 'pKw', 'electrode offset', 'pKa₁'])
      expect(scale).toContain(name);
    expect(scale).toContain('nothing sets their scale');
    expect(volumes).toContain('ratio of burette gain and sample volume');
  });
});

/** What may be left to be fitted too much, with a start beside the truth. */
const freed = {
  volume: { sample: { volume_mL: fittedFrom(25.5) } },
  water: { sample: { extraWater_mL: fittedFrom(0.5) } },
  background: { sample: { background_M: fittedFrom(0.05) } },
  carbonate: { titrant: { carbonate_M: fittedFrom(0.001) } },
  strongIon: { sample: { strongIon_M: fittedFrom(0.0001) } },
  titrant: { titrant: { concentration_M: fittedFrom(0.102) } },
  gain: { burette: { gain: fittedFrom(1.01) } },
  pKw: { medium: { pKw: fittedFrom(13.95) } },
  offset: { reading: { offset: fittedFrom(0.03) } },
  slope: { reading: { slope: fittedFrom(0.99) } },
} as const satisfies Record<string, SheetChanges>;
type Freed = keyof typeof freed;

function merged(names: readonly Freed[]): SheetChanges {
  const changes: Record<string, Record<string, unknown>> = {};
  for (const name of names)
    for (const [part, keys] of Object.entries(freed[name])) changes[part] = { ...changes[part], ...keys };
  return changes;
}

/** Quantities that cannot be told apart whatever the readings are, by the invariances of the model itself. */
function certainlyOpen(names: readonly Freed[], constants: readonly string[]): string[] {
  const has = (...wanted: Freed[]) => wanted.every((name) => names.includes(name));
  return [
    // Constants of this medium: an electrolyte that takes no part changes nothing.
    ...(has('background') ? ['sample.background'] : []),
    // All volumes times a factor.
    ...(has('volume', 'gain') ? ['sample.volume', 'burette.gain'] : []),
    // All concentrations times a factor, with the constants and the electrode shifted to match; those of carbonate are fixed.
    ...(has('titrant', 'pKw', 'offset') && !has('carbonate')
      ? ['titrant.concentration', 'medium.pKw', 'reading.offset', 'concentration', ...constants]
      : []),
  ];
}

function everyNumberIsFinite(value: unknown): boolean {
  if (typeof value === 'number') return Number.isFinite(value);
  if (value instanceof Float64Array) return value.every(Number.isFinite);
  return typeof value !== 'object' || value === null || Object.values(value).every(everyNumberIsFinite);
}

describe('a sheet that leaves too much to be fitted', () => {
  const run = perform({ ...diprotic, points: 40 });
  let fitted = 0;

  it('gives no value to what is open, names it, and prints no number that is none', () => {
    fc.assert(
      fc.property(fc.subarray(Object.keys(freed) as Freed[], { minLength: 2, maxLength: 5 }), (names) => {
        const result = fitAsDeclared(runOf(run.volumes_mL, run.readings), sheetOf(diprotic, merged(names)));
        expect(everyNumberIsFinite(result)).toBe(true);
        if (result.ending.code !== 'fitted') return;
        fitted++;
        const found = open(result);
        for (const id of certainlyOpen(names, ['pKa1', 'pKa2'])) expect(found).toContain(id);
        const said = words(result).join(' ');
        for (const { id, label, value, u, interval95 } of result.quantities.filter(({ id }) => found.includes(id))) {
          expect([value, u, interval95]).toEqual([null, null, null]);
          expect(said, id).toContain(label);
        }
      }),
      lawOptions(16),
    );
    // Such sheets may end anywhere, but they are no excuse for not fitting.
    expect(fitted).toBeGreaterThan(12);
  }, 30_000);
});
