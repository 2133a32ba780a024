import { describe, expect, it, vi } from 'vitest';
import { analyseRun } from '../../../core/results/analyseRun.ts';
import type { RunResult } from '../../../core/results/runResult.ts';
import type { Run } from '../../../core/run/run.ts';
import { type Experiment, perform, runOf, sheetOf, usualErrors, workUp, workUpExperiment } from '../../experiment.ts';
import { nernstSlope_mV } from '../../simulator/simulateRun.ts';

// Ten times what the slowest of these take alone: other tests want the same cores.
vi.setConfig({ testTimeout: 30_000 });

const errors = { seed: 8, ...usualErrors };
const acid: Experiment = { pKa: [4.8], end_mL: 3.6, errors };
const diprotic: Experiment = { pKa: [3.5, 7.5], end_mL: 6.5, errors };

function find(result: RunResult, id: string) {
  const quantity = result.quantities.find((candidate) => candidate.id === id);
  if (quantity === undefined) throw new Error(`no quantity ${id}`);
  return quantity;
}

/** Three standard uncertainties hold the truth in 99.7 % of runs; seeds are fixed. */
function expectWithin3u(result: RunResult, id: string, truth: number): void {
  const { value, u } = find(result, id);
  expect(Math.abs((value ?? Number.NaN) - truth) / (u ?? Number.NaN), id).toBeLessThan(3);
}

/** Every number anywhere in a result. */
function numbersIn(part: unknown, found: number[] = []): number[] {
  if (typeof part === 'number') found.push(part);
  else if (ArrayBuffer.isView(part)) found.push(...(part as Float64Array));
  else if (typeof part === 'object' && part !== null) for (const child of Object.values(part)) numbersIn(child, found);
  return found;
}

describe('a result', () => {
  it('is plain data: it can be cloned between threads, and holds no number that is none', () => {
    for (const result of [
      workUpExperiment(diprotic),
      workUp(runOf([0, 1], [3, 4]), { sheet: 1 }),
      workUp(runOf([], []), { sheet: 1 }),
      workUpExperiment(acid, { sample: { volume_mL: { fitted: true, start: 25 } }, burette: { gain: 'fitted' } }),
    ]) {
      expect(structuredClone(result)).toEqual(result);
      expect(numbersIn(result).filter((value) => !Number.isFinite(value))).toEqual([]);
    }
  });

  it('is the same whatever the order of the rows', () => {
    const { volumes_mL, readings } = perform(acid);
    const order = Array.from(volumes_mL.keys()).sort((a, b) => ((a * 37) % 60) - ((b * 37) % 60));
    const shuffled = runOf(
      order.map((i) => volumes_mL[i]),
      order.map((i) => readings[i]),
    );
    // More than half of the rows must rise, or the volumes count as running backwards.
    const first = workUp(runOf(volumes_mL, readings), sheetOf(acid));
    const second = workUp(shuffled, sheetOf(acid));
    expect(second.ending.code).toBe('fitted');
    for (const id of ['pKa1', 'concentration']) {
      const { value, u } = find(first, id);
      // Rounding and the standstill of the weights, 1e-4 of an uncertainty.
      expect(Math.abs((find(second, id).value ?? 0) - (value ?? 0)) / (u ?? 0)).toBeLessThan(1e-3);
    }
  });

  it('is yielded after steps that say what is being done', () => {
    const { volumes_mL, readings } = perform(acid);
    const work = analyseRun(runOf(volumes_mL, readings), { sheet: 1 });
    const told: string[] = [];
    let step = work.next();
    while (step.done !== true) {
      const { doing, share } = step.value;
      told.push(doing);
      expect(share === null || (share >= 0 && share <= 1)).toBe(true);
      step = work.next();
    }
    expect(told.length).toBeGreaterThanOrEqual(3);
  });

  it('refuses a sheet that contradicts itself', () => {
    const work = analyseRun(runOf([0, 1], [3, 4]), { sheet: 1, sample: { analytes: [{ groups: 1, pKa: [4, 5] }] } });
    let step = work.next();
    while (step.done !== true) step = work.next();
    if (step.value.ok) throw new Error('this sheet was accepted');
    expect(step.value.refusals[0].code).toBe('sheet-inconsistent');
  });
});

