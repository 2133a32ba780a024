import * as v from 'valibot';

// The building blocks of the schema of a sheet. Each message names what belongs in the place, as a refusal says it.

/** Range in which a number makes sense. */
export interface NumberRange {
  readonly lowest: number;
  readonly highest: number;
  /** True where the lowest value itself is excluded. */
  readonly open?: boolean;
}

/** A finite number from a range. */
export function numberIn({ lowest, highest, open = false }: NumberRange) {
  const words = open ? `a number above ${lowest} and up to ${highest}` : `a number from ${lowest} to ${highest}`;
  return v.pipe(
    v.number(words),
    v.check((value) => (open ? value > lowest : value >= lowest) && value <= highest, words),
  );
}

/** A whole number from a range. */
export function integerIn(lowest: number, highest: number) {
  const words = `a whole number from ${lowest} to ${highest}`;
  return v.pipe(
    v.number(words),
    v.check((value) => Number.isInteger(value) && value >= lowest && value <= highest, words),
  );
}

/** A standard uncertainty, a coverage factor or a ratio. */
export const positive = v.pipe(
  v.number('a number above 0'),
  v.check((value) => value > 0 && Number.isFinite(value), 'a number above 0'),
);

/** An uncertainty that may be nothing. */
export const notNegative = v.pipe(
  v.number('a number that is not negative'),
  v.check((value) => value >= 0 && Number.isFinite(value), 'a number that is not negative'),
);

/** A text, which may be empty. */
export const anyText = v.string('a text in quotes');

/** A text that says something. */
export const text = v.pipe(
  anyText,
  v.check((value) => value.trim() !== '', 'a text that is not empty'),
);

/** A list of a number of entries. */
export function listOf<Entry extends v.GenericSchema>(entry: Entry, lowest: number, highest: number) {
  const words = `a list of ${lowest === 0 ? 'up to' : `${lowest} to`} ${highest} entries in square brackets`;
  return v.pipe(
    v.array(entry, words),
    v.check((list) => list.length >= lowest && list.length <= highest, words),
  );
}

/**
 * An object of exactly these keys.
 *
 * @param ifMissing what to do where a key is missing that must be there
 */
export function objectOf<Entries extends v.ObjectEntries>(entries: Entries, ifMissing?: string) {
  const known = Object.keys(entries)
    .map((key) => `"${key}"`)
    .join(', ');
  return v.pipe(
    v.custom<object>(
      (input) => typeof input === 'object' && input !== null && !Array.isArray(input),
      'a group of keys in braces',
    ),
    v.strictObject(entries, (issue) =>
      issue.expected === 'never'
        ? `Known here are ${known}. Correct the spelling or take the key out; one that is not understood is never passed over.`
        : (ifMissing ?? `Add it; known here are ${known}.`),
    ),
  );
}
