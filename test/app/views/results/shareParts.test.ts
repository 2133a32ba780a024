import { expect, test } from 'vitest';
import { namedSources, shareParts } from '../../../../app/views/results/shareParts.ts';

const labels = new Map([['burette.gain', 'burette gain']]);
const shares = [
  { source: 'burette.gain', share: 0.6 },
  { source: 'reading noise', share: 0.3 },
  { source: 'pipette', share: 0.06 },
  { source: 'bottle', share: 0.03 },
  { source: 'offset', share: 0.01 },
];

test('the largest parts of a variance are named, the small ones told together, and all make 100', () => {
  const parts = shareParts(shares, namedSources([{ shares }]), labels);
  expect(parts.map(({ name, percent }) => `${percent} ${name}`)).toEqual([
    '60 burette gain',
    '30 reading noise',
    '6 pipette',
    '4 others',
  ]);
  expect(parts[3].look).toBe(null);
});

test('a source looks the same everywhere, and reading noise is the solid one', () => {
  const other = [
    { source: 'pipette', share: 0.9 },
    { source: 'reading noise', share: 0.1 },
  ];
  const sources = namedSources([{ shares }, { shares: other }]);
  const lookOf = (list: typeof shares, name: string) =>
    shareParts(list, sources, labels).find((part) => part.name === name)?.look;
  expect(lookOf(shares, 'reading noise')).toBe(0);
  expect(lookOf(other, 'pipette')).toBe(lookOf(shares, 'pipette'));
  expect(lookOf(other, 'pipette')).not.toBe(lookOf(shares, 'burette gain'));
});

test('a single part is all of it, and no uncertainty has no parts', () => {
  expect(shareParts([{ source: 'reading noise', share: 1 }], ['reading noise'], labels)).toMatchObject([
    { name: 'reading noise', percent: 100 },
  ]);
  expect(shareParts([], [], labels)).toEqual([]);
});
