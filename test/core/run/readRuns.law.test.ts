import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readRuns } from '../../../core/run/readRuns.ts';
import { decodeText } from '../../../core/table/decodeText.ts';
import { readTable } from '../../../core/table/readTable.ts';
import { arbitraryExport } from './arbitraryExport.ts';

const folder = fileURLToPath(new URL('../../reference/exports/', import.meta.url));
const exports = readdirSync(folder)
  .filter((name) => /\.(csv|txt)$/.test(name))
  .map((name) => new Uint8Array(readFileSync(folder + name)));

const TOKENS = [
  ',',
  ';',
  '\t',
  '|',
  ' ',
  '\n',
  '\r',
  '\r\n',
  '"',
  '#',
  '-',
  '.',
  'N/A',
  '1e999',
  '1e308',
  '-7',
  '47',
  'pH',
  'V (L)',
];

const mutation = fc.record({
  at: fc.double({ min: 0, max: 1, noNaN: true }),
  length: fc.nat(12),
  kind: fc.constantFrom('delete', 'repeat', 'token', 'bytes', 'cut'),
  token: fc.constantFrom(...TOKENS),
  bytes: fc.uint8Array({ maxLength: 6 }),
});

function mutate(
  source: Uint8Array,
  { at, length, kind, token, bytes }: typeof mutation extends fc.Arbitrary<infer M> ? M : never,
) {
  const start = Math.floor(at * source.length);
  const before = source.subarray(0, start);
  const after = source.subarray(start + (kind === 'delete' ? length : 0));
  if (kind === 'cut') return before;
  const inserted =
    kind === 'repeat'
      ? source.subarray(start, start + 10 * length)
      : kind === 'token'
        ? new TextEncoder().encode(token)
        : kind === 'bytes'
          ? bytes
          : new Uint8Array(0);
  return Uint8Array.from([...before, ...inserted, ...after]);
}

const anyFile = fc.oneof(
  { weight: 1, arbitrary: fc.uint8Array({ maxLength: 400 }) },
  {
    weight: 1,
    arbitrary: fc
      .array(fc.constantFrom(...TOKENS, '0', '1', '12', '3'), { maxLength: 120 })
      .map((parts) => new TextEncoder().encode(parts.join(''))),
  },
  {
    weight: 6,
    arbitrary: fc
      .tuple(fc.constantFrom(...exports), fc.array(mutation, { minLength: 1, maxLength: 5 }))
      .map(([source, mutations]) => mutations.reduce<Uint8Array>(mutate, source)),
  },
);

describe('the law of accounting', () => {
  it('keeps every data row, as a row or not accepted, with finite numbers only, whatever the file', () => {
    fc.assert(
      fc.property(anyFile, (bytes) => {
        const table = readTable(bytes, 'any.csv');
        const outcome = readRuns(bytes, 'any.csv');
        if (!outcome.ok) {
          expect(outcome.refusals).toHaveLength(1);
          expect(outcome.refusals[0].message).not.toMatch(/NaN|undefined/);
          return;
        }
        if (!table.ok) throw new Error('runs without a table');
        const inFile = table.value.sections.flatMap(({ rows }) => rows.map(({ line }) => line));
        expect(new Set(inFile).size).toBe(inFile.length);
        const inRuns = outcome.value.flatMap((run) => {
          const lines = [...run.rows.map(({ line }) => line), ...run.notAccepted.map(({ place }) => place.line ?? -1)];
          expect(new Set(lines).size).toBe(lines.length);
          return lines;
        });
        // Runs side by side share their lines, so lines are compared and not counted.
        expect([...new Set(inRuns)].sort((a, b) => a - b)).toEqual(inFile.sort((a, b) => a - b));
        for (const run of outcome.value) {
          for (const { volume_mL, reading } of run.rows) {
            if (!Number.isFinite(volume_mL) || !Number.isFinite(reading)) throw new Error('a number that is none');
          }
          for (const { seen } of run.doubts) expect(seen).not.toMatch(/NaN|undefined/);
        }
      }),
      { seed: 4711, numRuns: 2000 },
    );
  });

  it('leaves no line with figures out of the table: each is a row, a header or text', () => {
    fc.assert(
      fc.property(anyFile, (bytes) => {
        const table = readTable(bytes, 'any.csv');
        if (!table.ok) return;
        const { sections, preamble, remarks } = table.value;
        const lines = [
          ...sections.flatMap(({ rows, headerLines }) => [...rows.map(({ line }) => line), ...headerLines]),
          ...preamble.map(({ line }) => line),
          ...remarks.map(({ line }) => line),
        ];
        expect(new Set(lines).size).toBe(lines.length);
        const decoded = decodeText(bytes);
        // A quoted cell may rightly swallow the end of a line and the next one.
        if (!decoded.ok || decoded.value.text.includes('"')) return;
        const accounted = new Set(lines);
        decoded.value.text.split('\n').forEach((line, index) => {
          if (/[\p{L}\d]/u.test(line)) expect(accounted.has(index + 1), `line ${index + 1}: ${line}`).toBe(true);
        });
      }),
      { seed: 4712, numRuns: 500 },
    );
  });
});

describe('the law of the round trip', () => {
  it('reads back exactly what was written, in every dialect that can be told apart', () => {
    let doubted = 0;
    const cases = 1000;
    fc.assert(
      fc.property(arbitraryExport, ({ bytes, points, kind, text }) => {
        const outcome = readRuns(bytes, 'written.csv');
        if (!outcome.ok) throw new Error(`${outcome.refusals[0].message}\n${text}`);
        const [run] = outcome.value;
        if (run.doubts.some(({ code }) => code === 'delimiter-guessed')) {
          doubted += 1;
          return;
        }
        const read = run.rows.map(({ volume_mL, reading }) => [volume_mL, reading]);
        expect([outcome.value.length, run.readingKind, read, run.notAccepted], text).toEqual([1, kind, points, []]);
      }),
      { seed: 99, numRuns: cases },
    );
    // Three decimals everywhere can be thousands; nearly everything else can be told, or the doubt would be worthless.
    expect(doubted / cases).toBeLessThan(0.03);
  });

  it('doubts or refuses where two readings are equally good', () => {
    const codes = (text: string) => {
      const outcome = readRuns(new TextEncoder().encode(text), 'written.csv');
      return outcome.ok ? outcome.value[0].doubts.map(({ code }) => code) : outcome.refusals.map(({ code }) => code);
    };
    expect(codes('V;E\n1,234;345\n2,468;340\n')).toContain('delimiter-guessed');
    expect(codes('V\tE\n1.234\t345\n2.468\t340\n')).toContain('delimiter-guessed');
    expect(codes('1,234\n')).toContain('delimiter-guessed');
    expect(codes('0,00,2,51\n0,50,2,75\n1,00,2,93\n')).toEqual(['table-delimiter-unclear']);
    expect(codes('0,0,2,5\n0,5,2,7\n1,0,2,9\n1,5,3,2\n')).toEqual(['table-delimiter-unclear']);
    expect(codes('V;pH\n1,234;3,210\n2,468;3,345\n')).toEqual([]);
  });
});
