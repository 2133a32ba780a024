/** Positions of the strong ions in a composition; proton systems follow from `firstSystem` on. */
export const cationsIndex = 0;
export const anionsIndex = 1;
export const firstSystem = 2;
