/** Coverage of every interval and bound that is stated. */
export const coverage = 0.95;
