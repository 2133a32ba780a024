import type { VolumeMeaning } from './readingChoices.ts';

export interface MeaningChoice {
  readonly meaning: VolumeMeaning;
  /** Whether the figures alone, or against the header, decided. */
  readonly guessed: boolean;
}

/** Fewer steps than this show no habit. */
const FEWEST_STEPS = 5;

/** Of the steps up and down, increments have at least this share of either kind. */
const EITHER_WAY = 0.2;

/** Additions that stay the same, or fall and never rise, repeat themselves in this share of the steps. */
const MOSTLY_EQUAL = 0.5;

/** A run whose readings go one way in this share of the steps is in the order in which it was measured. */
const IN_ORDER = 0.8;

/** A burette that counts down goes down in this share of the steps. */
const MOSTLY_DOWN = 0.9;

/** A first volume of so many steps is more than a first addition. */
const MORE_THAN_A_DOSE = 1.5;

/** Share of steps of the same size from which on doses are regular, and how near a multiple of them is meant, in steps. */
const REGULAR = 0.6;
const NEAR_A_MULTIPLE = 0.1;

const READING = '(?:reading|lecture|lectura|lettura|leitura|stand|ablesung|anzeige|niveau|aflezing|level)';
const BURETTE_READING = new RegExp(`bur+et\\w*\\W*${READING}|${READING}\\W.*bur+et|^${READING}\\W*(?:ml|$)`);
const LEFT = /\b(?:remaining|left|rest\w*|verbleib\w*|rimanent\w*|overgebleven|resterend\w*)\b/;
const ADDED =
  /\b(?:added|addition|zugegeb\w*|zugesetzt\w*|zugabe|verbrauch\w*|vers[ea]\w*|ajout\w*|anadid\w*|agregad\w*|aggiunt\w*|adicionad\w*|toegevoegd\w*|cumul\w*|kumul\w*|total\w*|gesamt\w*)\b/;

/**
 * What the figures of a volume column are, by its header and by how they
 * behave beside the readings. Both arrays are in the order of the file, with
 * NaN where a cell is no number; `name` is the header without accents in lower
 * case, `increment` whether it says that the column holds single additions.
 */
export function volumeMeaning(
  volumes: Float64Array,
  readings: Float64Array,
  name: string,
  increment: boolean,
): MeaningChoice {
  const steps = stepsOf(volumes);
  const cumulative = steps.count >= FEWEST_STEPS && steps.falls === 0 && steps.rises > (1 - EITHER_WAY) * steps.count;
  if (increment) {
    const sum = cumulative && steps.first <= MORE_THAN_A_DOSE * steps.size && steps.regular >= REGULAR;
    return sum ? { meaning: 'cumulative', guessed: true } : { meaning: 'increments', guessed: false };
  }
  const down = steps.falls >= MOSTLY_DOWN * steps.count && steps.count >= 2;
  // A table in falling order ends where the titration began, at about zero.
  const endsAboveZero = steps.last > MORE_THAN_A_DOSE * steps.size;
  if (LEFT.test(name)) return { meaning: down ? 'countingDown' : 'cumulative', guessed: !down };
  if (BURETTE_READING.test(name)) {
    if (down) return { meaning: 'countingDown', guessed: false };
    return { meaning: steps.first > 0 ? 'burette' : 'cumulative', guessed: false };
  }
  if (steps.count < FEWEST_STEPS) return { meaning: 'cumulative', guessed: false };
  if (steps.lowest >= 0 && looksLikeIncrements(steps) && inOrder(readings)) {
    return { meaning: 'increments', guessed: true };
  }
  if (ADDED.test(name)) return { meaning: 'cumulative', guessed: false };
  if (down && endsAboveZero && steps.lowest >= 0) return { meaning: 'countingDown', guessed: true };
  const offset = steps.first / steps.size;
  const oddStart = offset > MORE_THAN_A_DOSE && Math.abs(offset - Math.round(offset)) > NEAR_A_MULTIPLE;
  if (steps.falls === 0 && steps.regular >= REGULAR && oddStart) return { meaning: 'burette', guessed: true };
  return { meaning: 'cumulative', guessed: false };
}

interface Steps {
  readonly count: number;
  readonly rises: number;
  readonly falls: number;
  readonly first: number;
  readonly last: number;
  readonly lowest: number;
  /** Most frequent size of a step that is not zero; 0 where there is none. */
  readonly size: number;
  /** Share of the steps that have this size. */
  readonly regular: number;
}

function stepsOf(values: Float64Array): Steps {
  const sizes = new Map<number, number>();
  let count = -1;
  let rises = 0;
  let falls = 0;
  let first = 0;
  let last = 0;
  let lowest = Number.POSITIVE_INFINITY;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    count += 1;
    if (count === 0) first = value;
    else if (value !== last) {
      if (value > last) rises += 1;
      else falls += 1;
      const size = Math.round(Math.abs(value - last) * 1e6);
      // Irregular columns need no complete list.
      if (sizes.size < 1000 || sizes.has(size)) sizes.set(size, (sizes.get(size) ?? 0) + 1);
    }
    lowest = Math.min(lowest, value);
    last = value;
  }
  let size = 0;
  let times = 0;
  for (const [candidate, found] of sizes) {
    if (found > times) {
      size = candidate / 1e6;
      times = found;
    }
  }
  return { count: Math.max(0, count), rises, falls, first, last, lowest, size, regular: count > 0 ? times / count : 0 };
}

/** Additions go up and down in size, or stay as they are; sums only rise, but for a slip. */
function looksLikeIncrements({ count, rises, falls, last, lowest }: Steps): boolean {
  const moves = rises + falls;
  const equal = count - moves;
  if (last === 0 && lowest === 0 && moves === 0) return false;
  if (moves <= 1) return equal >= MOSTLY_EQUAL * count;
  if (falls > 0 && rises <= 1) return equal >= MOSTLY_EQUAL * count;
  return falls >= 2 && rises >= EITHER_WAY * moves && falls >= EITHER_WAY * moves;
}

function inOrder(readings: Float64Array): boolean {
  let up = 0;
  let down = 0;
  let count = 0;
  let last = Number.NaN;
  for (const value of readings) {
    if (Number.isNaN(value)) continue;
    if (!Number.isNaN(last)) {
      count += 1;
      if (value > last) up += 1;
      else if (value < last) down += 1;
    }
    last = value;
  }
  return Math.max(up, down) >= IN_ORDER * count;
}
