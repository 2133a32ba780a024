import type { RunDesign } from '../model/runDesign.ts';
import type { Speciation } from '../speciation/speciation.ts';
import { numberOrNull } from './numberOrNull.ts';
import type { SpeciationResult } from './runResult.ts';

/** Spacing of the grid in pH: fine enough that crossings look crossed. */
const spacing = 0.02;
/** How far the grid reaches beyond the readings, and the range it keeps to. */
const margin = 1;
const scaleRange = { lowest: -1, highest: 15 } as const;

/** Shares of all forms over the pH range of a run, with the constants of its scale. */
export function describeSpeciation(
  design: RunDesign,
  speciation: Speciation,
  readingRange: readonly [number, number],
): SpeciationResult | null {
  if (design.systems.length === 0) return null;
  const low = Math.max(scaleRange.lowest, Math.floor((readingRange[0] - margin) / spacing) * spacing);
  const high = Math.min(scaleRange.highest, readingRange[1] + margin);
  const pH = Float64Array.from(
    { length: Math.max(2, Math.ceil((high - low) / spacing) + 1) },
    (_, k) => low + k * spacing,
  );
  return {
    pH,
    systems: design.systems.map((system, s) => {
      const { groups, chargeFullyProtonated } = system.shape;
      const fractions = Array.from({ length: groups + 1 }, () => new Float64Array(pH.length));
      pH.forEach((value, i) => {
        speciation.fractionsAt(s, value).forEach((fraction, k) => {
          fractions[k][i] = fraction;
        });
      });
      const isoelectric = speciation.isoelectricPoint(s);
      return {
        name: system.name,
        prefix: system.prefix,
        role: system.role,
        forms: fractions.map((fraction, k) => ({ charge: chargeFullyProtonated - k, protons: groups - k, fraction })),
        crossings: Array.from({ length: groups }, (_, group) => ({
          quantityId: `${system.prefix}pKa${group + 1}`,
          group,
          pH: speciation.crossing(s, group),
        })),
        isoelectricPoint: isoelectric === null ? null : numberOrNull(isoelectric),
      };
    }),
  };
}
