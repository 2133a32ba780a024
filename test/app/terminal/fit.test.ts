import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it, vi } from 'vitest';
import { evenVolumes, perform } from '../../experiment.ts';
import { fitCommand } from './command.ts';
import { readDocument } from './documentShape.ts';

// A process takes a third of a second by itself, and many times that where other tests want the same cores.
vi.setConfig({ testTimeout: 60_000 });

const folder = mkdtempSync(join(tmpdir(), 'terminal-'));
afterAll(() => rmSync(folder, { recursive: true }));

/** Writes a file to try; returns its path. */
function file(name: string, contents: string | Uint8Array): string {
  const path = join(folder, name);
  writeFileSync(path, contents);
  return path;
}

function exported(volumes: ArrayLike<number>, readings: ArrayLike<number>): string {
  const rows = Array.from(volumes, (volume, i) => `${volume.toFixed(3)},${readings[i].toFixed(3)}`);
  return `${['Volume (mL),pH', ...rows].join('\n')}\n`;
}

const acid = perform({
  pKa: [4.8],
  end_mL: 3.6,
  points: 37,
  activity: 'davies',
  errors: { seed: 5, uReading: 0.005, uSetting_mL: 0.003 },
});
const rows = exported(acid.volumes_mL, acid.readings);
const goodFile = file('acid.csv', rows);
const sheetFile = file(
  'sheet.json',
  JSON.stringify({
    sheet: 1,
    sample: {
      volume_mL: 25,
      analytes: [{ name: 'acid X', groups: 1, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }],
    },
    titrant: { kind: 'base', concentration_M: { value: 0.1, u: 0.0001 } },
    medium: { activity: 'davies', pKw: 14 },
    reading: { kind: 'pH', scale: 'activity' },
  }),
);

