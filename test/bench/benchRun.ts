import { debyeHueckelA } from '../../core/chemistry/debyeHueckel.ts';
import { buildProblem, type Problem } from '../../core/model/problem.ts';
import { completeSheet } from '../../core/sheet/completeSheet.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { celsius } from '../../core/units/temperature.ts';
import { buildBaseTitrant, buildSample } from '../simulator/buildVessels.ts';
import { simulateRun } from '../simulator/simulateRun.ts';

/** Citric acid with sodium hydroxide; constants from test/reference/pka-handbook.json. */
export const benchTruth = { pKa: [3.128, 4.761, 6.396], concentration_M: 0.015, offset: 0.004 } as const;

/** All declared but the constants, the concentration and the offset, which are fitted. */
export const benchSheet: SheetFile = {
  sheet: 1,
  sample: {
    volume_mL: 25,
    extraWater_mL: 0,
    strongIon_M: 0,
    carbonate_M: 0,
    background_M: 0.1,
    analytes: [{ name: 'citric acid', groups: 3, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }],
  },
  titrant: { kind: 'base', concentration_M: 0.1, carbonate_M: 0, background_M: 0.1 },
  burette: { gain: 1, uSetting_mL: 0.003 },
  medium: { temperature_C: 25, activity: 'davies', pKw: 13.997 },
  reading: { kind: 'pH', scale: 'activity', offset: 'fitted', slope: 1, u: 0.005 },
};

/** A run of three groups with Davies, five quantities fitted: three constants, the concentration, the offset. Seeded. */
export function benchProblem(points: number): Problem {
  const end = 1.3 * 3 * (benchTruth.concentration_M / 0.1) * 25;
  const simulated = simulateRun({
    sample: buildSample({
      volume_mL: 25,
      background_M: 0.1,
      analytes: [
        {
          pKa: benchTruth.pKa,
          chargeFullyProtonated: 0,
          protonsLostAsWeighed: 0,
          concentration_M: benchTruth.concentration_M,
        },
      ],
    }),
    titrant: buildBaseTitrant({ concentration_M: 0.1, background_M: 0.1 }),
    medium: { temperature_C: 25, activity: 'davies', debyeHueckelA: debyeHueckelA(celsius(25)), pKw: 13.997 },
    volumes_mL: Array.from({ length: points }, (_, i) => (end * i) / (points - 1)),
    reading: { kind: 'pH', scale: 'activity', offset: benchTruth.offset },
    errors: { seed: 42, uReading: 0.005, uSetting_mL: 0.003 },
  });
  const complete = completeSheet(benchSheet, { readingKind: 'pH', titrantKind: 'base', groupsIfOpen: 3 });
  if (!complete.ok) throw new Error(JSON.stringify(complete.refusals));
  const problem = buildProblem([
    { sheet: complete.value, volumes: simulated.volumes_mL, readings: simulated.readings },
  ]);
  if (!problem.ok) throw new Error(JSON.stringify(problem.refusals));
  return problem.value;
}
