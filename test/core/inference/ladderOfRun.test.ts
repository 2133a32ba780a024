import { describe, expect, it } from 'vitest';
import { ladderNesting } from '../../../core/inference/ladderNesting.ts';
import type { Ladder } from '../../../core/inference/ladderOfRun.ts';
import { describeLadder } from '../../../core/results/describeLadder.ts';
import { randomDesign, simpleMedium, simpleSheet, simulateDesign } from '../../laws/simulatedDesign.ts';
import { buildBaseTitrant, buildSample } from '../../simulator/buildVessels.ts';
import { simulateRun } from '../../simulator/simulateRun.ts';
import { climb, countLadders, ladderOfDesign, ladderSheet, studyErrors } from './ladderStudy.ts';

const pHReading = { kind: 'pH', scale: 'activity', offset: 0, slope: 1, u: studyErrors.uReading } as const;

/** A fit of a rung counts at most 10 curves; a ladder may take 150 of them. */
const mostCurves = 1500;

/** A run of one acid with more in the vessels than its sheet says. */
function undeclared(pKa: number[], strongIon_M: number, carbonate_M: number, seed: number): Ladder {
  const points = 70;
  const end_mL = 1.4 * (0.015 * pKa.length - Math.min(0, strongIon_M)) * 250;
  const { volumes_mL, readings } = simulateRun({
    sample: buildSample({
      volume_mL: 25,
      background_M: 0.1,
      strongIon_M,
      analytes: [{ pKa, chargeFullyProtonated: 0, protonsLostAsWeighed: 0, concentration_M: 0.015 }],
    }),
    titrant: buildBaseTitrant({ concentration_M: 0.1, background_M: 0.1, carbonate_M }),
    medium: simpleMedium,
    volumes_mL: Array.from({ length: points }, (_, i) => (i * end_mL) / (points - 1)),
    reading: { kind: 'pH', scale: 'activity' },
    errors: { ...studyErrors, seed },
  });
  return climb(ladderSheet(simpleSheet(pKa.length, pHReading)), volumes_mL, readings);
}

function shown({ rungs, chosen }: Ladder) {
  const { groups, carbonate, excess } = rungs[chosen].rung.kind;
  return { groups, carbonate, excess };
}

function sentenceOf(ladder: Ladder): string {
  return describeLadder(ladder).sentence;
}

describe('the rungs of a ladder', () => {
  const ladders = [
    ...[11, 12, 13, 14].map((seed) => ladderOfDesign(randomDesign(seed), seed, 'declared')),
    ...[15, 16, 17].map((seed) => ladderOfDesign(randomDesign(seed), seed, 'undeclared')),
    undeclared([4.5], 0, 0.003, 18),
    undeclared([5, 8.5], -0.005, 0, 19),
    undeclared([4.5, 9], 0.004, 0.002, 20),
  ];

  it('never cost more than a rung that they contain', () => {
    let pairs = 0;
    for (const { rungs, sheets } of ladders)
      for (const { rung: larger } of rungs)
        for (const { rung: smaller } of rungs) {
          if (smaller === larger || ladderNesting(smaller, larger, sheets) === null) continue;
          pairs++;
          // The curve of a group out of reach differs from that without it by 1e-12 of its protons.
          expect(larger.end?.cost ?? Infinity).toBeLessThanOrEqual((smaller.end?.cost ?? 0) * (1 + 1e-6));
        }
    expect(pairs).toBeGreaterThan(100);
  });

  it('share all evidence, on one noise', () => {
    for (const { rungs } of ladders) {
      expect(rungs.reduce((sum, { weight }) => sum + weight, 0)).toBeCloseTo(1, 9);
      const determinants = new Set(rungs.map(({ rung }) => rung.run.whitening.logDeterminant));
      expect(determinants.size).toBe(1);
    }
  });

  it('reach both ways: a test compares with a rung that is contained', () => {
    for (const { rungs, sheets } of ladders)
      for (const { rung, test } of rungs)
        if (test !== null) {
          expect(ladderNesting(rungs[test.against].rung, rung, sheets)).not.toBeNull();
          expect(test.p).toBeGreaterThan(0);
          expect(test.p).toBeLessThanOrEqual(1);
        }
  });
});

