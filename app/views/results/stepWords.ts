import type { EquivalenceStep } from './groupEquivalence.ts';

/** What a step is called: its number, and whose it is where that is not plain. */
export interface StepWords {
  readonly name: string;
  readonly remark: string;
}

/** @param steps in the order of the table */
export function stepWords(steps: readonly EquivalenceStep[]): readonly StepWords[] {
  const named = new Set(steps.flatMap(({ analyte }) => (analyte === '' ? [] : [analyte])));
  const hasFit = steps.some(({ fit }) => fit.length > 0);
  return steps.map(({ analyte, step }) => {
    // The readings step where nothing in the conditions says that they should.
    if (analyte === '')
      return hasFit ? { name: 'a step', remark: 'of the readings alone' } : { name: `${step}`, remark: '' };
    if (step === 0 || /^strong (acid|base)$/.test(analyte)) return { name: analyte, remark: '' };
    return { name: `${step}`, remark: named.size > 1 ? analyte : '' };
  });
}
