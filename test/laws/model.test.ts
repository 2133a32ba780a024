import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { nominalValue } from '../../core/model/quantity.ts';
import { designRun } from '../../core/model/runDesign.ts';
import { RunModel } from '../../core/model/runModel.ts';
import { completeSheet } from '../../core/sheet/completeSheet.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { simulateRun } from '../simulator/simulateRun.ts';
import { arbitraryTitration } from './arbitraryTitration.ts';

const seed = 20261;

function modelOf(sheet: SheetFile, volumes: Float64Array, start: Float64Array | null) {
  const complete = completeSheet(sheet, { readingKind: 'pH', titrantKind: 'base', groupsIfOpen: 1 });
  if (!complete.ok) throw new Error(JSON.stringify(complete.refusals));
  const design = designRun(complete.value);
  const values = Float64Array.from(design.quantities, (quantity) => nominalValue(quantity) ?? Number.NaN);
  return { design, values, model: new RunModel(design, volumes, start) };
}

describe('the model of a run', () => {
  it('agrees with the independent simulator over random mixtures', () => {
    fc.assert(
      fc.property(arbitraryTitration, ({ sheet, simulation }) => {
        const simulated = simulateRun(simulation);
        const volumes = Float64Array.from(simulation.volumes_mL);
        const { model, values, design } = modelOf(sheet, volumes, null);
        const readings = new Float64Array(volumes.length);
        expect(model.predict(values, readings)).toBe(true);
        // 1e-8 in pH: both solvers carry the charge balance to rounding; the simulator bisects to 1e-13 in pH.
        const unit = design.readingKind === 'mV' ? design.nernstSlope_mV : 1;
        for (let i = 0; i < volumes.length; i++)
          expect(Math.abs(readings[i] - simulated.readings[i]) / unit).toBeLessThan(1e-8);
      }),
      { seed, numRuns: 300 },
    );
  });
});
