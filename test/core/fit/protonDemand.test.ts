import { describe, expect, it } from 'vitest';
import { protonDemand } from '../../../core/fit/protonDemand.ts';
import { nominalValue } from '../../../core/model/quantity.ts';
import { type Experiment, experimentProblem, perform } from '../../experiment.ts';

function demandOf(experiment: Experiment) {
  const [run] = experimentProblem(experiment).runs;
  const values = Float64Array.from(run.design.quantities, (quantity) => nominalValue(quantity) ?? 0);
  return { demand: protonDemand(run, values), simulated: perform(experiment) };
}

describe('protons lost, from the readings alone', () => {
  it.each([
    ['a diprotic acid', { pKa: [3.5, 7.5], end_mL: 6.5 }],
    ['an ampholyte weighed as its hydrochloride', { pKa: [3, 9], chargeFullyProtonated: 1, end_mL: 6.5 }],
    ['a salt with an acid', { pKa: [4.8], protonsLostAsWeighed: 1, titrant: 'acid', end_mL: 3.6 }],
  ] as const satisfies readonly (readonly [string, Experiment])[])(
    'of %s are those of the forms present',
    (_, experiment) => {
      const { demand, simulated } = demandOf(experiment);
      const weighed = 'protonsLostAsWeighed' in experiment ? experiment.protonsLostAsWeighed : 0;
      simulated.points.forEach((point, i) => {
        const [forms] = point.speciesConcentrations;
        const total = forms.reduce((sum, concentration) => sum + concentration, 0);
        const lost = forms.reduce((sum, concentration, k) => sum + k * concentration, 0) / total - weighed;
        // 0.01 mol/L of sample; charge balance closes to rounding of the pH, 1e-13 relative to 0.1 mol/L.
        expect(Math.abs(demand.lost[i] - 0.01 * lost), `at ${simulated.volumes_mL[i]} mL`).toBeLessThan(1e-10);
        expect(demand.pH[i]).toBeCloseTo(point.pH_concentration, 10);
      });
    },
  );

  it('with Davies is near enough for a start', () => {
    const { demand, simulated } = demandOf({ pKa: [4.8], end_mL: 3.6, activity: 'davies', background_M: 0.1 });
    simulated.points.forEach((point, i) => {
      // The ionic strength is a rough count: a hundredth in pH.
      expect(Math.abs(demand.pH[i] - point.pH_concentration)).toBeLessThan(0.01);
      expect(demand.ionicStrength[i] / point.ionicStrength).toBeCloseTo(1, 1);
    });
  });
});
