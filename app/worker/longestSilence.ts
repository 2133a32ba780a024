/** Milliseconds between two signs of life of a worker; only an endless loop or a lost worker takes longer. */
export const longestSilence = 60_000;
