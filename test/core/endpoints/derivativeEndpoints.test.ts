import { describe, expect, it } from 'vitest';
import { derivativeEndpoints } from '../../../core/endpoints/derivativeEndpoints.ts';
import { seededNoise } from '../../simulator/seededNoise.ts';
import { nernstSlope_mV } from '../../simulator/simulateRun.ts';
import { curve, evenVolumes, PHOSPHORIC_PKA } from './simulatedCurves.ts';

describe('without noise', () => {
  it('finds a strong acid within the spacing of the points, wherever the step falls between them', () => {
    for (const shift of [0, 0.02, 0.04, 0.06, 0.08]) {
      const volumes_mL = evenVolumes(200, 19.9).map((v) => v + shift);
      const run = curve({ pKa: [], concentration_M: 0.05, volumes_mL });
      const endpoints = derivativeEndpoints(run.volumes_mL, run.readings);
      expect(endpoints.length).toBe(1);
      // 12.5 mL; half an interval of 0.1 mL is what the grid leaves open.
      expect(Math.abs(endpoints[0].volume_mL - 12.5)).toBeLessThan(0.05);
      expect(Math.abs((endpoints[0].secondDerivativeZero_mL ?? 0) - 12.5)).toBeLessThan(0.05);
      expect(Math.abs(endpoints[0].volume_mL - 12.5)).toBeLessThan(2 * endpoints[0].u_mL);
    }
  });

  it('comes ever closer as the points grow denser', () => {
    const misses = [0.5, 0.05, 0.005].map((spacing) => {
      const around = Array.from({ length: 41 }, (_, i) => 12.5 + (i - 20.3) * spacing);
      const run = curve({ pKa: [], concentration_M: 0.05, volumes_mL: [0, 1, ...around] });
      const [endpoint] = derivativeEndpoints(run.volumes_mL, run.readings);
      return Math.abs(endpoint.volume_mL - 12.5) / spacing;
    });
    for (const miss of misses) expect(miss).toBeLessThan(0.5);
  });

  it('finds two steps of phosphoric acid, not three', () => {
    const run = curve({ pKa: PHOSPHORIC_PKA, concentration_M: 0.05, volumes_mL: evenVolumes(251, 50) });
    const endpoints = derivativeEndpoints(run.volumes_mL, run.readings);
    // Equivalence at 12.5 and 25 mL; the grid has 0.2 mL, and the inflections lie within 0.01 mL of them.
    expect(endpoints.length).toBe(2);
    expect(Math.abs(endpoints[0].volume_mL - 12.5)).toBeLessThan(0.05);
    expect(Math.abs(endpoints[1].volume_mL - 25)).toBeLessThan(0.05);
    expect(endpoints[0].slope).toBeGreaterThan(0);
    expect(endpoints[0].height).toBeGreaterThan(4);
    expect(Math.abs(endpoints[1].reading - (7.198 + 12.35) / 2)).toBeLessThan(0.3);
  });

  it('sees the inflection of a very weak acid where it is, not at the equivalence', () => {
    const run = curve({ pKa: [9.8], concentration_M: 0.05, volumes_mL: evenVolumes(2001, 20) });
    let steepest = 500;
    for (let i = 500; i < 2000; i++) {
      const slope = run.readings[i + 1] - run.readings[i - 1];
      if (slope > run.readings[steepest + 1] - run.readings[steepest - 1]) steepest = i;
    }
    const [endpoint] = derivativeEndpoints(run.volumes_mL, run.readings);
    // The top of the slope is skewed, and a parabola through it is off by a fraction of its width of 2 mL.
    expect(Math.abs(endpoint.volume_mL - run.volumes_mL[steepest])).toBeLessThan(0.06);
    expect(12.5 - endpoint.volume_mL).toBeGreaterThan(0.05);
  });

  it('does its best when the whole step falls between two readings', () => {
    const run = curve({ pKa: [4.756], concentration_M: 0.05, volumes_mL: [0, 2, 4, 6, 8, 10, 12, 14, 16, 18, 20] });
    const [endpoint, ...others] = derivativeEndpoints(run.volumes_mL, run.readings);
    expect(others).toEqual([]);
    expect(endpoint.volume_mL).toBeGreaterThan(12);
    expect(endpoint.volume_mL).toBeLessThan(14);
    expect(endpoint.u_mL).toBeGreaterThan(0.5);
  });

  it('reads a run in any order', () => {
    const run = curve({ pKa: [4.756], concentration_M: 0.05, volumes_mL: evenVolumes(41, 20) });
    const backwards = derivativeEndpoints(run.volumes_mL.slice().reverse(), run.readings.slice().reverse());
    const [endpoint] = derivativeEndpoints(run.volumes_mL, run.readings);
    expect(backwards).toEqual([{ ...endpoint, pointsUsed: endpoint.pointsUsed.map((i) => 40 - i) }]);
    const [from, to] = endpoint.pointsUsed;
    expect(run.volumes_mL[from]).toBeLessThan(12.5);
    expect(run.volumes_mL[to]).toBeGreaterThan(12.5);
  });
});