describe('the ending', () => {
  it('is fitted where something was', () => {
    const result = workUpExperiment(diprotic);
    expect(result.ending.code).toBe('fitted');
    for (const [id, truth] of Object.entries({ pKa1: 3.5, pKa2: 7.5, concentration: 0.01 }))
      expectWithin3u(result, id, truth);
  });

  it('is predicted where nothing is fitted, whether or not something is known', () => {
    const analytes = [{ pKa: [3.5, 7.5], concentration_M: 0.01, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }];
    expect(workUpExperiment(diprotic, { sample: { analytes } }).ending.code).toBe('predicted');
    const known = workUpExperiment(diprotic, { sample: { analytes }, burette: { gain: { value: 1, u: 0.001 } } });
    expect(known.ending.code).toBe('predicted');
    expect(known.curve).not.toBeNull();
    // What the run adds to the knowledge of the burette.
    expect(find(known, 'burette.gain').u).toBeLessThan(0.001);
  });

  it.each([
    ['no rows', [], [], 'all-rows-excluded'],
    ['two points', [0, 1], [3.1, 3.4], 'too-few-points'],
    ['one volume only', Array.from({ length: 20 }, () => 5), Array.from({ length: 20 }, () => 7), 'too-few-points'],
    ['volumes that fall', [9, 8, 7, 6, 5, 4, 3, 2, 1, 0], [11, 11, 11, 10, 8, 6, 5, 4, 4, 3], 'volumes-run-backwards'],
  ] as const)('with %s says why there is no fit', (_, volumes, readings, code) => {
    const result = workUp(runOf(volumes, readings), { sheet: 1 });
    expect(result.ending.code).toBe(code);
    expect(result.ending.message).toMatch(/^[A-Z0-9].*\.$/);
    expect(result.curve).toBeNull();
    expect(result.points).toHaveLength(volumes.length);
    expect(result.quantities.every(({ state, value }) => (state === 'fitted') === (value === null))).toBe(true);
  });

  it('of a fit without a usable end says what the sheet denies, and what to do', () => {
    const wrongTitrant = workUpExperiment(acid, { titrant: { kind: 'acid' } });
    expect(wrongTitrant.ending.code).toBe('not-converged');
    expect(wrongTitrant.ending.message).toMatch(
      /pH rises, as with a base, but the titrant is declared as an acid\. Compare/,
    );
    const wrongUnit = workUpExperiment(acid, { reading: { kind: 'mV', offset: null, E0_mV: 400, u: null } });
    expect(['not-converged', 'no-solution']).toContain(wrongUnit.ending.code);
    expect(wrongUnit.ending.message).toContain('Readings in mV are declared, but those of the file look like pH.');
  });

  it('asks for as many points as are needed for what is fitted', () => {
    // Six fitted quantities and two to spare: eight; five would do for one of them.
    const many: Experiment = { pKa: [3, 5, 7, 9, 11], end_mL: 14, points: 7 };
    expect(workUpExperiment(many).ending.code).toBe('too-few-points');
    expect(workUpExperiment(many).ending.message).toContain('at least 8');
    expect(workUpExperiment({ ...acid, points: 7 }).ending.code).toBe('fitted');
  });
});

