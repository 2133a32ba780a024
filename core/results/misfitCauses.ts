import type { ProblemFit } from '../fit/fitProblem.ts';
import type { WeightedRun } from '../fit/weightedProblem.ts';
import { ScoreTest } from '../inference/scoreTest.ts';
import { nominalValue } from '../model/quantity.ts';
import { designRun } from '../model/runDesign.ts';
import { RunModel } from '../model/runModel.ts';
import { studentQuantile } from '../numerics/studentQuantile.ts';
import type { Declaration } from '../sheet/declaration.ts';
import type { Sheet } from '../sheet/sheet.ts';
import { byVolume } from './byVolume.ts';
import { wandering, wanders } from './checks/wandering.ts';
import { refittedWith } from './refittedWith.ts';

/**
 * Chance that freeing a quantity which is right improves the fit this much. Five
 * are tried on every run, so that one sound run in 20,000 is doubted.
 */
const chance = 1e-5;
/** A cause that explains less than this part of what the best one explains is not named beside it. */
const besideTheBest = 0.5;
/** Carbonate beyond this part of the strength of a titrant is no explanation. */
const mostCarbonate = 0.5;

/** Fewer points that the robust fit does not believe are slips; so many may be what a cause explains. */
const fewestOfCause = 3;

/** Something declared that, were it free, would explain what the fit misses. */
export interface MisfitCause {
  readonly kind: 'carbonate' | 'electrode' | 'alkaline-end';
  /** Quantity that would have to be free. */
  readonly id: string;
  /** Value as declared, and about where it would go. */
  readonly value: number;
  readonly wanted: number;
  /** Standard deviations of chance to which the gain comes. */
  readonly strength: number;
}

interface Candidate {
  readonly kind: MisfitCause['kind'];
  readonly id: string;
  readonly isPossible: (wanted: number) => boolean;
}

/**
 * Causes that explain a misfit decisively: each is freed alone, by the score
 * test; the gain must be beyond chance, and what is left must look like noise,
 * so that a model which is wrong elsewhere is not blamed on them. Where the
 * misfit is large and the curve bent, the test alone leaves too much, and the
 * run is fitted again with the quantity free.
 *
 * @param distrusted points, by position, that the robust fit does not believe
 */
export function misfitCauses(
  fit: ProblemFit,
  index: number,
  sheet: Sheet,
  distrusted: readonly number[],
): MisfitCause[] {
  const weighted = fit.weighted.runs[index];
  if (fit.cost === null) return [];
  const columns = columnsOf(weighted, sheet);
  if (columns === null) return [];
  const found =
    distrusted.length >= fewestOfCause ? explain(fit, index, columns, []) : explain(fit, index, columns, distrusted);
  const best = found.reduce((most, { strength }) => Math.max(most, strength), 0);
  return found
    .filter(({ strength }) => strength ** 2 >= besideTheBest * best ** 2)
    .sort((a, b) => b.strength - a.strength);
}

function explain(fit: ProblemFit, index: number, columns: Columns, leftOut: readonly number[]): MisfitCause[] {
  const weighted = fit.weighted.runs[index];
  const noise = fit.noise[index];
  const freedom = noise.degreesOfFreedom - leftOut.length - 1;
  if (!(freedom >= 1)) return [];
  const test = new ScoreTest(fit, index, leftOut);
  const least = studentQuantile(1 - 0.5 * chance, freedom);
  const order = byVolume(weighted.run.volumes);
  const wandersNow = wanders(wandering(order.map((i) => test.now[i])));
  return candidatesOf(weighted).flatMap(({ kind, id, isPossible }) => {
    const entry = columns.get(id);
    const freed = entry === undefined ? null : test.freed(entry.column);
    if (entry === undefined || freed === null) return [];
    const wanted = entry.nominal + freed.shift;
    const scatter = Math.max(noise.declared ? 1 : 0, (test.cost - freed.gain) / freedom);
    const strength = Math.sqrt(freed.gain / scatter);
    if (!(strength > least) || !isPossible(wanted)) return [];
    const cause = { kind, id, value: entry.nominal, wanted, strength };
    if (!wanders(wandering(order.map((i) => freed.remaining[i])))) return [cause];
    const again = wandersNow ? refittedWith(fit, index, id, wanted) : null;
    return again !== null && isPossible(again.wanted) && again.strength > least ? [{ ...cause, ...again }] : [];
  });
}