describe('falling curves mirror rising ones', () => {
  it('in millivolts', () => {
    const settings = { pKa: PHOSPHORIC_PKA, concentration_M: 0.05, volumes_mL: evenVolumes(101, 40) };
    const rising = curve(settings);
    const falling = curve({ ...settings, mV: true });
    const inPH = derivativeEndpoints(rising.volumes_mL, rising.readings);
    const inMV = derivativeEndpoints(falling.volumes_mL, falling.readings);
    expect(inMV.length).toBe(2);
    inMV.forEach((endpoint, k) => {
      // The same numbers but for rounding; the mV curve is the pH curve times a factor.
      expect(endpoint.volume_mL).toBeCloseTo(inPH[k].volume_mL, 9);
      expect(endpoint.secondDerivativeZero_mL).toBeCloseTo(inPH[k].secondDerivativeZero_mL ?? 0, 9);
      expect(endpoint.u_mL).toBeCloseTo(inPH[k].u_mL, 9);
      expect(endpoint.height / inPH[k].height).toBeCloseTo(-nernstSlope_mV(25), 6);
    });
  });

  it('with an acid as titrant', () => {
    const volumes_mL = evenVolumes(81, 20);
    const acid = curve({ pKa: [], concentration_M: 0.05, volumes_mL });
    const base = curve({ pKa: [], concentration_M: 0.05, volumes_mL, titrant: 'acid' });
    const [up] = derivativeEndpoints(acid.volumes_mL, acid.readings);
    const [down] = derivativeEndpoints(base.volumes_mL, base.readings);
    // At pKw = 14 the two curves are mirror images about pH 7.
    expect(down.volume_mL).toBeCloseTo(up.volume_mL, 9);
    expect(down.slope).toBeCloseTo(-up.slope, 9);
    expect(down.reading).toBeCloseTo(14 - up.reading, 9);
  });
});

