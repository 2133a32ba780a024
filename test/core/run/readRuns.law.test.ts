import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readRuns } from '../../../core/run/readRuns.ts';
import { decodeText } from '../../../core/table/decodeText.ts';
import { readTable } from '../../../core/table/readTable.ts';
import { accountFor } from './accountFor.ts';
import { arbitraryExport } from './arbitraryExport.ts';
import { arbitraryFile } from './arbitraryFile.ts';

/** Time that the ten thousand files of a law may take on a busy machine, ms; they need a tenth of it. */
const patience = 120_000;

describe('the law of accounting', () => {
  it('keeps every data row, used, excluded or not accepted, with finite numbers only, whatever the file', {
    timeout: patience,
  }, () => {
    let read = 0;
    fc.assert(
      fc.property(arbitraryFile, (bytes) => {
        if (accountFor(bytes)) read += 1;
      }),
      // Nine files in ten are damaged exports: ten thousand of them.
      { seed: 4711, numRuns: 11_200 },
    );
    // Were nearly all of them refused, nothing would have been accounted for.
    expect(read).toBeGreaterThan(5000);
  });

  it('leaves no line with figures out of the table: each is a row, a header or text', () => {
    fc.assert(
      fc.property(arbitraryFile, (bytes) => {
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
  it('reads back exactly what was written, in every dialect that can be told apart', { timeout: patience }, () => {
    let doubted = 0;
    const cases = 10_000;
    fc.assert(
      fc.property(arbitraryExport, ({ bytes, points, kind, missing, text }) => {
        const outcome = readRuns(bytes, 'written.csv');
        if (!outcome.ok) throw new Error(`${outcome.refusals[0].message}\n${text}`);
        const [run] = outcome.value;
        if (run.doubts.some(({ code }) => code === 'delimiter-guessed')) {
          doubted += 1;
          return;
        }
        const lines = run.notAccepted.map(({ place }) => place.line);
        const read = run.rows.map(({ volume_mL, reading }) => [volume_mL, reading]);
        const found = JSON.stringify([outcome.value.length, run.readingKind, read, lines]);
        if (found !== JSON.stringify([1, kind, points, missing])) expect(`${found}\n${text}`).toBe('what was written');
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