describe('points', () => {
  const { volumes_mL, readings } = perform(acid);
  const outlier = 20;
  const run = runOf(volumes_mL, readings);
  const withExcluded: Run = {
    ...run,
    rows: run.rows.map((row, i) =>
      i === outlier
        ? { ...row, reading: row.reading + 1, decision: { use: 'excluded', by: 'person', why: 'air bubble' } }
        : row,
    ),
  };
  const result = workUp(withExcluded, sheetOf(acid));

  it('that are excluded are compared with the curve, and take no part', () => {
    expect(result.points).toHaveLength(run.rows.length);
    expect(result.points[outlier]).toMatchObject({ used: false, u: null, line: outlier + 2 });
    // One in pH off, give or take the residual that it had.
    expect(Math.abs((result.points[outlier].residual ?? 0) - 1)).toBeLessThan(0.05);
    const without = workUp(
      runOf(
        volumes_mL.filter((_, i) => i !== outlier),
        readings.filter((_, i) => i !== outlier),
      ),
      sheetOf(acid),
    );
    expect(find(result, 'pKa1').value).toBe(find(without, 'pKa1').value);
    expect(find(result, 'pKa1').u).toBe(find(without, 'pKa1').u);
  });

  it('that are used have residual = reading − curve, and the uncertainty with which they were weighed', () => {
    const used = result.points.filter((point) => point.used);
    const chi = used.reduce((sum, { residual, u }) => sum + ((residual ?? 0) / (u ?? 0)) ** 2, 0);
    const { reducedChiSquare, degreesOfFreedom, reading, setting_mL } = result.noise ?? {};
    // The curve is bent where it is steep, so that a volume error is not quite its slope: a few percent.
    expect(Math.abs(chi / ((reducedChiSquare ?? 0) * (degreesOfFreedom ?? 0)) - 1)).toBeLessThan(0.05);
    for (const { u } of used) expect(u).toBeGreaterThanOrEqual(reading ?? 1);
    expect({ reading, setting_mL }).toEqual({ reading: usualErrors.uReading, setting_mL: usualErrors.uSetting_mL });
  });
});

describe('the drawn curve', () => {
  const result = workUpExperiment(diprotic);
  const { volume_mL, reading, pH, ionicStrength_M } = result.curve ?? {
    volume_mL: new Float64Array(0),
    reading: new Float64Array(0),
    pH: new Float64Array(0),
    ionicStrength_M: new Float64Array(0),
  };

  it('runs from the first to the last volume, each volume once, rising', () => {
    expect(volume_mL[0]).toBe(0);
    expect(volume_mL.at(-1)).toBe(6.5);
    expect(volume_mL.every((volume, i) => i === 0 || volume > volume_mL[i - 1])).toBe(true);
    expect(reading.every((value, i) => i === 0 || value > reading[i - 1])).toBe(true);
    expect(pH).toEqual(reading);
    expect(ionicStrength_M.every((value) => value > 0)).toBe(true);
  });

  it('is drawn finely enough at the steps to be straight between its points', () => {
    // A twentieth of the figure's height at most between two of its points.
    const range = reading[reading.length - 1] - reading[0];
    for (let i = 1; i < reading.length; i++) expect(reading[i] - reading[i - 1]).toBeLessThan(range / 20);
  });

  it('passes through the points', () => {
    for (const point of result.points) {
      const at = volume_mL.findIndex((volume) => volume >= point.volume_mL);
      const low = reading[Math.max(0, at - 1)];
      const high = reading[at];
      // Five standard uncertainties of the point on either side.
      expect(point.reading).toBeGreaterThan(low - 5 * (point.u ?? 0));
      expect(point.reading).toBeLessThan(high + 5 * (point.u ?? 0));
    }
  });
});

