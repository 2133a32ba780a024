import { describe, expect, it } from 'vitest';
import { type GranVolume, granVolumes } from '../../../core/endpoints/gran.ts';
import { seededNoise } from '../../simulator/seededNoise.ts';
import { curve, evenVolumes, PHOSPHORIC_PKA, SAMPLE_VOLUME_ML } from './simulatedCurves.ts';

const common = { startVolume_mL: SAMPLE_VOLUME_ML, titrant: 'base', pKw: 14 } as const;

function volumeOf(results: readonly GranVolume[], kind: string, step: number): GranVolume {
  const found = results.find((result) => result.kind === kind && result.step === step);
  if (found === undefined) throw new Error(`no ${kind} for step ${step}`);
  return found;
}

describe('a base as titrant', () => {
  it('finds a strong acid from both sides', () => {
    const run = curve({ pKa: [], concentration_M: 0.05, volumes_mL: evenVolumes(41, 20) });
    const results = granVolumes({ ...common, volumes: run.volumes_mL, pH: run.readings, steps: [12.6] });
    expect(results.map((result) => result.kind)).toEqual(['acid side strong', 'base side']);
    for (const result of results) {
      // Exact but for water, 1e-7 mol/L beside 0.05; found with a step that is 0.1 mL off.
      expect(Math.abs((result.volume_mL ?? 0) - 12.5)).toBeLessThan(1e-6);
      expect(result.rSquared).toBeGreaterThan(0.999999);
      expect(result.reason).toBeNull();
    }
    expect(results[0].range_mL).toEqual([1.5, 12]);
    expect(results[0].pointsUsed).toBe(22);
  });

  it('finds a weak acid from both sides', () => {
    const run = curve({ pKa: [4.756], concentration_M: 0.05, volumes_mL: evenVolumes(81, 20) });
    const results = granVolumes({ ...common, volumes: run.volumes_mL, pH: run.readings, steps: [12.45] });
    expect(results.map((result) => result.kind)).toEqual(['acid side weak', 'base side']);
    // Protons still bound beyond 14 mL: 1e-7 of the whole; through the slope they reach the other side.
    for (const result of results) expect(Math.abs((result.volume_mL ?? 0) - 12.5)).toBeLessThan(1e-4);
  });

  it('counts the protons that an acid gives off by itself, and the hydroxide before the step of a very weak one', () => {
    for (const pKa of [1, 2, 3, 8, 9, 9.8]) {
      const run = curve({ pKa: [pKa], concentration_M: 0.05, volumes_mL: evenVolumes(81, 20) });
      const results = granVolumes({ ...common, volumes: run.volumes_mL, pH: run.readings, steps: [12.45] });
      // Uncorrected the volumes would be off by up to 0.5 mL; what is left comes from protons still bound behind the step.
      expect(Math.abs((volumeOf(results, 'acid side weak', 1).volume_mL ?? 0) - 12.5)).toBeLessThan(0.01);
      // The line behind a very weak acid is bent, and its uncertainty says so.
      const behind = volumeOf(results, 'base side', 1);
      if (behind.volume_mL === null) throw new Error(behind.reason);
      expect(Math.abs(behind.volume_mL - 12.5)).toBeLessThan(3 * behind.u_mL + 1e-4);
    }
  });

  it('says why the first and last lines of phosphoric acid are not given, and gives the second', () => {
    const run = curve({ pKa: PHOSPHORIC_PKA, concentration_M: 0.05, volumes_mL: evenVolumes(201, 50) });
    const results = granVolumes({ ...common, volumes: run.volumes_mL, pH: run.readings, steps: [12.5, 25] });
    // pKa 2.1 is neither strong nor weak, and OH⁻ beyond 25 mL is taken up by the third proton.
    expect(results[0].volume_mL).toBeNull();
    expect(['not straight', 'meets zero elsewhere']).toContain(results[0].reason);
    expect(volumeOf(results, 'base side', 2).volume_mL).toBeNull();
    // Overlap with the third step: K₃/[H⁺] of the second is 1e-4 of a proton at the far end of the range.
    expect(volumeOf(results, 'base side', 2).reason).toBe('not straight');
    expect(Math.abs((volumeOf(results, 'acid side weak', 2).volume_mL ?? 0) - 25)).toBeLessThan(0.01);
  });

  it('states the uncertainty that repeated noise shows', () => {
    const clean = curve({ pKa: [4.756], concentration_M: 0.05, volumes_mL: evenVolumes(81, 20) });
    for (const kind of ['acid side weak', 'base side']) {
      let sum = 0;
      let squares = 0;
      let stated = 0;
      for (let seed = 1; seed <= 200; seed++) {
        const noise = seededNoise(seed);
        const pH = clean.readings.map((reading) => reading + 0.005 * noise.normal());
        const result = volumeOf(granVolumes({ ...common, volumes: clean.volumes_mL, pH, steps: [12.5] }), kind, 1);
        if (result.volume_mL === null) throw new Error(result.reason);
        sum += result.volume_mL / 200;
        squares += (result.volume_mL - 12.5) ** 2 / 200;
        stated += result.u_mL ** 2 / 200;
      }
      const spread = Math.sqrt(squares - (sum - 12.5) ** 2);
      // 200 draws give 5 % on the standard deviation: three of them, and a bend that noise feigns now and then.
      expect(Math.abs(Math.sqrt(stated) / spread - 1)).toBeLessThan(0.2);
      // Noise must not shift the volume by more than a fifth of what it scatters it.
      expect(Math.abs(sum - 12.5)).toBeLessThan(0.2 * spread + 0.005);
    }
  });

  it('does not depend on the order of the points', () => {
    const run = curve({ pKa: [4.756], concentration_M: 0.05, volumes_mL: evenVolumes(81, 20) });
    const there = granVolumes({ ...common, volumes: run.volumes_mL, pH: run.readings, steps: [12.5] });
    const back = granVolumes({
      ...common,
      volumes: run.volumes_mL.slice().reverse(),
      pH: run.readings.slice().reverse(),
      steps: [12.5],
    });
    expect(back).toEqual(there);
  });
});

