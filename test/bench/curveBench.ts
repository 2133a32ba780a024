import { nominalValue } from '../../core/model/quantity.ts';
import { RunModel } from '../../core/model/runModel.ts';
import { benchProblem, benchTruth } from './benchRun.ts';
import { printTiming, timeOf } from './timeOf.ts';

/** A step of the constants as late iterations make it, so that a warm curve has something to do. */
const step = 1e-3;

interface WarmCurve {
  curve(): void;
  curveAndDerivatives(): void;
  model: RunModel;
}

function warmCurve(points: number): WarmCurve {
  const [run] = benchProblem(points).runs;
  const { design } = run;
  const model = new RunModel(design, run.volumes, run.readings);
  const values = Float64Array.from(design.quantities, (quantity) => nominalValue(quantity) ?? 0);
  const position = (id: string) => design.quantities.findIndex((quantity) => quantity.id === id);
  const wanted = Int32Array.from(['pKa1', 'pKa2', 'pKa3', 'concentration', 'reading.offset'], position);
  const readings = new Float64Array(points);
  const derivatives = new Float64Array(points * wanted.length);
  const slopes = new Float64Array(points);
  let call = 0;
  const curve = () => {
    call++;
    const shift = call % 2 === 0 ? step : -step;
    benchTruth.pKa.forEach((pKa, k) => {
      values[position(`pKa${k + 1}`)] = pKa + shift;
    });
    values[position('concentration')] = benchTruth.concentration_M * (1 + shift);
    if (!model.predict(values, readings)) throw new Error('the curve cannot be computed');
  };
  return {
    curve,
    curveAndDerivatives: () => {
      curve();
      model.differentiate(wanted, derivatives, slopes);
    },
    model,
  };
}

/** Newton steps per point, warm and cold, and times of curves with and without derivatives. */
export function curveBench(): string[] {
  const hundred = warmCurve(100);
  hundred.curve();
  const cold = hundred.model.equilibrium.newtonSteps / 100;
  const before = hundred.model.equilibrium.newtonSteps;
  for (let i = 0; i < 20; i++) hundred.curve();
  const warm = (hundred.model.equilibrium.newtonSteps - before) / 2000;
  const curve = timeOf(hundred.curve, 200);
  const both = timeOf(hundred.curveAndDerivatives, 200);
  const thousand = warmCurve(1000);
  const tenThousand = warmCurve(10000);
  const small = timeOf(thousand.curveAndDerivatives, 40);
  const large = timeOf(tenThousand.curveAndDerivatives, 4);
  return [
    'Curve of 100 points, three groups, Davies',
    `  Newton steps a point, cold                  ${cold.toFixed(2)} (at most 8)`,
    `  Newton steps a point, warm                  ${warm.toFixed(2)} (at most 2.5)`,
    `  bracketed searches                          ${hundred.model.equilibrium.searches}`,
    `  warm curve                                  ${printTiming(curve)}`,
    `  warm curve and derivatives                  ${printTiming(both)}`,
    `  derivatives included over curve alone       ${(both.median / curve.median).toFixed(2)} (at most 2)`,
    `  10,000 points over 1,000, with derivatives  ${(large.median / small.median).toFixed(2)} (at most 11)`,
  ];
}
