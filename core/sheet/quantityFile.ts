import * as v from 'valibot';
import { type NumberRange, numberIn, objectOf, positive, text } from './sheetParts.ts';
import type { ToleranceDistribution } from './toleranceToUncertainty.ts';

/**
 * A quantity as it stands in a sheet file: a bare number is fixed, a value with
 * its uncertainty (standard, expanded or a tolerance) is known, the rest is fitted.
 */
export type QuantityFile =
  | number
  | 'fitted'
  | { readonly fitted: true; readonly start?: number | undefined }
  | { readonly value: number; readonly u: number; readonly source?: string | undefined }
  | { readonly value: number; readonly U: number; readonly k: number; readonly source?: string | undefined }
  | {
      readonly value: number;
      readonly tolerance: number;
      readonly distribution: ToleranceDistribution;
      readonly source?: string | undefined;
    };

const everyForm = 'a number, "fitted", or a value with its uncertainty such as {"value": 1.23, "u": 0.01}';
const source = v.optional(text);

/** Schema of a quantity whose values lie in a range. The form is told from its keys, so that a refusal names what is wrong in it. */
export function quantityIn(range: NumberRange): v.GenericSchema<unknown, QuantityFile> {
  const value = numberIn(range);
  const word = v.literal('fitted', everyForm);
  const fitted = objectOf({ fitted: v.literal(true, 'true'), start: v.optional(value) });
  const standard = objectOf(
    { value, u: positive, source },
    'A value in braces needs its uncertainty: "u", "U" with "k", or "tolerance" with "distribution"; a fixed value is the number alone.',
  );
  const expanded = objectOf({ value, U: positive, k: positive, source });
  const tolerance = objectOf({
    value,
    tolerance: positive,
    distribution: v.picklist(['rectangular', 'triangular', 'normal'], '"rectangular", "triangular" or "normal"'),
    source,
  });
  return v.lazy((input): v.GenericSchema<unknown, QuantityFile> => {
    if (typeof input === 'number') return value;
    if (typeof input !== 'object' || input === null || Array.isArray(input)) return word;
    if ('fitted' in input || 'start' in input) return fitted;
    if ('U' in input || 'k' in input) return expanded;
    if ('tolerance' in input || 'distribution' in input) return tolerance;
    return standard;
  });
}
