import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { designRun } from '../../core/model/runDesign.ts';
import { RunModel } from '../../core/model/runModel.ts';
import { readRuns } from '../../core/run/readRuns.ts';
import { completeSheet } from '../../core/sheet/completeSheet.ts';
import { parseSheet } from '../../core/sheet/parseSheet.ts';
import { sampleFiles } from '../../sample-data/sampleFiles.ts';
import truth from '../../sample-data/truth.json';

const textOf = (name: string) =>
  readFileSync(fileURLToPath(new URL(`../../sample-data/${name}`, import.meta.url)), 'utf8');

const exported: Record<string, { kind: 'pH' | 'mV'; first: readonly [number, number] }> = {
  'om-217.csv': { kind: 'pH', first: [0, 2.701] },
  'citric-acid.csv': { kind: 'pH', first: [0, 2.667] },
  'phthalate.txt': { kind: 'pH', first: [0, 4.065] },
  'washing-soda.csv': { kind: 'pH', first: [0, 11.045] },
  'strong-acid-mv.csv': { kind: 'mV', first: [0, 304] },
};

/** Reading noise that README.md states, for the run whose sheet leaves it out. */
const undeclaredNoise = 0.005;

describe('sample data', () => {
  it('are what the script makes', () => {
    for (const [name, text] of sampleFiles()) expect(textOf(name), name).toBe(text);
    expect(Object.keys(truth)).toEqual(Object.keys(exported));
  });

  it('are described with their truth in README.md', () => {
    const words = textOf('README.md').replaceAll('−', '-');
    for (const [file, values] of Object.entries(truth)) {
      expect(words).toContain(`\`${file}\``);
      for (const [id, value] of Object.entries(values)) expect(words, `${id} of ${file}`).toContain(String(value));
    }
  });

  it.each(Object.entries(exported))('%s is read as it was written, without doubts', (name, { kind, first }) => {
    const outcome = readRuns(new TextEncoder().encode(textOf(name)), name);
    if (!outcome.ok) throw new Error(outcome.refusals[0].message);
    expect(outcome.value).toHaveLength(1);
    const [run] = outcome.value;
    expect(run).toMatchObject({ readingKind: kind, notAccepted: [], doubts: [] });
    expect([run.rows[0].volume_mL, run.rows[0].reading]).toEqual(first);
    expect(run.rows.length).toBeGreaterThanOrEqual(60);
    expect(run.rows.length).toBeLessThanOrEqual(120);
  });

  it.each(Object.keys(exported))('%s follows its truth within its noise', (name) => {
    const runs = readRuns(new TextEncoder().encode(textOf(name)), name);
    const sheetName = name.replace(/\.\w+$/, '.sheet.json');
    const parsed = parseSheet(textOf(sheetName), sheetName);
    if (!runs.ok || !parsed.ok) throw new Error('run or sheet refused');
    const [{ rows, readingKind }] = runs.value;
    const sheet = completeSheet(parsed.value, { readingKind, titrantKind: 'base', groupsIfOpen: 0 });
    if (!sheet.ok) throw new Error(sheet.refusals[0].message);
    const design = designRun(sheet.value);
    const truths: Record<string, number> = truth[name as keyof typeof truth];
    const loose = design.quantities.filter(({ declaration }) => declaration.state !== 'fixed' && !declaration.assumed);
    expect(loose.map(({ id }) => id).sort()).toEqual(Object.keys(truths).sort());
    const values = Float64Array.from(design.quantities, ({ id, declaration }) =>
      declaration.state === 'fixed' ? declaration.value : truths[id],
    );

    const volumes = Float64Array.from(rows, (row) => row.volume_mL);
    const model = new RunModel(design, volumes, null);
    const readings = new Float64Array(rows.length);
    const slopes = new Float64Array(rows.length);
    expect(model.predict(values, readings)).toBe(true);
    model.differentiate(new Int32Array(0), new Float64Array(0), slopes);
    const reading = sheet.value.reading.uncertainty ?? undeclaredNoise;
    const setting = sheet.value.burette.settingUncertainty.value;
    const sum = rows.reduce(
      (total, row, i) => total + (row.reading - readings[i]) ** 2 / (reading ** 2 + (setting * slopes[i]) ** 2),
      0,
    );
    // Chi-square of n degrees of freedom has the standard deviation √(2n): four of them. A wrong
    // declaration (carbonate left out, a proton too many) leaves hundreds of times more.
    expect(Math.abs(sum - rows.length)).toBeLessThan(4 * Math.sqrt(2 * rows.length));
  });
});
