import { expect, test } from 'vitest';
import { shareWords } from '../../../../app/views/results/shareWords.ts';

const labels = new Map([['burette.gain', 'burette gain']]);
const plain = (text: string | null) => text?.replaceAll('\u00a0', ' ');

test('the largest parts of a variance are named, the small ones told together', () => {
  const shares = [
    { source: 'reading noise', share: 0.6 },
    { source: 'burette.gain', share: 0.3 },
    { source: 'pipette', share: 0.06 },
    { source: 'bottle', share: 0.03 },
    { source: 'offset', share: 0.01 },
  ];
  expect(plain(shareWords(shares, labels))).toBe('60 % reading noise, 30 % burette gain, 6 % pipette, 4 % others');
});

test('a single part is all of it, and no uncertainty has no parts', () => {
  expect(plain(shareWords([{ source: 'reading noise', share: 1 }], labels))).toBe('100 % reading noise');
  expect(shareWords([], labels)).toBe(null);
});