describe('the number of groups', () => {
  it.each(['declared', 'undeclared'] as const)(
    'is right in 30 random runs, noise %s',
    (noise) => {
      const { right, tooMany, mostEvaluations } = countLadders(30, 301, noise);
      // At least 95 % right and at most 2 % too many; of 800 such runs, all were right.
      expect(right).toBeGreaterThanOrEqual(29);
      expect(tooMany).toBe(0);
      expect(mostEvaluations).toBeLessThanOrEqual(mostCurves);
    },
    60_000,
  );

  it('does not grow when the noise is declared far too small', () => {
    const { volumes_mL, readings } = simulateDesign(
      { pKa: [4.2, 8], concentration_M: 0.01, points: 70 },
      { ...studyErrors, seed: 31 },
    );
    const sheet = simpleSheet(1, { ...pHReading, u: 0.0002 });
    expect(shown(climb(ladderSheet({ ...sheet, burette: { uSetting_mL: 0.0001 } }), volumes_mL, readings))).toEqual({
      groups: 2,
      carbonate: false,
      excess: false,
    });
  });

  it('is found on part of a long run', () => {
    const { volumes_mL, readings } = simulateDesign(
      { pKa: [4.2, 8], concentration_M: 0.01, points: 1000 },
      { ...studyErrors, seed: 32 },
    );
    const ladder = climb(ladderSheet(simpleSheet(1, pHReading)), volumes_mL, readings);
    expect(ladder.rungs[0].rung.points).toBe(120);
    expect(shown(ladder).groups).toBe(2);
  });
});

describe('what is not a group', () => {
  it('is carbonate in the titrant', () => {
    const ladder = undeclared([4.5], 0, 0.002, 21);
    expect(shown(ladder)).toEqual({ groups: 1, carbonate: true, excess: false });
    expect(sentenceOf(ladder)).toContain('carbonate in the titrant (0.0020 mol/L)');
    expect(sentenceOf(ladder)).toContain('The fit keeps to the conditions');
  });

  it('is a strong acid beside the substance', () => {
    const ladder = undeclared([5, 8.5], -0.006, 0, 22);
    expect(shown(ladder)).toEqual({ groups: 2, carbonate: false, excess: true });
    expect(sentenceOf(ladder)).toContain('an excess of strong acid in the sample (0.0060 mol/L)');
  });

  it('is water that nobody recorded, as long as it is only assumed that there is none', () => {
    const { volumes_mL, readings } = simulateRun({
      sample: buildSample({ volume_mL: 25, background_M: 0.1, strongIon_M: -0.02, analytes: [] }),
      extraWater_mL: 20,
      titrant: buildBaseTitrant({ concentration_M: 0.1, background_M: 0.1 }),
      medium: simpleMedium,
      volumes_mL: Array.from({ length: 70 }, (_, i) => i / 10),
      reading: { kind: 'pH', scale: 'activity' },
      errors: { ...studyErrors, seed: 26 },
    });
    const sheet = simpleSheet(1, pHReading);
    const { extraWater_mL, ...sample } = { extraWater_mL: undefined, ...sheet.sample };
    expect(extraWater_mL).toBe(0);
    const { rungs, chosen } = climb(ladderSheet({ ...sheet, sample }), volumes_mL, readings);
    expect(rungs[chosen].rung.kind.groups).toBe(0);
    expect(rungs.flatMap(({ againstIt }) => againstIt)).toContain(
      'water in the vessel, which is only assumed to be none, would explain the run without this group',
    );
  });

  it('is neither where nothing but groups is there', () => {
    for (const seed of [23, 24])
      expect(shown(undeclared([3.5, 6.4, 9.9], 0, 0, seed))).toMatchObject({
        groups: 3,
        carbonate: false,
        excess: false,
      });
  });
});

describe('the answer', () => {
  const ladder = undeclared([4.5, 7], 0, 0, 25);

  it('says what a further group would buy, and what speaks against it', () => {
    const sentence = sentenceOf(ladder);
    expect(sentence).toMatch(
      /^This run shows 2 ionisable groups, as declared\. One more would take the mean weighted residual from [\d.]+ to [\d.]+ \(evidence [\d.]+ to 1 (for|against) it\), /,
    );
    expect(sentence).not.toMatch(/NaN|Infinity|undefined/);
  });
});
