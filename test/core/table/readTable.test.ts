import { describe, expect, it } from 'vitest';
import { readTable } from '../../../core/table/readTable.ts';
import type { Table } from '../../../core/table/table.ts';

function fromText(text: string): Table {
  const outcome = readTable(new TextEncoder().encode(text), 'table.csv');
  if (!outcome.ok) throw new Error(outcome.refusals[0].message);
  return outcome.value;
}

describe('readTable', () => {
  it('keeps settings above the table with their lines, keys and values', () => {
    const { preamble, sections } = fromText(
      'Report 12\nSample volume: 25,00 mL\nTitrant;NaOH;0,1000\n\nV;pH\n0,00;2,5\n1,00;2,9\n2,00;3,2\n',
    );
    expect(preamble).toEqual([
      { line: 1, text: 'Report 12' },
      { line: 2, text: 'Sample volume: 25,00 mL', key: 'Sample volume', value: '25,00 mL' },
      { line: 3, text: 'Titrant;NaOH;0,1000', key: 'Titrant', value: 'NaOH 0,1000' },
    ]);
    expect(sections).toMatchObject([{ headerLine: 5, headerLines: [5], names: ['V', 'pH'], width: 2 }]);
    expect(sections[0].rows[2]).toEqual({ line: 8, cells: ['2,00', '3,2'] });
    expect([...sections[0].values[1]]).toEqual([2.5, 2.9, 3.2]);
  });

  it('tells captions, header and units row apart', () => {
    const [section] = fromText('A;;B;\nV;pH;V;pH\nmL;-;mL;-\n0;3;0;4\n1;5;1;6\n').sections;
    expect(section).toMatchObject({
      headerLine: 2,
      headerLines: [1, 2, 3],
      names: ['V', 'pH', 'V', 'pH'],
      units: ['mL', '-', 'mL', '-'],
      captions: ['A', 'A', 'B', 'B'],
    });
  });

  it('keeps remarks between and below the rows, and rows with something missing in their place', () => {
    const { sections, remarks } = fromText('V,pH\n0,N/A\n1,3.5\nrefill\n2,\n3,bad\n4,4.5\nN/A,N/A\n\nEnd of run\n');
    expect(sections.map(({ rows }) => rows.map(({ line }) => line))).toEqual([[2, 3, 5, 6, 7, 8]]);
    expect(remarks).toEqual([
      { line: 4, text: 'refill' },
      { line: 10, text: 'End of run' },
    ]);
  });

  it('does not take a damaged row for a header', () => {
    const { sections } = fromText('V,pH\n0,3.1\n1,3.5\nab,cd\n2,3.9\n3,4.4\n');
    expect(sections).toHaveLength(1);
    expect(sections[0].rows.map(({ line }) => line)).toEqual([2, 3, 4, 5, 6]);
  });

  it('keeps a row of settings with figures above a longer table as text', () => {
    const { preamble, sections } = fromText('Buffers;4,01;7,00\nV;pH\n0,0;3,1\n0,5;3,5\n1,0;3,7\n1,5;3,9\n2,0;4,4\n');
    expect(preamble.map(({ line }) => line)).toEqual([1]);
    expect(sections).toHaveLength(1);
  });

  it('shows a very long line as text and is not slowed down by it', () => {
    const { preamble, remarks } = fromText(`V,pH\n0,3.1\n1,3.5\n${'9,'.repeat(200_000)}\n2,3.9\n`);
    expect(preamble).toEqual([]);
    expect(remarks).toMatchObject([{ line: 4 }]);
    // Text is kept up to 1000 characters and a mark that it goes on.
    expect(remarks[0].text).toHaveLength(1001);
  });
});