describe('an acid as titrant is the mirror image', () => {
  it('for a strong base', () => {
    const run = curve({ pKa: [], concentration_M: 0.05, volumes_mL: evenVolumes(41, 20), titrant: 'acid' });
    const results = granVolumes({
      ...common,
      titrant: 'acid',
      volumes: run.volumes_mL,
      pH: run.readings,
      steps: [12.6],
    });
    expect(results.map((result) => result.kind)).toEqual(['base side strong', 'acid side']);
    // As for the strong acid.
    for (const result of results) expect(Math.abs((result.volume_mL ?? 0) - 12.5)).toBeLessThan(1e-6);
  });

  it('for a weak base', () => {
    const run = curve({ pKa: [9.244], concentration_M: 0.05, volumes_mL: evenVolumes(81, 20), titrant: 'acid' });
    const results = granVolumes({
      ...common,
      titrant: 'acid',
      volumes: run.volumes_mL,
      pH: run.readings,
      steps: [12.5],
    });
    // As for the weak acid, with pKw − 9.244 = 4.756.
    expect(volumeOf(results, 'base side weak', 1).volume_mL).toBeCloseTo(12.5, 2);
    expect(volumeOf(results, 'acid side', 1).volume_mL).toBeCloseTo(12.5, 3);
  });
});

describe('where there is no line', () => {
  const run = curve({ pKa: [], concentration_M: 0.05, volumes_mL: evenVolumes(9, 20) });
  const asked = { ...common, volumes: run.volumes_mL, pH: run.readings };

  it('says that there is no step', () => {
    const [only, ...others] = granVolumes({ ...asked, steps: [] });
    expect(others).toEqual([]);
    expect(only).toMatchObject({ kind: 'acid side strong', step: 0, volume_mL: null, u_mL: null, reason: 'no step' });
  });

  it('says that there are too few points', () => {
    const [acidSide, baseSide] = granVolumes({ ...asked, steps: [12.5] });
    // 2.5, 5, 7.5 and 10 mL before; 15, 17.5 and 20 mL behind.
    expect(acidSide.pointsUsed).toBe(4);
    expect(acidSide.reason).toBeNull();
    expect(baseSide).toMatchObject({ volume_mL: null, range_mL: null, pointsUsed: 3, reason: 'too few points' });
  });

  it('says that a straight line leads elsewhere', () => {
    const volumes = Float64Array.from(evenVolumes(41, 20));
    const pH = volumes.map((v) => 3 + 1e-4 * v);
    expect(granVolumes({ ...common, volumes, pH, steps: [12.5] })[0].reason).toBe('meets zero elsewhere');
  });
});
