import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ChargeBalance } from '../../core/chemistry/chargeBalance.ts';
import { daviesFunction } from '../../core/chemistry/davies.ts';
import { anionsIndex, cationsIndex, firstSystem } from '../../core/chemistry/mixture.ts';
import type { RunModel } from '../../core/model/runModel.ts';
import { Vessels } from '../../core/model/vessels.ts';
import { modelOfSheet } from '../modelOfSheet.ts';
import { arbitraryTitration } from './arbitraryTitration.ts';
import { lawOptions } from './lawOptions.ts';

/**
 * Shares of all forms from the products of their constants, on a logarithmic
 * scale; the code under test multiplies weights.
 */
function sharesOf(pKa: ArrayLike<number>, z0: number, negativeLogHydrogen: number, daviesTerm: number): number[] {
  const logWeights = [0];
  for (let lost = 1; lost <= pKa.length; lost++) {
    const acidCharge = z0 - lost + 1;
    const constant = pKa[lost - 1] - 2 * (1 - acidCharge) * daviesTerm;
    logWeights.push(logWeights[lost - 1] + negativeLogHydrogen - constant);
  }
  const largest = Math.max(...logWeights);
  const sum = logWeights.reduce((total, weight) => total + 10 ** (weight - largest), 0);
  return logWeights.map((weight) => 10 ** (weight - largest) / sum);
}

const real = (min: number, max: number) =>
  fc.integer({ min: 0, max: 1000 }).map((part) => min + ((max - min) * part) / 1000);

describe('fractions', () => {
  it('sum to 1 at every pH, and are those of the constants', () => {
    const law = fc.property(
      fc.array(real(-1, 14), { minLength: 1, maxLength: 6 }),
      fc.integer({ min: -3, max: 4 }),
      real(-1, 15),
      real(0, 0.5),
      fc.constantFrom(0, 0.5116),
      (constants, chargeFullyProtonated, pH, ionicStrength, coefficientA) => {
        const pKa = constants.sort((a, b) => a - b);
        const balance = new ChargeBalance([{ groups: pKa.length, chargeFullyProtonated }], coefficientA);
        balance.setConstants(pKa, 14);
        balance.evaluate(Float64Array.of(0, 0, 0.01), -pH * Math.LN10, ionicStrength);
        const daviesTerm = coefficientA * daviesFunction(ionicStrength);
        const expected = sharesOf(pKa, chargeFullyProtonated, pH, daviesTerm);
        let sum = 0;
        balance.weights.forEach((weight, form) => {
          const fraction = weight * balance.inverseSum[0];
          expect(fraction).toBeGreaterThanOrEqual(0);
          // Up to 200 in the exponent of e, each good to as many roundings.
          expect(Math.abs(fraction - expected[form])).toBeLessThan(1e-13);
          sum += fraction;
        });
        expect(Math.abs(sum - 1)).toBeLessThan(1e-14);
      },
    );
    fc.assert(law, lawOptions(1000));
  });
});

