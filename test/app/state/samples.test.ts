import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { samples } from '../../../app/state/samples.ts';
import { parseSheet, readRuns } from '../../../core/index.ts';

const folder = new URL('../../../sample-data/', import.meta.url);

test('samples are the very bytes of their files', () => {
  expect(samples).toHaveLength(5);
  for (const { fileName, text } of samples) {
    const bytes = readFileSync(new URL(fileName, folder));
    expect(Buffer.from(text, 'utf8').equals(bytes), fileName).toBe(true);
  }
});

test('each can be read, and so can its sheet', () => {
  for (const { fileName, text, sheet } of samples) {
    expect(readRuns(new TextEncoder().encode(text), fileName), fileName).toMatchObject({ ok: true });
    expect(parseSheet(sheet, fileName), fileName).toMatchObject({ ok: true });
  }
});
