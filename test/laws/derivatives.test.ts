import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Quantity } from '../../core/model/quantity.ts';
import { RunModel } from '../../core/model/runModel.ts';
import { modelOfSheet } from '../modelOfSheet.ts';
import { arbitraryTitration } from './arbitraryTitration.ts';
import { lawOptions } from './lawOptions.ts';
import { richardson } from './richardson.ts';

/** A displacement that moves the readings visibly and stays on one side of zero. */
function largestStep({ role }: Quantity, value: number): number {
  switch (role.kind) {
    case 'acidity':
    case 'ionProduct':
      return 0.05;
    case 'offset':
    case 'slope':
    case 'standardPotential':
      return 0.1;
    case 'extraWater':
      return 0.5;
    default:
      return 0.05 * Math.abs(value);
  }
}

describe('derivatives of the readings agree with independent differences', () => {
  const seen = new Map<string, number>();
  let compared = 0;
  let unseen = 0;

  it('with respect to every quantity, to 1e-6 of the largest of their column', () => {
    fc.assert(
      fc.property(arbitraryTitration, ({ sheet, simulation }) => {
        const { model, values, design } = modelOfSheet(sheet, simulation.volumes_mL);
        const count = simulation.volumes_mL.length;
        const unit = design.readingKind === 'mV' ? design.nernstSlope_mV : 1;
        const wanted = Int32Array.from(design.quantities, (_, q) => q);
        const derivatives = new Float64Array(wanted.length * count);
        const readings = new Float64Array(count);
        expect(model.predict(values, readings)).toBe(true);
        model.differentiate(wanted, derivatives, new Float64Array(count));

        design.quantities.forEach((quantity, q) => {
          const step = largestStep(quantity, values[q]);
          // Nothing can be less than nothing.
          if (step === 0) return;
          const column = derivatives.subarray(q * count, (q + 1) * count);
          const moved = Float64Array.from(values);
          // A column that moves no reading by 1e-5 in pH over the whole step is held to that size: differences
          // of readings good to 1e-13 cannot see less.
          const largest = column.reduce((most, value) => Math.max(most, Math.abs(value)), (1e-5 * unit) / step);
          const differences = richardson(
            (displacement, displaced) => {
              moved[q] = values[q] + displacement;
              model.forget();
              return model.predict(moved, displaced);
            },
            count,
            step,
            3e-7 * largest,
          );
          for (let i = 0; i < count; i++) {
            compared += 1;
            const where = `${quantity.id} = ${values[q]} at ${simulation.volumes_mL[i]} mL`;
            if (Number.isNaN(differences[i])) unseen += 1;
            else expect(Math.abs(column[i] - differences[i]) / largest, where).toBeLessThan(1e-6);
          }
          const kind = quantity.id.replace(/\d/g, '');
          seen.set(kind, (seen.get(kind) ?? 0) + 1);
        });
      }),
      lawOptions(60),
    );
  });

  it('among them every kind of quantity', () => {
    const kinds = [
      'pKa',
      'concentration',
      'analyte.pKa',
      'analyte.concentration',
      'counterIon.pKa',
      'carbonate.pKa',
      'titrant.system.pKa',
      'titrant.system.concentration',
      'titrant.cations',
      'titrant.anions',
      'titrant.concentration',
      'titrant.carbonate',
      'titrant.strongIon',
      'titrant.background',
      'sample.cations',
      'sample.anions',
      'sample.carbonate',
      'sample.strongIon',
      'sample.background',
      'sample.volume',
      'sample.extraWater',
      'medium.pKw',
      'burette.gain',
      'reading.offset',
      'reading.E',
      'reading.slope',
      'reading.junctionHydrogen',
      'reading.junctionHydroxide',
    ];
    for (const kind of kinds) expect(seen.get(kind) ?? 0, kind).toBeGreaterThanOrEqual(3);
    expect([...seen.keys()].filter((kind) => !kinds.includes(kind))).toEqual([]);
  });

  it('with respect to the volume', () => {
    fc.assert(
      fc.property(arbitraryTitration, ({ sheet, simulation }) => {
        // From 0.05 mL on: a displaced volume must not be negative.
        const volumes = Float64Array.from(simulation.volumes_mL).filter((volume) => volume > 0.05);
        const count = volumes.length;
        if (count === 0) return;
        const { model, values, design } = modelOfSheet(sheet, volumes);
        const slopes = new Float64Array(count);
        expect(model.predict(values, new Float64Array(count))).toBe(true);
        model.differentiate(new Int32Array(0), new Float64Array(0), slopes);
        const largest = slopes.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
        const differences = richardson(
          (displacement, displaced) =>
            new RunModel(
              design,
              volumes.map((volume) => volume + displacement),
              null,
            ).predict(values, displaced),
          count,
          0.02,
          3e-7 * largest,
        );
        for (let i = 0; i < count; i++) {
          compared += 1;
          if (Number.isNaN(differences[i])) unseen += 1;
          else expect(Math.abs(slopes[i] - differences[i]) / largest, `${volumes[i]} mL`).toBeLessThan(1e-6);
        }
      }),
      lawOptions(80),
    );
  });

  it('and hardly anywhere are the differences themselves in doubt', () => {
    expect(unseen).toBeLessThan(0.001 * compared);
  });
});
