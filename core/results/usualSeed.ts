/** Seed of everything random, unless another is asked for: the same call gives the same numbers. */
export const usualSeed = 1;
