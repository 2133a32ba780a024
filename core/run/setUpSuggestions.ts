import type { NumberMarks } from '../table/numberMarks.ts';
import { parseNumber } from '../table/parseNumber.ts';
import type { TextLine } from '../table/table.ts';
import { plainWords } from './plainWords.ts';

/** Keys of the sheet for which a file may name a value. */
export type SuggestedKey =
  | 'sample.volume_mL'
  | 'sample.extraWater_mL'
  | 'sample.analytes.0.concentration_M'
  | 'titrant.concentration_M'
  | 'medium.temperature_C';

/** A value that a line of the file seems to give for a key of the sheet; never applied by itself. */
export interface SetUpSuggestion {
  readonly key: SuggestedKey;
  /** In the unit of the key: mL, mol/L, °C. */
  readonly value: number;
  /** The unit as it stands in the file; null where none does and the unit of the key was taken. */
  readonly unit: string | null;
  readonly line: number;
  /** The line as it stands in the file. */
  readonly text: string;
}

type Kind = 'volume' | 'concentration' | 'temperature';

/** What one of a unit is in the unit of the key. Molar strengths and normalities agree for the titrants meant here. */
const UNITS: readonly (readonly [pattern: RegExp, kind: Kind, convert: (value: number) => number])[] = [
  [/^m(?:mol|illimol)(?:es?)?\W*(?:l|dm)/i, 'concentration', (value) => value / 1000],
  [/^mM(?![a-z])/, 'concentration', (value) => value / 1000],
  [/^mol(?:es?)?\W*(?:l|dm)/i, 'concentration', (value) => value],
  [/^[MN](?![\p{L}\d])/u, 'concentration', (value) => value],
  [/^(?:ml|cm3|cm³|ccm|millilit(?:er|re)s?)(?![a-z])/i, 'volume', (value) => value],
  [/^(?:[µμu]l|mikroliter|microlit(?:er|re)s?)(?![a-z])/i, 'volume', (value) => value / 1000],
  [/^(?:l|dm3|dm³|lit(?:er|re)s?)(?![a-z])/i, 'volume', (value) => value * 1000],
  [/^(?:[°º] ?c|℃|deg ?c|celsius)(?![a-z])/i, 'temperature', (value) => value],
  [/^(?:k|kelvin)(?![\p{L}])/iu, 'temperature', (value) => Number((value - 273.15).toPrecision(12))],
];

const TITRANT =
  /titr(?!ation)|burett?e|lauge|masslosung|maßlosung|\b(?:naoh|koh|hcl|hclo4|hno3|h2so4|naohlsg|base|soude|sosa|soda)\b/;
const SAMPLE =
  /sample|probe|vorlage|aliquot|prise|echantillon|muestra|campione|amostra|monster|alicuot|analyt|initial vol|vol\w* initial|startvol|anfangsvol|beaker|\bv ?0\b/;
const WATER = /water|wasser|\beau\b|agua|acqua|verdunn|dilut/;
const STRENGTH = /conc|konz|strength|molar|normal|titer\b|titre\b|titolo|sterkte|\bc\b|gehalt/;
const TEMPERATURE = /temp|^t$/;

const FIGURE = /[-+−]?\d[\d.,]*(?:[eE][-+−]?\d+)?/g;

/** Ranges in which a suggestion makes sense; beyond them the line speaks of something else. */
const POSSIBLE: Readonly<Record<Kind, readonly [lowest: number, highest: number]>> = {
  volume: [0.001, 1e5],
  concentration: [1e-7, 20],
  temperature: [-20, 120],
};

/** Settings are short lines; what stands further on is not looked at, so that no line can hold up the rest. */
const LONGEST_READ = 200;

/** What lines beside the tables seem to say about the set-up; one value per key, the first that is found. */
export function setUpSuggestions(lines: readonly TextLine[], marks: NumberMarks): readonly SetUpSuggestion[] {
  const found = new Map<SuggestedKey, SetUpSuggestion>();
  for (const { line, text } of lines) {
    for (const part of partsOf(text.slice(0, LONGEST_READ))) {
      const suggestion = suggestionIn(part, marks);
      if (suggestion !== undefined && !found.has(suggestion.key)) {
        found.set(suggestion.key, { ...suggestion, line, text });
      }
    }
  }
  return [...found.values()];
}

