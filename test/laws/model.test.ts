import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { modelOfSheet } from '../modelOfSheet.ts';
import { simulateRun } from '../simulator/simulateRun.ts';
import { arbitraryTitration } from './arbitraryTitration.ts';
import { lawOptions } from './lawOptions.ts';

describe('predicted readings', () => {
  it('agree with the independent simulator over random mixtures', () => {
    fc.assert(
      fc.property(arbitraryTitration, ({ sheet, simulation, junctionHydrogen, junctionHydroxide }) => {
        const simulated = simulateRun(simulation);
        const { model, values, design } = modelOfSheet(sheet, simulation.volumes_mL);
        const readings = new Float64Array(simulation.volumes_mL.length);
        expect(model.predict(values, readings)).toBe(true);
        // 1e-8 in pH: both solvers carry the charge balance to rounding; the simulator bisects to 1e-13 in pH.
        const unit = design.readingKind === 'mV' ? design.nernstSlope_mV : 1;
        simulated.points.forEach(({ hydrogen_M, hydroxide_M }, i) => {
          const expected = simulated.readings[i] + junctionHydrogen * hydrogen_M + junctionHydroxide * hydroxide_M;
          expect(Math.abs(readings[i] - expected) / unit).toBeLessThan(1e-8);
        });
      }),
      lawOptions(150),
    );
  });

  it('do not depend on what was predicted before', () => {
    fc.assert(
      fc.property(arbitraryTitration, ({ sheet, simulation }) => {
        const { model, values, design } = modelOfSheet(sheet, simulation.volumes_mL);
        const count = simulation.volumes_mL.length;
        const cold = new Float64Array(count);
        const warm = new Float64Array(count);
        expect(model.predict(values, cold)).toBe(true);
        const elsewhere = values.map((value, q) =>
          design.quantities[q].role.kind === 'acidity' ? value + 0.3 : value,
        );
        expect(model.predict(elsewhere, warm)).toBe(true);
        expect(model.predict(values, warm)).toBe(true);
        // Where the charge balance is flattest, rounding alone moves the root by about 1e-11.
        const unit = design.readingKind === 'mV' ? design.nernstSlope_mV : 1;
        for (let i = 0; i < count; i++) expect(Math.abs(warm[i] - cold[i]) / unit).toBeLessThan(1e-10);
      }),
      lawOptions(200),
    );
  });
});
