import { daviesFunction } from '../chemistry/davies.ts';
import { derivativeEndpoints } from '../endpoints/derivativeEndpoints.ts';
import type { ProblemRun } from '../model/problem.ts';
import { nominalValue, type Quantity } from '../model/quantity.ts';
import { groupOrders } from './groupOrders.ts';
import { type ProtonDemand, protonDemand } from './protonDemand.ts';

/** Where nothing suggests a constant, the middle of the scale. */
const openConstant = 7;
/** A constant beyond the readings is put this far outside, in pH. */
const beyondReadings = 1;
/** Shares of its proton taken between which an outermost group can be read off the end of a run. */
const readableShare = 0.03;
/** Multiples of the protons seen that all groups together may hold, where no step says more. */
const totalMultiples = [1, 1.03, 1.1, 1.25, 0.97, 0.9, 1.6, 2.2, 3.2];
/** How much of the first analyte's amount a second one may have, where no step says more. */
const amountRatios = [1, 2, 0.5, 4, 0.25];
/** Largest number of starts proposed for one run. */
const mostCandidates = 200;

/** A sample analyte of which something is not known. */
interface OpenAnalyte {
  readonly name: string;
  readonly groups: number;
  readonly z0: number;
  readonly lostAsWeighed: number;
  /** Positions among the quantities. */
  readonly concentration: number;
  readonly constants: readonly number[];
}

/**
 * Proposes values for all quantities of a run, several sets of them, without
 * help from the user: amounts from the steps of the curve and from the protons
 * seen altogether, constants from the readings at half of every step.
 */
export function startingValues(run: ProblemRun): Float64Array[] {
  const { quantities } = run.design;
  const nominal = Float64Array.from(quantities, (quantity) => nominalValue(quantity) ?? defaultStart(quantity));
  const candidates: Float64Array[] = [];
  const open = openAnalytes(run);
  const steps = derivativeEndpoints(run.volumes, run.readings).map((step) => step.volume_mL);

  for (const base of titrantStrengths(run, nominal, steps)) {
    const emptied = base.slice();
    for (const analyte of open) emptied[analyte.concentration] = 0;
    const demand = protonDemand(run, emptied);
    const strongIon = quantities.findIndex((quantity) => quantity.id === 'sample.strongIon');
    const strongIonOpen = isOpen(quantities[strongIon]);
    if (open.length === 0) {
      const values = base.slice();
      // With no analyte, what the balance lacks is the strong ion itself.
      if (strongIonOpen) values[strongIon] = -median(demand.lost) + base[strongIon];
      candidates.push(values);
      continue;
    }
    for (const amounts of openAmounts(open, base, quantities, demand, steps, run.volumes)) {
      for (const order of groupOrders(open.map((analyte) => analyte.groups))) {
        const values = base.slice();
        open.forEach((analyte, a) => {
          values[analyte.concentration] = amounts[a];
        });
        placeConstants(run, values, open, amounts, order, demand);
        candidates.push(values);
        if (candidates.length >= mostCandidates) return candidates;
      }
    }
  }
  return candidates;
}

function isOpen(quantity: Quantity): boolean {
  return quantity.declaration.state === 'fitted' && quantity.declaration.start === null;
}

/** Start of a fitted quantity before anything is known of the run. */
function defaultStart(quantity: Quantity): number {
  switch (quantity.role.kind) {
    case 'acidity':
      return openConstant;
    case 'buretteGain':
    case 'slope':
      return 1;
    case 'ionProduct':
      return 14;
    case 'sampleVolume':
      return 25;
    case 'standardPotential':
      return 400;
    case 'amount':
      return quantity.id === 'titrant.concentration' ? 0.1 : quantity.id.endsWith('concentration') ? 0.01 : 0;
    default:
      return 0;
  }
}