/** What no output may hold: a stack trace, or a number that is none. */
const blemish = /\bat .*:\d+:\d+|Error\b|NaN|Infinity|undefined|\[object/;

describe('a fitted run', () => {
  it('comes as one document with every key, exit status 0, nothing on standard error', async () => {
    const { status, output, errors } = await fitCommand([goodFile, '--sheet', sheetFile, '--json']);
    expect(errors).toBe('');
    expect(status).toBe(0);
    const { runs, refusals } = readDocument(output);
    expect(refusals).toEqual([]);
    expect(runs).toHaveLength(1);
    const [run] = runs;
    expect(run).toMatchObject({ file: 'acid.csv', name: 'acid.csv', points: 37, ending: { code: 'fitted' } });
    const find = (id: string) => run.quantities.find((quantity) => quantity.id === id);
    for (const [id, truth] of Object.entries({ pKa1: 4.8, concentration: 0.01 })) {
      const quantity = find(id);
      expect(quantity?.state).toBe('fitted');
      // Four standard uncertainties: one in 15,000.
      expect(Math.abs((quantity?.value ?? 0) - truth), id).toBeLessThan(4 * (quantity?.u ?? 0));
    }
    expect(find('titrant.concentration')?.state).toBe('known');
    expect(find('sample.volume')).toMatchObject({ state: 'fixed', value: 25, u: null, whyNoU: 'fixed' });
    expect(find('burette.gain')).toMatchObject({ state: 'assumed', value: 1 });
    expect(run.equivalence.map(({ by }) => by)).toEqual(expect.arrayContaining(['fit', 'derivative', 'gran']));
    for (const { volume_mL } of run.equivalence) expect(Math.abs((volume_mL ?? 0) - 2.5)).toBeLessThan(0.1);
  });

  it('is printed for people with the same figures', async () => {
    const { status, output, errors } = await fitCommand([goodFile, '--sheet', sheetFile]);
    expect({ status, errors }).toEqual({ status: 0, errors: '' });
    expect(output).toMatch(/pKa₁ +4\.\d+ ± 0\.00\d+/);
    expect(output).toMatch(/Equivalence 1 of acid X, by fit +2\.\d+ ± 0\.0\d+ mL/);
    expect(output).not.toMatch(blemish);
  });

  it('without a sheet rests on assumptions, which are marked, and on as many groups as it shows', async () => {
    const { status, output } = await fitCommand([goodFile, '--json']);
    expect(status).toBe(0);
    const [run] = readDocument(output).runs;
    expect(run.quantities.filter(({ id }) => /^pKa/.test(id)).map(({ id }) => id)).toEqual(['pKa1']);
    // A strong ion in the titrant that is not declared is absent, not assumed.
    for (const { id, state, value } of run.quantities)
      if (!(id === 'titrant.strongIon' && value === 0))
        expect(state, id).toBe(id === 'pKa1' || id === 'concentration' ? 'fitted' : 'assumed');
    expect(run.doubts.map(({ code }) => code)).toContain('rests-on-assumption');
    expect(run.quantities.find(({ id }) => id === 'concentration')?.restsOn).toEqual(
      expect.arrayContaining(['sample.volume']),
    );
  });
});

describe('several runs', () => {
  it('in several files share one sheet and are fitted alone', async () => {
    const second = perform({ pKa: [4.8], concentration_M: 0.012, end_mL: 4, points: 41, activity: 'davies' });
    const other = file('other.csv', exported(second.volumes_mL, second.readings));
    const { status, output } = await fitCommand([goodFile, other, '--sheet', sheetFile, '--json']);
    expect(status).toBe(0);
    const { runs } = readDocument(output);
    expect(runs.map((run) => run.file)).toEqual(['acid.csv', 'other.csv']);
    const amounts = runs.map((run) => run.quantities.find(({ id }) => id === 'concentration')?.value ?? 0);
    // A tenth of the difference between them.
    expect(Math.abs(amounts[0] - 0.01)).toBeLessThan(2e-4);
    expect(Math.abs(amounts[1] - 0.012)).toBeLessThan(2e-4);
  });

  it('in one file each have an entry', async () => {
    const both = ['Sample,Volume (mL),pH'];
    for (const sample of ['A', 'B']) for (const row of rows.trim().split('\n').slice(1)) both.push(`${sample},${row}`);
    const { status, output } = await fitCommand([
      file('two-runs.csv', both.join('\n')),
      '--sheet',
      sheetFile,
      '--json',
    ]);
    expect(status).toBe(0);
    const { runs } = readDocument(output);
    expect(runs.map((run) => run.points)).toEqual([37, 37]);
    expect(new Set(runs.map((run) => run.name)).size).toBe(2);
    expect(new Set(runs.map((run) => run.file))).toEqual(new Set(['two-runs.csv']));
    expect(runs[0].quantities).toEqual(runs[1].quantities);
  });

  it('of which one is bad: the good one is fitted, exit status 1', async () => {
    const { status, output, errors } = await fitCommand([
      file('empty.csv', ''),
      goodFile,
      '--sheet',
      sheetFile,
      '--json',
    ]);
    expect({ status, errors }).toEqual({ status: 1, errors: '' });
    const { runs, refusals } = readDocument(output);
    expect(runs.map((run) => run.ending.code)).toEqual(['fitted']);
    expect(refusals).toEqual([expect.objectContaining({ code: 'file-empty', file: 'empty.csv' })]);
  });
});

const pictureBytes = Uint8Array.from([
  0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 73, 72, 68, 82, 0, 0,
]);
const [header, ...points] = rows.trim().split('\n');

/** The good run with another cell for the reading of line 11. */
function withReading(cell: string): string {
  return [header, ...points].map((line, i) => (i === 10 ? line.replace(/,.*/, `,${cell}`) : line)).join('\n');
}

describe('bad input', () => {
  /** Files from which no run can be formed: a refusal each. */
  const refused = [
    { path: file('empty.csv', ''), code: 'file-empty' },
    { path: file('picture.csv', pictureBytes), code: 'file-not-text' },
    { path: file('words.csv', 'name,colour\nfirst,red\nsecond,blue\nthird,green\n'), code: 'table-no-columns' },
    { path: join(folder, 'missing.csv'), code: 'file-unreadable' },
    { path: folder, code: 'file-unreadable' },
  ];
  /** Readable tables that cannot be fitted: a run each, which ends with a reason. */
  const unfitted = [
    { path: file('backwards.csv', [header, ...points.toReversed()].join('\n')), code: 'volumes-run-backwards' },
    { path: file('two-points.csv', `${header}\n0,3.1\n1,3.4\n`), code: 'too-few-points' },
    { path: file('one-volume.csv', `${header}\n${'5,7.1\n'.repeat(12)}`), code: 'too-few-points' },
    {
      path: file('all-47.csv', [header, ...evenVolumes(12, 11).map((volume) => `${volume},47`)].join('\n')),
      code: 'all-rows-excluded',
    },
  ];
  const paths = [...refused, ...unfitted].map(({ path }) => path);
  const json = fitCommand([...paths, '--sheet', sheetFile, '--json']);
  const text = fitCommand([...paths, '--sheet', sheetFile]);

  it('is told in the one document of the call, never on standard error, exit status 1', async () => {
    for (const { status, errors } of [await json, await text])
      expect({ status, errors }).toEqual({ status: 1, errors: '' });
    const { runs, refusals } = readDocument((await json).output);
    expect(refusals.map(({ code }) => code)).toEqual(refused.map(({ code }) => code));
    expect(runs.map(({ ending }) => ending.code)).toEqual(unfitted.map(({ code }) => code));
  });

  it('of which no run can be formed is refused with place, reason and remedy', async () => {
    const { refusals } = readDocument((await json).output);
    const printed = (await text).output;
    refusals.forEach(({ file: place, message, remedy }, i) => {
      expect(refused[i].path.endsWith(place ?? 'nowhere')).toBe(true);
      for (const part of [place, message, remedy]) expect(printed).toContain(part);
    });
  });

  it('that cannot be fitted has no values, and says why', async () => {
    const { runs } = readDocument((await json).output);
    const printed = (await text).output;
    for (const { ending, quantities, equivalence } of runs) {
      for (const { state, value } of quantities) expect(value === null).toBe(state === 'fitted');
      expect(equivalence.every(({ by }) => by !== 'fit')).toBe(true);
      expect(printed).toContain(ending.message);
    }
  });

  it('that cannot be fitted keeps its derivative volume', async () => {
    const [{ equivalence }] = readDocument((await json).output).runs;
    const derivative = equivalence.filter(({ by }) => by === 'derivative');
    expect(derivative).toHaveLength(1);
    // Half the spacing of the points.
    expect(Math.abs((derivative[0].volume_mL ?? 0) - 2.5)).toBeLessThan(0.05);
  });

  it('leaves no stack trace and no number that is none', async () => {
    expect((await text).output).not.toMatch(blemish);
    expect((await json).output).not.toMatch(blemish);
  });

  it('in one cell: text is refused at its place, a pH of 47 is left out; the rest is fitted, exit status 1', async () => {
    const slips = [file('slip.csv', withReading('unclear')), file('beyond.csv', withReading('47'))];
    const { status, output } = await fitCommand([...slips, '--sheet', sheetFile, '--json']);
    const { runs, refusals } = readDocument(output);
    expect(refusals).toEqual([
      expect.objectContaining({ code: 'cell-not-a-number', file: 'slip.csv', line: 11, column: 2 }),
    ]);
    for (const run of runs) expect(run).toMatchObject({ points: 36, ending: { code: 'fitted' } });
    expect(runs[0].doubts.map(({ code }) => code)).toContain('rows-not-accepted');
    const beyond = runs[1].doubts.find(({ code }) => code === 'reading-beyond-range');
    expect(beyond?.message).toMatch(/47.*line 11/);
    expect(status).toBe(1);
  });
});

describe('a bad sheet', () => {
  it('is refused with place, reason and remedy, and no run is worked up', async () => {
    const path = file('negative.json', '{"sheet":1,"sample":{"volume_mL":-5}}');
    const [json, text] = await Promise.all([
      fitCommand([goodFile, '--sheet', path, '--json']),
      fitCommand([goodFile, '--sheet', path]),
    ]);
    for (const { status, errors } of [json, text]) expect({ status, errors }).toEqual({ status: 1, errors: '' });
    const { runs, refusals } = readDocument(json.output);
    expect(runs).toEqual([]);
    expect(refusals).toHaveLength(1);
    const [{ code, message, remedy }] = refusals;
    expect(code).toBe('sheet-out-of-range');
    expect(message).toContain('sample.volume_mL');
    for (const part of ['negative.json', message, remedy]) expect(text.output).toContain(part);
    expect(text.output).not.toMatch(blemish);
  });

  it.each([
    [
      'keys that contradict each other',
      '{"sheet":1,"sample":{"analytes":[{"groups":2,"pKa":[4]}]}}',
      'sheet-inconsistent',
    ],
    ['no file behind it', null, 'file-unreadable'],
  ])('with %s likewise', async (name, contents, code) => {
    const path = contents === null ? join(folder, 'no sheet.json') : file(`${name}.json`, contents);
    const { status, output, errors } = await fitCommand([goodFile, '--sheet', path, '--json']);
    expect({ status, errors }).toEqual({ status: 1, errors: '' });
    const { runs, refusals } = readDocument(output);
    expect(runs).toEqual([]);
    expect(refusals.map((refusal) => refusal.code)).toEqual([code]);
  });
});

describe('a wrong call', () => {
  it('has exit status 2, words on standard error and nothing on standard output', async () => {
    const calls = await Promise.all([fitCommand([]), fitCommand([goodFile, '--bogus'])]);
    for (const { status, output, errors } of calls) {
      expect({ status, output }).toEqual({ status: 2, output: '' });
      expect(errors).toContain('usage:');
      expect(errors).not.toMatch(/\bat .*:\d+:\d+/);
    }
  });
});

describe('names of files', () => {
  it('are meant from where the user stands, not from where npm starts the script', async () => {
    const { status, output } = await fitCommand(['acid.csv', '--sheet', 'sheet.json', '--json'], { initCwd: folder });
    expect(status).toBe(0);
    expect(readDocument(output).runs[0].file).toBe('acid.csv');
  });

  it('are meant from the current folder where npm is not in between, and may hold any letters', async () => {
    mkdirSync(join(folder, 'Säure Über'));
    file(join('Säure Über', 'Säure 1 (neu).csv'), rows);
    const { status, output } = await fitCommand(['Säure Über/Säure 1 (neu).csv', '--json', '--sheet', sheetFile], {
      cwd: folder,
    });
    expect(status).toBe(0);
    expect(readDocument(output).runs[0].file).toContain('Säure 1 (neu).csv');
  });
});