/** A line may hold several settings: "c = 0.1 M; T = 25 °C". Cells of one setting stay together. */
function partsOf(text: string): readonly string[] {
  const parts = text.split(/;\s+|,\s+(?=\p{L})|\s{3,}(?=\p{L})/u);
  return parts.filter((part) => /\d/.test(part) && /\p{L}/u.test(part));
}

function suggestionIn(part: string, marks: NumberMarks): Omit<SetUpSuggestion, 'line' | 'text'> | undefined {
  for (const figure of part.matchAll(FIGURE)) {
    const before = part.slice(0, figure.index);
    const behind = part.slice(figure.index + figure[0].length);
    // Figures inside words, formulas, dates and times are no settings.
    if (/[\p{L}\d:/]$/u.test(before) || /^[:/]\d/.test(behind)) continue;
    const value = settingValue(figure[0].replace(/[.,]+$/, ''), marks);
    if (value === undefined) continue;
    const unitText =
      behind.replace(/^[\s;,\t|"[(]+/, '') || (/[[(/]\s*([^\])]+?)\s*[\])]?\s*[:=;,\t|\s]*$/.exec(before)?.[1] ?? '');
    const unit = UNITS.find(([pattern]) => pattern.test(unitText)) ?? unitInLabel(before);
    const words = plainWords(`${before} ${behind}`.replace(/[:=;,\t|#()[\]]+/g, ' ')).trim();
    const kind =
      unit?.[1] ??
      kindOfWords(
        plainWords(before)
          .replace(/[:=;,\t|#]+/g, ' ')
          .trim(),
      );
    const key = kind === undefined ? undefined : keyOf(kind, words, plainWords(before));
    if (kind === undefined || key === undefined) continue;
    const converted = unit === undefined ? value : unit[2](value);
    const [lowest, highest] = POSSIBLE[kind];
    if (!(converted >= lowest && converted <= highest)) continue;
    const written =
      unit === undefined ? null : (unit[0].exec(unitText)?.[0] ?? unit[0].exec(labelUnit(before))?.[0] ?? null);
    return { key, value: converted, unit: written };
  }
  return undefined;
}

function labelUnit(before: string): string {
  return /[[(/]\s*([^\])[(/]+?(?:\/[^\])]+?)?)\s*[\])]?\s*[:=;,\t|\s]*$/.exec(before)?.[1] ?? '';
}

function unitInLabel(before: string): (typeof UNITS)[number] | undefined {
  const text = labelUnit(before);
  return text === '' ? undefined : UNITS.find(([pattern]) => pattern.test(text));
}

/** In the marks of the table, else in the other ones, for heads of files are often written by another hand. */
function settingValue(text: string, marks: NumberMarks): number | undefined {
  const value = parseNumber(text, marks);
  if (typeof value === 'number') return value;
  const other = parseNumber(text, { decimal: marks.decimal === '.' ? ',' : '.', thousands: '' });
  return typeof other === 'number' ? other : undefined;
}

/** Without a unit only words that leave no doubt count. */
function kindOfWords(label: string): Kind | undefined {
  if (TEMPERATURE.test(label)) return 'temperature';
  if (STRENGTH.test(label) && (TITRANT.test(label) || SAMPLE.test(label))) return 'concentration';
  if (/vol/.test(label) && SAMPLE.test(label)) return 'volume';
  return undefined;
}

function keyOf(kind: Kind, words: string, label: string): SuggestedKey | undefined {
  if (kind === 'temperature')
    return TEMPERATURE.test(label.replace(/[^a-z]+/g, ' ').trim()) ? 'medium.temperature_C' : undefined;
  if (kind === 'volume') {
    if (WATER.test(words)) return 'sample.extraWater_mL';
    return SAMPLE.test(words) && !/titr(?!ation)|burett?e|increment|dos/.test(words) ? 'sample.volume_mL' : undefined;
  }
  if (SAMPLE.test(words) && !TITRANT.test(words)) return 'sample.analytes.0.concentration_M';
  return TITRANT.test(words) || STRENGTH.test(words) ? 'titrant.concentration_M' : undefined;
}
