import { describe, expect, it } from 'vitest';
import { parseArguments, usage } from '../../../app/terminal/parseArguments.ts';

describe('a call', () => {
  it('names files, a sheet and the kind of output in any order', () => {
    const understood = { ok: true, files: ['a.csv', 'b.csv'], sheet: 's.json', json: true };
    expect(parseArguments(['a.csv', 'b.csv', '--sheet', 's.json', '--json'])).toEqual(understood);
    expect(parseArguments(['--json', '--sheet', 's.json', 'a.csv', 'b.csv'])).toEqual(understood);
    expect(parseArguments(['a.csv', '--sheet', 's.json', 'b.csv', '--json'])).toEqual(understood);
  });

  it('needs neither sheet nor option', () => {
    expect(parseArguments(['a.csv'])).toEqual({ ok: true, files: ['a.csv'], sheet: null, json: false });
  });

  it('takes every word after -- as a file', () => {
    expect(parseArguments(['--json', '--', '--sheet', '-x.csv'])).toEqual({
      ok: true,
      files: ['--sheet', '-x.csv'],
      sheet: null,
      json: true,
    });
  });
});

describe('a wrong call', () => {
  it.each([
    [[], 'No file'],
    [['--json'], 'No file'],
    [['--sheet', 's.json'], 'No file'],
    [['a.csv', '--sheet'], '--sheet needs'],
    [['a.csv', '--sheet', '--json'], '--sheet needs'],
    [['a.csv', '--sheet', 's.json', '--sheet', 't.json'], 'twice'],
    [['a.csv', '--jsno'], '--jsno is not an option'],
    [['a.csv', '-j'], '-j is not an option'],
    [['a.csv', '--json=true'], '--json=true is not an option'],
  ])('%j says what is wrong and how to call', (words, reason) => {
    const call = parseArguments(words);
    if (call.ok) throw new Error('this call was taken for a right one');
    expect(call.message).toContain(reason);
    expect(call.message).toContain(usage);
  });
});
