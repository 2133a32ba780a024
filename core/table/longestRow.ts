/** Longer lines, in characters, are no rows of a titration: they are kept as text and not taken apart. */
export const longestRow = 5000;