function openAnalytes(run: ProblemRun): OpenAnalyte[] {
  const { systems, quantities } = run.design;
  const position = (id: string) => quantities.findIndex((quantity) => quantity.id === id);
  return systems
    .filter((system) => system.role === 'analyte')
    .map((system) => ({
      name: system.name,
      groups: system.shape.groups,
      z0: system.shape.chargeFullyProtonated,
      // With its ions declared apart, an analyte counts from its uncharged form.
      lostAsWeighed: system.protonsLostAsWeighed ?? system.shape.chargeFullyProtonated,
      concentration: position(`${system.prefix}concentration`),
      constants: Array.from({ length: system.shape.groups }, (_, k) => position(`${system.prefix}pKa${k + 1}`)),
    }))
    .filter((analyte) => [analyte.concentration, ...analyte.constants].some((q) => isOpen(quantities[q])));
}

/** The strengths of the titrant to try: its declared one, or where it is fitted, those that put a step at an equivalence. */
function titrantStrengths(run: ProblemRun, nominal: Float64Array, steps: readonly number[]): Float64Array[] {
  const { quantities, systems } = run.design;
  const strength = quantities.findIndex((quantity) => quantity.id === 'titrant.concentration');
  if (strength < 0 || !isOpen(quantities[strength])) return [nominal];
  const sampleVolume = nominal[quantities.findIndex((quantity) => quantity.id === 'sample.volume')];
  const strengths: number[] = [];
  for (const system of systems) {
    if (system.role !== 'analyte') continue;
    const amount = nominal[quantities.findIndex((quantity) => quantity.id === `${system.prefix}concentration`)];
    const lost = system.protonsLostAsWeighed ?? 0;
    for (const volume of steps)
      for (let form = 0; form <= system.shape.groups; form++)
        if (form !== lost) strengths.push((Math.abs(form - lost) * amount * sampleVolume) / volume);
  }
  if (systems.every((system) => system.role !== 'analyte')) {
    const strongIon = nominal[quantities.findIndex((quantity) => quantity.id === 'sample.strongIon')];
    for (const volume of steps) strengths.push((Math.abs(strongIon) * sampleVolume) / volume);
  }
  const usable = [...new Set(strengths.filter((value) => value > 0 && Number.isFinite(value)))];
  return (usable.length > 0 ? usable : [nominal[strength]]).map((value) => {
    const values = nominal.slice();
    values[strength] = value;
    return values;
  });
}

/** Sets of concentrations of the open analytes, mol/L of sample. */
function openAmounts(
  open: readonly OpenAnalyte[],
  base: Float64Array,
  quantities: readonly Quantity[],
  demand: ProtonDemand,
  steps: readonly number[],
  volumes: Float64Array,
): number[][] {
  const unknown = open.filter((analyte) => isOpen(quantities[analyte.concentration]));
  const given = open.map((analyte) => base[analyte.concentration]);
  if (unknown.length === 0) return [given];
  const seen = demand.lost.reduce((best, value) => (Math.abs(value) > Math.abs(best) ? value : best), 0);
  const rising = seen >= 0;
  const atSteps = steps.map((volume) => demandAt(demand, volumes, volume));
  /** Protons the titrant can still exchange with one molecule. */
  const capacity = (analyte: OpenAnalyte) => (rising ? analyte.groups - analyte.lostAsWeighed : analyte.lostAsWeighed);
  const sets: number[][] = [];
  const push = (values: readonly number[]) => {
    if (values.every((value) => value > 0 && Number.isFinite(value)))
      sets.push(open.map((analyte, a) => (unknown.includes(analyte) ? values[unknown.indexOf(analyte)] : given[a])));
  };
  if (unknown.length === 1) {
    const [analyte] = unknown;
    const others = open.reduce((sum, o, a) => (o === analyte ? sum : sum + capacity(o) * given[a]), 0);
    // A single step is more often the last of several groups than the first.
    for (const protons of [...atSteps].reverse())
      for (let k = capacity(analyte); k >= 1; k--) {
        push([Math.abs(protons) / k]);
        if (others > 0) push([(Math.abs(protons) - others) / k]);
      }
    for (const multiple of totalMultiples)
      for (let k = capacity(analyte); k >= 1; k--) push([(Math.abs(seen) * multiple - others) / k]);
    if (capacity(analyte) <= 0) push([Math.abs(seen)]);
    return sets;
  }
  // Two or more: the first step to one of them, the second to the rest, and shares of everything seen.
  const capacities = unknown.map((analyte) => Math.max(1, capacity(analyte)));
  const protons = [...atSteps.map(Math.abs), Math.abs(seen)].sort((a, b) => a - b);
  for (let i = 0; i < protons.length; i++)
    for (let j = i + 1; j < protons.length; j++) {
      const parts = [protons[i], protons[j] - protons[i]];
      for (const pair of [parts, [...parts].reverse()])
        push(
          unknown.map((_, a) => pair[Math.min(a, 1)] / capacities[a] / (a === 0 ? 1 : Math.max(1, unknown.length - 1))),
        );
    }
  for (const ratio of amountRatios) {
    const weights = unknown.map((_, a) => (a === 0 ? 1 : ratio));
    const total = weights.reduce((sum, weight, a) => sum + weight * capacities[a], 0);
    push(weights.map((weight) => (weight * Math.abs(seen)) / total));
  }
  return sets;
}

