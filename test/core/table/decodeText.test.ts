import { describe, expect, it } from 'vitest';
import { decodeText } from '../../../core/table/decodeText.ts';
import { maximumFileBytes } from '../../../core/table/maximumFileBytes.ts';

const utf8 = (text: string) => new TextEncoder().encode(text);
const utf16 = (text: string, bigEndian: boolean) => {
  const bytes = new Uint8Array(2 * text.length);
  const view = new DataView(bytes.buffer);
  for (let index = 0; index < text.length; index++) view.setUint16(2 * index, text.charCodeAt(index), !bigEndian);
  return bytes;
};
const codeOf = (bytes: Uint8Array) => {
  const outcome = decodeText(bytes);
  return outcome.ok ? 'read' : outcome.refusals[0].code;
};

describe('decodeText', () => {
  it.each([
    ['UTF-8', utf8('V (µL);pH\n1;2\n')],
    ['UTF-8', utf8('\ufeffV (µL);pH\n1;2\n')],
    ['UTF-16LE', utf16('\ufeffV (µL);pH\n1;2\n', false)],
    ['UTF-16LE', utf16('V (µL);pH\n1;2\n', false)],
    ['UTF-16BE', utf16('\ufeffV (µL);pH\n1;2\n', true)],
    ['UTF-16BE', utf16('V (µL);pH\n1;2\n', true)],
    ['Windows-1252', Uint8Array.from('V (µL);pH\n1;2\n', (character) => character.charCodeAt(0))],
  ] as const)('reads %s', (encoding, bytes) => {
    expect(decodeText(bytes)).toMatchObject({ ok: true, value: { text: 'V (µL);pH\n1;2\n', encoding } });
    expect(decodeText(bytes, encoding)).toEqual({
      ok: true,
      value: { text: 'V (µL);pH\n1;2\n', encoding, guessed: false },
    });
  });

  it('reads the dashes and quotes of Windows-1252, which some runtimes leave as control characters', () => {
    const outcome = decodeText(Uint8Array.from([0x31, 0x3b, 0x96, 0x35, 0x20, 0x80, 0x92, 0x9f]));
    expect(outcome).toMatchObject({ ok: true, value: { text: '1;–5 €’Ÿ' } });
  });

  it('ends every line with a line feed and keeps their number', () => {
    expect(decodeText(utf8('a\r\nb\rc\nd\r\re'))).toMatchObject({ value: { text: 'a\nb\nc\nd\n\ne' } });
  });

  it('refuses what is empty, not text or too large', () => {
    expect(codeOf(new Uint8Array(0))).toBe('file-empty');
    expect(codeOf(utf8('\ufeff \r\n\t'))).toBe('file-empty');
    expect(codeOf(utf16('\ufeff\n', false))).toBe('file-empty');
    expect(codeOf(new Uint8Array(64))).toBe('file-not-text');
    expect(codeOf(Uint8Array.from({ length: 500 }, (_, index) => (index * 167) % 256))).toBe('file-not-text');
    expect(codeOf(new Uint8Array(maximumFileBytes + 1))).toBe('file-too-large');
  });

  it('says what a spreadsheet workbook is and what to do with it', () => {
    const workbook = Uint8Array.from([0x50, 0x4b, 3, 4, 20, 0, 6, 0, 8, 0, 0, 0, 33, 0]);
    expect(decodeText(workbook)).toMatchObject({
      refusals: [{ code: 'file-not-text', remedy: 'Save the sheet with the data points as CSV.' }],
    });
  });

  it('reads on over a stray control character', () => {
    expect(codeOf(utf8(`V,pH\n${'1.00,4.20\n'.repeat(40)}\u0000\n`))).toBe('read');
  });
});