describe('correlation', () => {
  it('is symmetric, within −1 and 1, and 1 of each with itself', () => {
    const { ids, matrix } = workUpExperiment(diprotic, {
      titrant: { concentration_M: { value: 0.1, u: 0.0001 }, carbonate_M: 'fitted' },
      reading: { offset: { value: 0, u: 0.02 } },
    }).correlation;
    expect([...ids].sort()).toEqual(
      ['concentration', 'pKa1', 'pKa2', 'reading.offset', 'titrant.carbonate', 'titrant.concentration'].sort(),
    );
    expect(matrix).toHaveLength(ids.length ** 2);
    ids.forEach((id, a) => {
      ids.forEach((other, b) => {
        const value = matrix[a * ids.length + b];
        expect(value, `${id}, ${other}`).not.toBeNull();
        expect(Math.abs(value ?? 2)).toBeLessThanOrEqual(1);
        // Sums in another order: rounding.
        expect(value).toBeCloseTo(matrix[b * ids.length + a] ?? 2, 12);
        if (a === b) expect(value).toBeCloseTo(1, 12);
      });
    });
    const of = (a: string, b: string) => matrix[ids.indexOf(a) * ids.length + ids.indexOf(b)] ?? 0;
    // What the titrant gains in strength the sample gains in amount; a higher offset means lower constants.
    expect(of('titrant.concentration', 'concentration')).toBeGreaterThan(0.5);
    expect(of('reading.offset', 'pKa1')).toBeLessThan(-0.5);
  });

  it('is null for what is not determined', () => {
    const { ids, matrix } = workUpExperiment(acid, {
      sample: { volume_mL: { fitted: true, start: 25 } },
      burette: { gain: 'fitted' },
    }).correlation;
    const a = ids.indexOf('burette.gain');
    expect(matrix.slice(a * ids.length, (a + 1) * ids.length).every((value) => value === null)).toBe(true);
    const b = ids.indexOf('pKa1');
    expect(matrix[b * ids.length + b]).toBe(1);
  });
});

describe('a constant', () => {
  it('with Davies is thermodynamic, and the others follow by the activity coefficients at its own half', () => {
    const experiment: Experiment = { ...acid, activity: 'davies', background_M: 0.1 };
    const { constant, value } = find(workUpExperiment(experiment), 'pKa1');
    expect(constant).toMatchObject({ kind: 'thermodynamic', thermodynamic: value, temperature_C: 25 });
    // Background of 0.1 mol/L, diluted by 1.25 mL and joined by half of the acid as its salt: 0.1 · 26.25/26.25 + 0.0048.
    const ionic = constant?.ionicStrength_M ?? 0;
    expect(ionic).toBeCloseTo(0.1 + 0.005 * (25 / 26.25), 3);
    const af = 0.5116 * (Math.sqrt(ionic) / (1 + Math.sqrt(ionic)) - 0.3 * ionic);
    // HA ⇌ H⁺ + A⁻: pKc = pK − 2Af, mixed = pKc + Af. A to four digits.
    expect(constant?.concentration).toBeCloseTo((value ?? 0) - 2 * af, 4);
    expect(constant?.mixed).toBeCloseTo((value ?? 0) - af, 4);
  });

  it('of a cation acid hardly depends on the medium: pKc = pK, mixed = pKc + Af', () => {
    const base: Experiment = { ...acid, pKa: [9], chargeFullyProtonated: 1, activity: 'davies', background_M: 0.1 };
    const { constant, value } = find(workUpExperiment(base), 'pKa1');
    expect(constant?.concentration).toBeCloseTo(value ?? 0, 10);
    expect(constant?.mixed).toBeGreaterThan((value ?? 0) + 0.1);
  });

  it('without an activity model is what the scale of the readings makes it, and the others are not known', () => {
    const concentration = find(workUpExperiment(acid), 'pKa1');
    expect(concentration.constant).toMatchObject({
      kind: 'concentration',
      concentration: concentration.value,
      mixed: null,
      thermodynamic: null,
    });
    const mixed = find(workUpExperiment(acid, { reading: { scale: 'activity' } }), 'pKa1');
    expect(mixed.constant).toMatchObject({
      kind: 'mixed',
      mixed: mixed.value,
      concentration: null,
      thermodynamic: null,
    });
  });

  it('is said of pKa values alone', () => {
    for (const { id, constant } of workUpExperiment(acid).quantities) expect(constant !== null).toBe(id === 'pKa1');
  });
});

