import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { usualSeed } from '../../core/index.ts';
import { section } from './section.ts';

const readme = readFileSync(new URL('../../README.md', import.meta.url), 'utf8');

it('the README states the seed that is used', () => {
  const row = section(readme, 'The JSON document').rows.find(({ names }) => names.includes('seed'));
  expect(row?.cells[1]).toContain(`, \`${usualSeed}\`;`);
});