describe('charge balance', () => {
  it('closes at every point of a run, relative to the sum of its terms', () => {
    const law = fc.property(arbitraryTitration, ({ sheet, simulation }) => {
      const { model, values, design } = modelOfSheet(sheet, simulation.volumes_mL);
      expect(model.predict(values, new Float64Array(model.volumes.length))).toBe(true);
      const vessels = new Vessels(design);
      vessels.take(values);
      const mixture = new Float64Array(firstSystem + design.systems.length);
      for (let i = 0; i < model.volumes.length; i++) {
        vessels.mix(vessels.gain * model.volumes[i], mixture);
        const ionicStrength = model.ionicStrength[i];
        const daviesTerm = design.coefficientA * daviesFunction(ionicStrength);
        const pH = -model.logHydrogen[i] / Math.LN10;
        const terms = [
          mixture[cationsIndex],
          -mixture[anionsIndex],
          10 ** -pH,
          -(10 ** (pH - vessels.pKw + 2 * daviesTerm)),
        ];
        let ions = mixture[cationsIndex] + mixture[anionsIndex] + terms[2] - terms[3];
        design.systems.forEach(({ shape, firstGroup }, s) => {
          const pKa = vessels.pKa.subarray(firstGroup, firstGroup + shape.groups);
          sharesOf(pKa, shape.chargeFullyProtonated, pH, daviesTerm).forEach((share, lost) => {
            const charge = shape.chargeFullyProtonated - lost;
            terms.push(charge * share * mixture[firstSystem + s]);
            ions += charge * charge * share * mixture[firstSystem + s];
          });
        });
        const sum = terms.reduce((total, term) => total + term, 0);
        const size = terms.reduce((total, term) => total + Math.abs(term), 0);
        // Newton stops where ln[H⁺] and ln I are good to about 1e-11; highly charged forms move by several times as much.
        expect(Math.abs(sum) / size, `${model.volumes[i]} mL`).toBeLessThan(1e-9);
        // Without an activity model nothing depends on the ionic strength, and it lags behind by the last step.
        const lag = design.coefficientA > 0 ? 1e-9 : 3e-4;
        expect(Math.abs(ions / 2 - ionicStrength) / ionicStrength, `${model.volumes[i]} mL`).toBeLessThan(lag);
      }
    });
    fc.assert(law, lawOptions(300));
  });

  it('rises strictly with ln[H⁺] at fixed ionic strength, whatever is in the mixture', () => {
    const law = fc.property(
      arbitraryTitration,
      real(-1, 14.9),
      real(0.001, 0.5),
      ({ sheet, simulation }, pH, ionic) => {
        const { design, values, model } = modelOfSheet(sheet, simulation.volumes_mL);
        const vessels = new Vessels(design);
        vessels.take(values);
        const mixture = new Float64Array(firstSystem + design.systems.length);
        vessels.mix(simulation.volumes_mL[1], mixture);
        const { balance } = model.equilibrium;
        balance.setConstants(vessels.pKa, vessels.pKw);
        const net = (x: number) => {
          balance.evaluate(mixture, x, ionic);
          return balance.gained - balance.given;
        };
        const x = -pH * Math.LN10;
        // 0.1 in pH changes H⁺ or OH⁻ by a fifth: at least 1e-8 mol/L, above the rounding of a balance of 1 mol/L.
        expect(net(x)).toBeGreaterThan(net(x - 0.1 * Math.LN10));
      },
    );
    fc.assert(law, lawOptions(300));
  });
});

describe('pH', () => {
  const readingsOf = (model: RunModel, values: Float64Array) => {
    const readings = new Float64Array(model.volumes.length);
    expect(model.predict(values, readings)).toBe(true);
    return model.logHydrogen.map((x) => -x / Math.LN10);
  };

  it('rises strictly with every dose of a titrant more basic than the sample', () => {
    let runs = 0;
    const law = fc.property(arbitraryTitration, ({ sheet, simulation }) => {
      // With Davies the salt of a titrant can lower the pH of a buffer more than its base raises it.
      const ideal = { ...sheet, medium: { ...sheet.medium, activity: 'none' as const } };
      const volumes = [...new Set(Array.from(simulation.volumes_mL))];
      const { model, values } = modelOfSheet(ideal, [...volumes, 1e9]);
      const pH = readingsOf(model, values);
      const titrantPH = pH[volumes.length];
      const sign = Math.sign(titrantPH - pH[0]);
      runs += 1;
      // Any titrant draws the pH towards its own, from either side.
      for (let i = 1; i <= volumes.length; i++) expect(sign * (pH[i] - pH[i - 1])).toBeGreaterThan(0);
    });
    fc.assert(law, lawOptions(300));
    expect(runs).toBe(300);
  });

  it('rises strictly with added base in ordinary titrations with Davies', () => {
    const law = fc.property(
      fc.array(real(2.5, 10.5), { minLength: 1, maxLength: 3 }),
      fc.integer({ min: 0, max: 2 }),
      real(0.005, 0.03),
      (constants, chargeFullyProtonated, concentration_M) => {
        const pKa = constants.sort((a, b) => a - b);
        const volumes = Array.from({ length: 60 }, (_, i) => 0.5 * i);
        const { model, values } = modelOfSheet(
          {
            sheet: 1,
            sample: {
              volume_mL: 25,
              background_M: 0.1,
              carbonate_M: 0,
              analytes: [{ groups: pKa.length, pKa, chargeFullyProtonated, protonsLostAsWeighed: 0, concentration_M }],
            },
            titrant: { kind: 'base', concentration_M: 0.1, carbonate_M: 0, background_M: 0 },
            medium: { temperature_C: 25, activity: 'davies' },
            reading: { kind: 'pH', scale: 'activity', offset: 0, slope: 1 },
          },
          volumes,
        );
        const readings = new Float64Array(volumes.length);
        expect(model.predict(values, readings)).toBe(true);
        for (let i = 1; i < volumes.length; i++) expect(readings[i]).toBeGreaterThan(readings[i - 1]);
      },
    );
    fc.assert(law, lawOptions(150));
  });
});
