import { describe, expect, it } from 'vitest';
import { splitCells } from '../../../core/table/splitCells.ts';

describe('splitCells', () => {
  it('gives one row of cells for each line, blank lines too', () => {
    expect(splitCells(['a;b', '', ';1', 'c'], ';')).toEqual([['a', 'b'], [''], ['', '1'], ['c']]);
    expect(splitCells([''], ',')).toEqual([['']]);
    expect(splitCells(['  1.0   2.0 ', 'a b'], 'spaces')).toEqual([
      ['1.0', '2.0'],
      ['a', 'b'],
    ]);
  });

  it('takes quotes off and keeps delimiters inside them', () => {
    expect(splitCells(['"0,00","2,51"', '"say ""pH""",x'], ',')).toEqual([
      ['0,00', '2,51'],
      ['say "pH"', 'x'],
    ]);
  });

  it('joins a cell that is quoted over several lines, and leaves its other lines without cells', () => {
    expect(splitCells(['"Volume', '(mL)","pH"', '1,2'], ',')).toEqual([['Volume (mL)', 'pH'], [], ['1', '2']]);
  });

  it('lets no stray quote swallow the lines after it', () => {
    const lines = ['V,pH', '"0,2.5', '1,2.6', '2,"2.7', '3,2.8', '4,5" tube,x', '5,3.0'];
    const cells = splitCells(lines, ',');
    expect(cells).toHaveLength(lines.length);
    expect([cells[2], cells[4], cells[6]]).toEqual([
      ['1', '2.6'],
      ['3', '2.8'],
      ['5', '3.0'],
    ]);
  });
});
