import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import fc from 'fast-check';

const folder = fileURLToPath(new URL('../../reference/exports/', import.meta.url));
const exports = readdirSync(folder)
  .filter((name) => /\.(csv|txt)$/.test(name))
  .map((name) => new Uint8Array(readFileSync(folder + name)));

const TOKENS = [
  ',',
  ';',
  '\t',
  '|',
  ' ',
  '\n',
  '\r',
  '\r\n',
  '"',
  '#',
  '-',
  '.',
  'N/A',
  '1e999',
  '1e308',
  '-7',
  '47',
  'pH',
  'V (L)',
];

const mutation = fc.record({
  at: fc.double({ min: 0, max: 1, noNaN: true }),
  length: fc.nat(12),
  kind: fc.constantFrom('delete', 'repeat', 'token', 'bytes', 'cut'),
  token: fc.constantFrom(...TOKENS),
  bytes: fc.uint8Array({ maxLength: 6 }),
});

function mutate(
  source: Uint8Array,
  { at, length, kind, token, bytes }: typeof mutation extends fc.Arbitrary<infer M> ? M : never,
) {
  const start = Math.floor(at * source.length);
  const before = source.subarray(0, start);
  const after = source.subarray(start + (kind === 'delete' ? length : 0));
  // Cut nearer the end, or little would be left after a few of them.
  if (kind === 'cut') return source.subarray(0, Math.ceil((0.6 + 0.4 * at) * source.length));
  const inserted =
    kind === 'repeat'
      ? source.subarray(start, start + 10 * length)
      : kind === 'token'
        ? new TextEncoder().encode(token)
        : kind === 'bytes'
          ? bytes
          : new Uint8Array(0);
  return Uint8Array.from([...before, ...inserted, ...after]);
}

/** Random bytes, random pieces of tables, and the exports of the reference folder with up to five damages. */
export const arbitraryFile: fc.Arbitrary<Uint8Array> = fc.oneof(
  { weight: 1, arbitrary: fc.uint8Array({ maxLength: 400 }) },
  {
    weight: 1,
    arbitrary: fc
      .array(fc.constantFrom(...TOKENS, '0', '1', '12', '3'), { maxLength: 120 })
      .map((parts) => new TextEncoder().encode(parts.join(''))),
  },
  {
    weight: 18,
    arbitrary: fc
      .tuple(fc.constantFrom(...exports), fc.array(mutation, { minLength: 1, maxLength: 5 }))
      .map(([source, mutations]) => mutations.reduce<Uint8Array>(mutate, source)),
  },
);