function candidatesOf({ run, values }: WeightedRun): Candidate[] {
  const { design } = run;
  const valueFor = (id: string) => values[design.quantities.findIndex((quantity) => quantity.id === id)];
  const isFitted = (id: string) =>
    design.quantities.some((quantity) => quantity.id === id && quantity.declaration.state === 'fitted');
  const isPotential = run.sheet.reading.kind === 'mV';
  const strength = valueFor('titrant.concentration') ?? Number.POSITIVE_INFINITY;
  const candidates: Candidate[] = [
    { kind: 'carbonate', id: 'sample.carbonate', isPossible: (wanted) => wanted > 0 },
    {
      kind: 'electrode',
      id: isPotential ? 'reading.E0' : 'reading.offset',
      isPossible: () => true,
    },
    { kind: 'electrode', id: 'reading.slope', isPossible: (wanted) => wanted > 0 },
    // An electrode that answers to the cation of the base, too, reads a lower pH the more alkaline it is.
    {
      kind: 'alkaline-end',
      id: 'reading.junctionHydroxide',
      isPossible: (wanted) => (isPotential ? wanted > 0 : wanted < 0),
    },
  ];
  if (design.titrantKind === 'base')
    candidates.push({
      kind: 'carbonate',
      id: 'titrant.carbonate',
      isPossible: (wanted) => wanted > 0 && wanted < mostCarbonate * strength,
    });
  return candidates.filter(({ id }) => !isFitted(id));
}

type Columns = ReadonlyMap<
  string,
  {
    /** Value as declared, from which a quantity goes that is freed. */
    readonly nominal: number;
    readonly column: Float64Array;
  }
>;

/** Values, and derivatives of the readings, by all quantities of the run and by those that are fixed at nothing; null where there is no curve. */
function columnsOf(weighted: WeightedRun, sheet: Sheet): Columns | null {
  const { design } = weighted.run;
  const wider = designRun({
    ...sheet,
    sample: { ...sheet.sample, carbonate: present(sheet.sample.carbonate) },
    titrant: { ...sheet.titrant, carbonate: present(sheet.titrant.carbonate) },
    reading: { ...sheet.reading, junctionHydroxide: present(sheet.reading.junctionHydroxide) },
  });
  const values = Float64Array.from(wider.quantities, (quantity) => {
    const position = design.quantities.findIndex(({ id }) => id === quantity.id);
    return position >= 0 ? weighted.values[position] : (nominalValue(quantity) ?? Number.NaN);
  });
  if (!values.every(Number.isFinite)) return null;
  const { volumes } = weighted.model;
  const count = volumes.length;
  const model = new RunModel(wider, volumes, weighted.run.readings);
  if (!model.predict(values, new Float64Array(count))) return null;
  const derivatives = new Float64Array(wider.quantities.length * count);
  model.differentiate(Int32Array.from(wider.quantities.keys()), derivatives, new Float64Array(count));
  if (!derivatives.every(Number.isFinite)) return null;
  return new Map(
    wider.quantities.map(({ id, declaration }, q) => [
      id,
      {
        nominal: declaration.state === 'known' ? declaration.value : values[q],
        column: derivatives.slice(q * count, (q + 1) * count),
      },
    ]),
  );
}

/** Fixed at nothing, a quantity may have no place in the model; fitted from nothing, it has. */
function present(declaration: Declaration): Declaration {
  return declaration.state === 'fixed' && declaration.value === 0
    ? { state: 'fitted', start: 0, assumed: false }
    : declaration;
}