/** Reads the constants of the open analytes off the demand curve, for groups that are lost in the given order. */
function placeConstants(
  run: ProblemRun,
  values: Float64Array,
  open: readonly OpenAnalyte[],
  amounts: readonly number[],
  order: readonly number[],
  demand: ProtonDemand,
): void {
  const { design } = run;
  let before = -open.reduce((sum, analyte, a) => sum + analyte.lostAsWeighed * amounts[a], 0);
  const next = open.map(() => 0);
  for (const a of order) {
    const analyte = open[a];
    const group = next[a]++;
    const quantity = analyte.constants[group];
    const { pH, ionicStrength } = readingAtDemand(demand, before, amounts[a]);
    before += amounts[a];
    if (!isOpen(design.quantities[quantity])) continue;
    const acidCharge = analyte.z0 - group;
    const shift =
      design.coefficientA > 0 ? (2 - 2 * acidCharge) * design.coefficientA * daviesFunction(ionicStrength) : 0;
    values[quantity] = pH + shift;
  }
}

/** p[H⁺] at which half of `amount` protons beyond `before` are lost, read off the curve or extrapolated from its ends. */
function readingAtDemand(demand: ProtonDemand, before: number, amount: number): { pH: number; ionicStrength: number } {
  const { pH, lost, ionicStrength } = demand;
  const target = before + 0.5 * amount;
  let lowest = 0;
  let highest = 0;
  for (let i = 0; i < pH.length; i++) {
    if (pH[i] < pH[lowest]) lowest = i;
    if (pH[i] > pH[highest]) highest = i;
    if (i === 0 || (lost[i - 1] - target) * (lost[i] - target) > 0 || lost[i] === lost[i - 1]) continue;
    const share = (target - lost[i - 1]) / (lost[i] - lost[i - 1]);
    return { pH: pH[i - 1] + share * (pH[i] - pH[i - 1]), ionicStrength: ionicStrength[i] };
  }
  const end = lost[lowest] > target ? lowest : highest;
  const share = (lost[end] - before) / amount;
  const readable = share > readableShare && share < 1 - readableShare;
  const distance = readable ? Math.log10((1 - share) / share) : end === lowest ? -beyondReadings : beyondReadings;
  return { pH: pH[end] + distance, ionicStrength: ionicStrength[end] };
}

function demandAt(demand: ProtonDemand, volumes: Float64Array, volume: number): number {
  let nearest = 0;
  for (let i = 1; i < volumes.length; i++)
    if (Math.abs(volumes[i] - volume) < Math.abs(volumes[nearest] - volume)) nearest = i;
  return demand.lost[nearest];
}

function median(values: Float64Array): number {
  const sorted = values.slice().sort();
  return sorted.length === 0 ? 0 : sorted[Math.floor(sorted.length / 2)];
}