describe('with noise of 0.005', () => {
  const cases = [
    { name: 'a strong acid', pKa: [], concentration_M: 0.05, end_mL: 20, steps: 1 },
    { name: 'acetic acid', pKa: [4.756], concentration_M: 0.05, end_mL: 20, steps: 1 },
    { name: 'a weak acid of pKa 9.8', pKa: [9.8], concentration_M: 0.05, end_mL: 20, steps: 1 },
    { name: 'phosphoric acid', pKa: PHOSPHORIC_PKA, concentration_M: 0.05, end_mL: 50, steps: 2 },
    { name: 'malonic acid', pKa: [2.847, 5.696], concentration_M: 0.05, end_mL: 30, steps: 2 },
  ];
  for (const { name, pKa, concentration_M, end_mL, steps } of cases) {
    for (const points of [60, 240]) {
      it(`no bump of ${name} with ${points} points is taken for a step`, () => {
        // Noise only changes from seed to seed: the same true curve with 50 sets of errors.
        const clean = curve({ pKa, concentration_M, volumes_mL: evenVolumes(points, end_mL) });
        for (let seed = 1; seed <= 50; seed++) {
          const noise = seededNoise(seed);
          const readings = clean.readings.map((reading) => reading + 0.005 * noise.normal());
          expect(derivativeEndpoints(clean.volumes_mL, readings).length).toBe(steps);
        }
      });
    }
  }

  it('states the uncertainty that repeated noise shows', () => {
    const clean = curve({ pKa: [2.847, 5.696], concentration_M: 0.05, volumes_mL: evenVolumes(240, 30) });
    const options = { uReading: 0.005 };
    const truth = derivativeEndpoints(clean.volumes_mL, clean.readings, options);
    for (const k of [0, 1]) {
      let squares = 0;
      let stated = 0;
      for (let seed = 1; seed <= 200; seed++) {
        const noise = seededNoise(seed);
        const readings = clean.readings.map((reading) => reading + 0.005 * noise.normal());
        const endpoint = derivativeEndpoints(clean.volumes_mL, readings, options)[k];
        squares += (endpoint.volume_mL - truth[k].volume_mL) ** 2 / 200;
        stated += endpoint.uNoise_mL ** 2 / 200;
      }
      // 200 draws give 5 % on the standard deviation; windows chosen by the noisy data themselves cost some more.
      expect(Math.sqrt(stated / squares)).toBeGreaterThan(0.75);
      expect(Math.sqrt(stated / squares)).toBeLessThan(1.35);
    }
  });

  it('carries the uncertainty of the volumes along', () => {
    const run = curve({ pKa: [4.756], concentration_M: 0.05, volumes_mL: evenVolumes(200, 20) });
    const u = [0, 0.01].map(
      (uVolume_mL) => derivativeEndpoints(run.volumes_mL, run.readings, { uReading: 0.005, uVolume_mL })[0].uNoise_mL,
    );
    expect(u[1]).toBeGreaterThan(2 * u[0]);
    expect(u[1]).toBeLessThan(0.02);
  });

  it('is not misled by one reading gone astray', () => {
    const run = curve({ pKa: [4.756], concentration_M: 0.05, volumes_mL: evenVolumes(100, 20) });
    const astray = run.readings.slice();
    astray[25] += 1.5;
    expect(derivativeEndpoints(run.volumes_mL, astray).map((endpoint) => endpoint.volume_mL)).toEqual(
      derivativeEndpoints(run.volumes_mL, run.readings).map((endpoint) => endpoint.volume_mL),
    );
  });
});

describe('where there is no step', () => {
  const volumes = Float64Array.from({ length: 40 }, (_, i) => 0.25 * i);

  it('none on a flat line, with and without noise', () => {
    expect(derivativeEndpoints(volumes, new Float64Array(40).fill(7))).toEqual([]);
    for (let seed = 1; seed <= 50; seed++) {
      const noise = seededNoise(seed);
      expect(
        derivativeEndpoints(
          volumes,
          volumes.map(() => 7 + 0.005 * noise.normal()),
        ),
      ).toEqual([]);
    }
  });

  it('none on a straight slope', () => {
    expect(
      derivativeEndpoints(
        volumes,
        volumes.map((v) => 3 + 0.2 * v),
      ),
    ).toEqual([]);
  });

  it('none in a buffer that stops before its step', () => {
    const run = curve({ pKa: [4.756], concentration_M: 0.05, volumes_mL: evenVolumes(40, 10) });
    expect(derivativeEndpoints(run.volumes_mL, run.readings)).toEqual([]);
  });

  it('none, and no complaint, with three points, one or none', () => {
    for (const count of [0, 1, 3]) {
      expect(derivativeEndpoints(volumes.slice(0, count), Float64Array.of(3, 7, 11).slice(0, count))).toEqual([]);
    }
  });
});