describe('the 95 % interval', () => {
  function halfWidths(result: RunResult, id: string): [number, number] {
    const { value, u, interval95 } = find(result, id);
    const [low, high] = interval95 ?? [null, null];
    return [((value ?? 0) - (low ?? 0)) / (u ?? 1), ((high ?? 0) - (value ?? 0)) / (u ?? 1)];
  }

  it('is about 1.96 u wide on either side of a constant that the run fixes well, where the noise is declared', () => {
    // The profile of a constant known to 0.001 is straight to a percent.
    for (const width of halfWidths(workUpExperiment(acid), 'pKa1'))
      expect(Math.abs(width / 1.96 - 1)).toBeLessThan(0.02);
  });

  it('is wider where few points estimate the noise', () => {
    const result = workUpExperiment({ ...acid, points: 12 }, { reading: { u: null } });
    expect(result.noise?.degreesOfFreedom).toBeCloseTo(10, 6);
    // Student's t of ten degrees of freedom is 2.228; a part of the noise is declared, which makes it less.
    for (const width of halfWidths(result, 'pKa1')) {
      expect(width).toBeGreaterThan(1.97);
      expect(width).toBeLessThan(2.6);
    }
  });
});

describe('an assumed value', () => {
  it('is named by every result that it would move noticeably', () => {
    const result = workUpExperiment(acid, { burette: { gain: null }, sample: { volume_mL: null } });
    expect(find(result, 'burette.gain').state).toBe('assumed');
    expect(find(result, 'concentration').restsOn).toContain('sample.volume');
    expect(workUpExperiment(acid).quantities.every(({ restsOn }) => restsOn.length === 0)).toBe(true);
  });
});

describe('a titrant strength that nobody has declared', () => {
  it('is found from the alkaline end, and then nothing rests on the value assumed for it', () => {
    const result = workUpExperiment(acid, { titrant: { concentration_M: null } });
    const strength = find(result, 'titrant.concentration');
    expect(strength.state).toBe('assumed');
    expect(Math.abs((strength.value ?? 0) - 0.1) / (strength.u ?? 0)).toBeLessThan(4);
    expect(strength.u).toBeLessThan(0.01);
    expect(find(result, 'concentration').restsOn).not.toContain('titrant.concentration');
  });
});

describe('a run read in mV', () => {
  it('gives the same constants as in pH, and noise in mV', () => {
    const { volumes_mL, readings } = perform(acid);
    // An electrode of E0 400 mV and full slope.
    const potentials = readings.map((pH) => 400 - nernstSlope_mV(25) * pH);
    const reading = { kind: 'mV', offset: null, E0_mV: 400, u: 0.005 * nernstSlope_mV(25) } as const;
    const inMV = workUp(runOf(volumes_mL, potentials, 'mV'), sheetOf(acid, { reading }));
    const inPH = workUpExperiment(acid);
    expect(inMV.ending.code).toBe('fitted');
    expect(inMV.noise?.unit).toBe('mV');
    for (const id of ['pKa1', 'concentration']) {
      const { value, u } = find(inPH, id);
      expect(Math.abs((find(inMV, id).value ?? 0) - (value ?? 0)) / (u ?? 1), id).toBeLessThan(1e-3);
      expect((find(inMV, id).u ?? 0) / (u ?? 1)).toBeCloseTo(1, 3);
    }
  });
});

describe('speciation of a run', () => {
  it('covers its pH range with shares that sum to one', () => {
    const result = workUpExperiment(diprotic);
    const { pH, systems } = result.speciation ?? { pH: new Float64Array(0), systems: [] };
    const read = result.points.map((point) => point.pH);
    expect(pH[0]).toBeLessThanOrEqual(Math.min(...read));
    expect(pH.at(-1)).toBeGreaterThanOrEqual(Math.max(...read));
    expect(systems).toHaveLength(1);
    expect(systems[0].forms.map(({ charge, protons }) => [charge, protons])).toEqual([
      [0, 2],
      [-1, 1],
      [-2, 0],
    ]);
    pH.forEach((_, i) => {
      expect(systems[0].forms.reduce((sum, { fraction }) => sum + fraction[i], 0)).toBeCloseTo(1, 12);
    });
    expect(systems[0].crossings.map(({ quantityId }) => quantityId)).toEqual(['pKa1', 'pKa2']);
  });

  it('is absent where there is no proton system', () => {
    expect(workUpExperiment({ ...acid, pKa: [] }).speciation).toBeNull();
  });
});
