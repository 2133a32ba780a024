import { describe, expect, it } from 'vitest';
import {
  applyRowDecisions,
  type ReadExport,
  type ReadingOverrules,
  readExport,
  readRuns,
} from '../../../core/index.ts';

const utf8 = (text: string) => new TextEncoder().encode(text);

function read(text: string, overrules?: ReadingOverrules): ReadExport {
  const outcome = readExport(utf8(text), 'run.csv', overrules);
  if (!outcome.ok) throw new Error(outcome.refusals[0].message);
  return outcome.value;
}

const pointsOf = ({ runs }: ReadExport, run = 0) =>
  runs[run].rows.map(({ volume_mL, reading }) => [volume_mL, reading]);

const curve =
  'V (mL);pH;E (mV);T (°C)\n0;2,9;240;25\n1;3,4;210;25\n2;3,9;180;26\n3;4,6;140;26\n4;8,1;-60;26\n5;11,2;-250;27\n';

describe('readExport', () => {
  it('tells every choice and who made it', () => {
    const { choices } = read(curve);
    expect(choices).toEqual({
      encoding: { value: 'UTF-8', source: 'found' },
      delimiter: { value: ';', source: 'found' },
      decimal: { value: ',', source: 'found' },
      thousands: { value: '', source: 'found' },
      headerLines: { value: [1], source: 'found' },
      columns: [
        { name: 'V (mL)', role: { value: 'volume', source: 'found' }, unit: { value: 'mL', source: 'found' } },
        { name: 'pH', role: { value: 'pH', source: 'found' }, unit: { value: 'pH', source: 'found' } },
        { name: 'E (mV)', role: { value: 'ignored', source: 'found' }, unit: { value: null, source: 'found' } },
        { name: 'T (°C)', role: { value: 'temperature', source: 'found' }, unit: { value: '°C', source: 'found' } },
      ],
      volumeMeaning: { value: 'cumulative', source: 'found' },
      runSplit: { value: 'none', source: 'found' },
    });
    expect(read('0\t1.9\n1\t2.4\n2\t3.9\n3\t9.1\n').choices.columns.map(({ role, unit }) => [role, unit])).toEqual([
      [
        { value: 'volume', source: 'guessed' },
        { value: 'mL', source: 'guessed' },
      ],
      [
        { value: 'pH', source: 'guessed' },
        { value: 'pH', source: 'found' },
      ],
    ]);
  });

  it('reads another column where a person says so, and lets go of the one it had', () => {
    const whole = read(curve, { columns: { 2: { role: 'mV' } } });
    expect(whole.runs[0].readingKind).toBe('mV');
    expect(pointsOf(whole).slice(0, 2)).toEqual([
      [0, 240],
      [1, 210],
    ]);
    expect(whole.choices.columns.map(({ role }) => role)).toEqual([
      { value: 'volume', source: 'found' },
      { value: 'ignored', source: 'found' },
      { value: 'mV', source: 'overruled' },
      { value: 'temperature', source: 'found' },
    ]);
  });

  it('takes the choices of one reading for another, whole', () => {
    const { choices } = read(curve);
    const same = readRuns(utf8(curve), 'run.csv', {
      ...{ encoding: choices.encoding.value, delimiter: choices.delimiter.value, decimal: choices.decimal.value },
      ...{ thousands: choices.thousands.value, headerLines: choices.headerLines.value },
      columns: choices.columns.map(({ role, unit }) => ({ role: role.value, unit: unit.value })),
      ...{ volumeMeaning: choices.volumeMeaning.value, runSplit: choices.runSplit.value },
    });
    expect(same.ok && same.value).toEqual(read(curve).runs);
  });

  it('follows units, decimal marks, delimiters, encodings and header lines that are overruled', () => {
    expect(pointsOf(read('V (mL),pH\n0,3\n500,4\n1000,5\n', { columns: { 0: { unit: 'µL' } } }))[1]).toEqual([0.5, 4]);
    // Cells with a unit of their own give way to a person, too.
    expect(pointsOf(read('V,pH\n0 mL,3\n5 mL,4\n9 mL,5\n', { columns: { 0: { unit: 'L' } } }))[1]).toEqual([5000, 4]);
    const unclear = 'V;E\n1,234;345\n2,468;340\n';
    expect(pointsOf(read(unclear, { decimal: '.', thousands: ',' }))[0]).toEqual([1234, 345]);
    expect(pointsOf(read(unclear, { decimal: ',' }))[0]).toEqual([1.234, 345]);
    expect(read(unclear, { decimal: ',', delimiter: ';', thousands: '' }).runs[0].doubts).toEqual([]);
    expect(pointsOf(read('0,5,3,1\n1,5,3,2\n', { delimiter: ',', decimal: '.' }))[0]).toEqual([0, 5]);
    expect(read('V (ÂµL);pH\n0;3\n5;4\n', { encoding: 'Windows-1252' }).choices.encoding).toEqual({
      value: 'Windows-1252',
      source: 'overruled',
    });
    const { choices, view } = read('V,pH\n99,9\n0,3\n1,4\n2,5\n', { headerLines: [1, 2] });
    expect(choices.headerLines).toEqual({ value: [1, 2], source: 'overruled' });
    expect(view.counts).toEqual({ rows: 3, used: 3, excluded: 0, notAccepted: 0 });
    expect(read('V,pH\n0,3\n1,4\n2,5\n', { headerLines: [] }).choices.columns[0].name).toBe('');
  });

  it('says that nothing can be read the way a person asked, and how to go back', () => {
    const outcome = readExport(utf8('V;pH\n0,5;3,1\n1,5;3,2\n'), 'run.csv', { delimiter: '|' });
    expect(outcome.ok ? [] : outcome.refusals.map(({ code, remedy }) => [code, remedy])).toEqual([
      ['table-no-columns', 'Take back what was chosen for encoding, delimiter or decimal mark, or choose otherwise.'],
    ]);
  });

  it('takes volumes for what a person says they are', () => {
    const rows = 'V (mL),pH\n10,3\n12,4\n15,5\n';
    expect(pointsOf(read(rows, { volumeMeaning: 'increments' }))).toEqual([
      [10, 3],
      [22, 4],
      [37, 5],
    ]);
    expect(pointsOf(read(rows, { volumeMeaning: 'burette' }))[2]).toEqual([5, 5]);
    const down = 'V (mL),pH\n50,3\n48.7,4\n45.1,5\n42,6\n39,7\n30.2,8\n28,9\n';
    expect(pointsOf(read(down))[2]).toEqual([4.9, 5]);
    expect(read(down).runs[0].doubts.map(({ code }) => code)).toEqual(['volume-meaning-guessed']);
    expect(pointsOf(read(down, { volumeMeaning: 'cumulative' }))[2]).toEqual([45.1, 5]);
  });

  it('parts rows into runs as a person says', () => {
    const rows = (name: string) => [0, 1, 2, 3, 4, 5].map((v) => `${name},${v},${3 + v}\n`).join('');
    const stacked = `sample,V (mL),pH\n${rows('a')}${rows('b')}`;
    expect(read(stacked).choices.runSplit).toEqual({ value: 'sampleColumn', source: 'found' });
    expect(read(stacked).runs.map(({ rows }) => rows.length)).toEqual([6, 6]);
    expect(read(stacked, { runSplit: 'none' }).runs.map(({ rows }) => rows.length)).toEqual([12]);
    expect(read(stacked, { columns: { 0: { role: 'ignored' } } }).choices.runSplit).toEqual({
      value: 'restart',
      source: 'guessed',
    });
    expect(read(stacked, { runSplit: 'restart' }).runs[0].doubts).toEqual([]);
    const beside = 'V (mL),pH,V (mL),pH\n0,3,0,4\n1,4,1,5\n2,5,2,6\n';
    expect(read(beside).choices.runSplit.value).toBe('sideBySide');
    expect(read(beside, { runSplit: 'none' }).runs).toHaveLength(1);
    const blocks = 'V (mL),pH\n0,3\n1,4\n2,5\n\nV (mL),pH\n0,4\n1,5\n2,6\n';
    expect(read(blocks).choices.runSplit.value).toBe('blocks');
    expect(read(blocks, { runSplit: 'none' }).runs.map(({ rows }) => rows.length)).toEqual([6]);
  });

  it('shows every line with its number, and what became of each row and why', () => {
    const { view } = read('made by hand\nV (mL),pH\n0,3\n1,abc\n2,47\n3,4\u0007\u202e\n<b>=1+1</b>,5\n');
    expect(view.lines.map(({ line, kind, status }) => [line, kind, status])).toEqual([
      [1, 'text', undefined],
      [2, 'header', undefined],
      [3, 'row', 'used'],
      [4, 'row', 'notAccepted'],
      [5, 'row', 'excluded'],
      [6, 'row', 'notAccepted'],
      [7, 'row', 'notAccepted'],
    ]);
    expect(view.lines[4].why).toBe('the reading 47 lies beyond pH 0–14');
    expect(view.lines[3].why).toContain('"abc"');
    expect(view.lines[5].cells).toEqual(['3', '4··']);
    expect(view.lines[6].cells).toEqual(['<b>=1+1</b>', '5']);
    expect(view.counts).toEqual({ rows: 5, used: 1, excluded: 1, notAccepted: 3 });
  });

  it('shows what each of several runs side by side made of a line', () => {
    const { view } = read('V (mL),pH A,pH B\n0,3,4\n1,4,99\n2,5,6\n');
    expect(view.lines[2].status).toBe('used');
    expect(view.lines[2].runs).toEqual([
      { run: 0, status: 'used' },
      { run: 1, status: 'excluded', why: 'the reading 99 lies beyond pH 0–14' },
    ]);
  });

  it('gives files with the same columns the same key, and others another', () => {
    const key = (text: string) => read(text).headerShape;
    expect(key('V (mL),pH\n0,3\n1,4\n')).toBe(key('V (mL);ph\n0,5;3,1\n7,5;4,1\n9,5;4,2\n'));
    expect(key('V (mL),pH\n0,3\n1,4\n')).not.toBe(key('V (µL),pH\n0,3\n1,4\n'));
    expect(key('0,3\n1,4\n')).not.toBe(key('0,3,1\n1,4,1\n'));
  });

  it('is plain data that can be cloned', () => {
    const whole = read(curve);
    expect(structuredClone(whole)).toEqual(whole);
    expect(JSON.parse(JSON.stringify(whole))).toEqual(whole);
  });
});

describe('applyRowDecisions', () => {
  it('keeps decisions by line over another reading of the file', () => {
    const text = 'V (mL);pH;E (mV)\n0;3,0;200\n1;47;180\n2;4,1;150\n3;5,0;99\n';
    const decisions = {
      3: { use: 'used', by: 'person', why: 'read twice' },
      4: { use: 'excluded', by: 'person', why: 'beaker moved' },
      99: { use: 'excluded', by: 'person', why: 'not there' },
    } as const;
    for (const overrules of [{}, { columns: { 2: { role: 'mV' as const } } }]) {
      const [run] = read(text, overrules).runs;
      const decided = applyRowDecisions(run, decisions);
      expect(decided.rows.map(({ decision }) => decision)).toEqual([
        { use: 'used' },
        decisions[3],
        decisions[4],
        { use: 'used' },
      ]);
      expect(applyRowDecisions(run, {})).toBe(run);
    }
  });
});
