import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { readExport } from '../../../core/run/readExport.ts';
import { readRuns } from '../../../core/run/readRuns.ts';
import type { Run } from '../../../core/run/run.ts';
import { readTable } from '../../../core/table/readTable.ts';
import { type ExpectedRun, expected } from '../../reference/exports/expected.ts';

const folder = fileURLToPath(new URL('../../reference/exports/', import.meta.url));
const bytesOf = (name: string) => new Uint8Array(readFileSync(folder + name));
const fromText = (text: string): readonly Run[] => {
  const outcome = readRuns(new TextEncoder().encode(text), 'run.csv');
  if (!outcome.ok) throw new Error(outcome.refusals[0].message);
  return outcome.value;
};

function summary(run: Run, file: string): ExpectedRun {
  const label = run.name.slice(file.length + 2);
  return {
    label,
    kind: run.readingKind,
    points: run.rows.map(({ volume_mL, reading }) => [volume_mL, Number(reading.toFixed(9))]),
    firstLine: run.rows[0].line,
    excluded: run.rows.filter(({ decision }) => decision.use === 'excluded').map(({ line }) => line),
    notAccepted: run.notAccepted.map(({ place, code }) => [place.line ?? 0, place.column, code]),
    doubts: run.doubts.map(({ code }) => code),
  };
}

describe('readRuns', () => {
  it('has an expectation for every export beside it, and an export for every expectation', () => {
    const files = readdirSync(folder).filter((name) => /\.(csv|txt)$/.test(name));
    expect(files.sort()).toEqual(Object.keys(expected).sort());
    expect(files.length).toBeGreaterThanOrEqual(40);
  });

  it.each(Object.entries(expected))('reads %s', (name, { runs, refused, encoding, delimiter, marks, suggestions }) => {
    const outcome = readRuns(bytesOf(name), name);
    if (refused !== undefined || runs === undefined) {
      expect(outcome.ok ? [] : outcome.refusals.map(({ code }) => code)).toEqual(refused);
      for (const refusal of outcome.ok ? [] : outcome.refusals) {
        expect(refusal.place.file).toBe(name);
        expect(refusal.remedy).not.toBe('');
      }
      return;
    }
    if (!outcome.ok) throw new Error(outcome.refusals[0].message);
    expect(outcome.value.map((run) => summary(run, name))).toEqual(
      runs.map(({ proposals, temperatures_C, times_s, ...run }) => ({
        ...{ label: '', excluded: [], notAccepted: [], doubts: [] },
        ...run,
      })),
    );
    runs.forEach(({ proposals, temperatures_C, times_s }, index) => {
      const run = outcome.value[index];
      if (proposals !== undefined) {
        expect(run.proposals?.map(({ code, lines }) => [code, ...lines])).toEqual(proposals);
      }
      if (temperatures_C !== undefined) expect(run.rows.map((row) => row.temperature_C)).toEqual(temperatures_C);
      if (times_s !== undefined) expect(run.rows.map((row) => row.time_s)).toEqual(times_s);
    });
    const whole = readExport(bytesOf(name), name);
    if (!whole.ok) throw new Error(whole.refusals[0].message);
    expect(whole.value.runs).toEqual(outcome.value);
    if (suggestions !== undefined) {
      expect(whole.value.suggestions.map(({ key, value, unit, line }) => [key, value, unit, line])).toEqual(
        suggestions,
      );
    }
    const table = readTable(bytesOf(name), name);
    if (!table.ok) throw new Error(table.refusals[0].message);
    expect(table.value).toMatchObject({
      ...(encoding === undefined ? {} : { encoding }),
      dialect: { ...(delimiter === undefined ? {} : { delimiter }), ...(marks === undefined ? {} : { marks }) },
    });
  });

  it('names the line, the column and what stood there', () => {
    const [run] = fromText('V (mL);pH\n0,00;2,94\n1,00;abc\n2,00;3,71\n');
    expect(run.notAccepted).toEqual([
      {
        code: 'cell-not-a-number',
        message: '"abc" stands where the pH belongs and cannot be read as one.',
        remedy: 'Write the number into the cell, with a decimal comma as in the rest of the file.',
        place: { file: 'run.csv', line: 3, column: 2 },
      },
    ]);
  });

  it('says in which lines readings lie beyond the range, and how the volumes step back', () => {
    const [run] = fromText('V (mL),pH\n0,2.9\n1,47\n2,3.1\n1.5,3.2\n3,-4\n4,3.5\n');
    expect(run.doubts.map(({ seen, place }) => [seen, place.line])).toEqual([
      ['Readings beyond pH 0–14: 47 (lines 3 and 6).', 3],
      ['The volume steps back from 2 to 1.5 mL (line 5).', 5],
    ]);
  });

  it('does not take a slipped figure, a refill or a table that runs backwards for a second run', () => {
    const volumes = Array.from({ length: 30 }, (_, index) => index);
    const rows = (values: readonly number[]) => values.map((volume, index) => `${volume},${3 + index / 10}\n`).join('');
    expect(fromText(`V,pH\n${rows(volumes.map((v) => (v === 25 ? 0.25 : v)))}`)).toHaveLength(1);
    expect(fromText(`V,pH\n${rows(volumes.map((v) => (v > 20 ? v - 5 : v)))}`)).toHaveLength(1);
    expect(fromText(`V,pH\n${rows(volumes.toReversed())}`)).toHaveLength(1);
    expect(fromText(`V,pH\n${rows([...volumes, ...volumes])}`)).toHaveLength(2);
  });

  it('converts volumes and potentials to mL and mV, whatever unit stands in header, units row or cell', () => {
    const first = (text: string) => fromText(text)[0].rows[1];
    expect(first('V (µL),pH\n0,3\n1234.5,4\n').volume_mL).toBe(1.2345);
    expect(first('V;pH\nL;-\n0;3\n0,02;4\n').volume_mL).toBe(20);
    expect(first('V,pH\n0 mL,3\n250 µL,4\n').volume_mL).toBe(0.25);
    expect(first('V (mL),U (V)\n0,0.3\n1,-0.25\n').reading).toBe(-250);
  });
});
