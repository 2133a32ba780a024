import { daviesFunction } from '../chemistry/davies.ts';
import { nominalValue } from '../model/quantity.ts';
import { ReadingScale } from '../model/readingScale.ts';
import type { LadderRung } from './ladderRung.ts';

/** Lowest and highest p[H⁺] of the readings, and a middle ionic strength in mol/L. */
export interface ReadingsReach {
  readonly lowest: number;
  readonly highest: number;
  readonly ionicStrength: number;
}

/** Ionic strength before a curve was computed, mol/L. */
const usualIonicStrength = 0.05;
/** An electrode whose slope is fitted starts from the ideal one, one whose potential is from pH 7 at zero. */
const idealSlope = 1;
const neutral = 7;

/** Where the readings lie, with the electrode as the rung has it, or before it is fitted as the sheet has it. */
export function readingsReach({ run, end }: LadderRung): ReadingsReach {
  const { design, readings } = run.run;
  const scale = new ReadingScale(design);
  scale.take(
    Float64Array.from(design.quantities, (quantity) => {
      const open =
        quantity.role.kind === 'slope'
          ? idealSlope
          : quantity.role.kind === 'standardPotential'
            ? neutral * design.nernstSlope_mV
            : 0;
      return end?.values.get(quantity.id) ?? nominalValue(quantity) ?? open;
    }),
  );
  const ionicStrength =
    end === null ? usualIonicStrength : run.model.ionicStrength.toSorted()[run.model.ionicStrength.length >> 1];
  const activity = design.scale === 'activity' && design.coefficientA > 0;
  const shift = activity ? design.coefficientA * daviesFunction(ionicStrength) : 0;
  let lowest = Number.POSITIVE_INFINITY;
  let highest = Number.NEGATIVE_INFINITY;
  for (const reading of readings) {
    const pH = scale.negativeLog(reading) - shift;
    lowest = Math.min(lowest, pH);
    highest = Math.max(highest, pH);
  }
  return { lowest, highest, ionicStrength };
}

/** pKa minus the p[H⁺] at which the group in that place of a rung is half lost. */
export function shiftOf({ run, constants }: LadderRung, place: number, ionicStrength: number): number {
  const { design } = run.run;
  if (design.coefficientA === 0) return 0;
  const system = design.systems.find(({ prefix, role }) => role === 'analyte' && constants[0] === `${prefix}pKa1`);
  if (system === undefined) throw new Error(`no substance has the constant ${constants[0]}`);
  const acidCharge = system.shape.chargeFullyProtonated - place;
  return (2 - 2 * acidCharge) * design.coefficientA * daviesFunction(ionicStrength);
}
