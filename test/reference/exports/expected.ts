import type { DoubtCode } from '../../../core/notice/doubt.ts';
import type { RefusalCode } from '../../../core/notice/refusal.ts';
import type { ProposalCode } from '../../../core/run/rowProposal.ts';
import type { ReadingKind } from '../../../core/run/run.ts';
import type { SuggestedKey } from '../../../core/run/setUpSuggestions.ts';
import type { TextEncodingName } from '../../../core/table/decodeText.ts';
import type { NumberMarks } from '../../../core/table/numberMarks.ts';
import type { Delimiter } from '../../../core/table/splitCells.ts';

/*
 * What must come out of the small exports beside this file. All figures are
 * invented; most files write the same few curves below, so that what must be
 * read is known without reading it.
 */

export type Points = readonly (readonly [volume_mL: number, reading: number])[];

export interface ExpectedRun {
  /** What the name of the run has after the file name. */
  readonly label?: string;
  readonly kind: ReadingKind;
  readonly points: Points;
  /** Line of the first point. */
  readonly firstLine: number;
  /** Lines of points that a rule excludes. */
  readonly excluded?: readonly number[];
  readonly notAccepted?: readonly (readonly [line: number, column: number | undefined, code: RefusalCode])[];
  readonly doubts?: readonly DoubtCode[];
  /** Left out where what is proposed is not what the file is there for. */
  readonly proposals?: readonly (readonly [code: ProposalCode, ...lines: readonly number[]])[];
  readonly temperatures_C?: readonly number[];
  readonly times_s?: readonly number[];
}

export interface ExpectedExport {
  readonly encoding?: TextEncodingName;
  readonly delimiter?: Delimiter;
  readonly marks?: NumberMarks;
  readonly runs?: readonly ExpectedRun[];
  readonly suggestions?: readonly (readonly [key: SuggestedKey, value: number, unit: string | null, line: number])[];
  /** Codes of the refusals where no run can be formed. */
  readonly refused?: readonly RefusalCode[];
}

const volumes = [0, 2, 4, 6, 8, 9, 10, 11, 12];
const along = (readings: readonly number[]): Points => readings.map((reading, index) => [volumes[index], reading]);

const acid = along([2.94, 3.71, 4.09, 4.45, 4.97, 5.42, 8.61, 11.3, 11.72]);
const secondAcid = along([3.02, 3.66, 4.15, 4.58, 5.21, 6.38, 10.87, 11.49, 11.83]);
const potentials = along([312.5, 267.4, 245.1, 223.8, 193, 166.6, -21.9, -180.4, -205.2]);
const micro: Points = [0, 0.4505, 0.9, 1.2345, 1.5, 1.75, 2, 2.25, 2.5].map((volume, at) => [volume, acid[at][1]]);

const point: NumberMarks = { decimal: '.', thousands: '' };
const comma: NumberMarks = { decimal: ',', thousands: '' };
const pH = (firstLine: number, points = acid): ExpectedRun => ({ kind: 'pH', points, firstLine });
const mV = (firstLine: number, points = potentials): ExpectedRun => ({ kind: 'mV', points, firstLine });
const replaced = (at: number, volume: number): Points =>
  acid.map((point, index) => (index === at ? [volume, point[1]] : point));
const without = (points: Points, ...indices: number[]): Points => points.filter((_, at) => !indices.includes(at));

/** By file name. */
export const expected: Readonly<Record<string, ExpectedExport>> = {
  'comma-and-point.csv': { encoding: 'UTF-8', delimiter: ',', marks: point, runs: [pH(2)] },
  'semicolon-and-decimal-comma.csv': { delimiter: ';', marks: comma, runs: [pH(2)] },
  'tab-no-header-derivative-empty-last-cell.txt': {
    delimiter: '\t',
    marks: point,
    runs: [{ ...pH(1), doubts: ['column-guessed'] }],
  },
  'ruled-with-bars.txt': { delimiter: '|', runs: [pH(3)] },
  'aligned-with-spaces.txt': { delimiter: 'spaces', runs: [pH(4)] },
  'quoted-decimal-comma.csv': { delimiter: ',', marks: comma, runs: [pH(2)] },
  'decimal-comma-between-commas.csv': { refused: ['table-delimiter-unclear'] },
  'settings-above-windows-1252.csv': { encoding: 'Windows-1252', delimiter: ';', marks: comma, runs: [pH(7)] },
  'units-row-under-header.csv': { encoding: 'Windows-1252', marks: comma, runs: [pH(3)] },
  'utf-16-little-endian-with-mark.txt': { encoding: 'UTF-16LE', delimiter: '\t', runs: [pH(2)] },
  'utf-16-big-endian-without-mark.txt': { encoding: 'UTF-16BE', delimiter: '\t', runs: [pH(2)] },
  'bare-carriage-returns.txt': { delimiter: '\t', runs: [pH(2)] },
  'utf-8-mark-and-crlf.csv': { encoding: 'UTF-8', delimiter: ';', marks: point, runs: [pH(2)] },
  'missing-marks.csv': {
    runs: [
      {
        ...pH(2, without(acid, 1, 3, 4, 5, 7)),
        notAccepted: [
          [3, 2, 'cell-missing'],
          [5, 2, 'cell-missing'],
          [6, 2, 'cell-missing'],
          [7, 2, 'cell-missing'],
          [9, 1, 'cell-missing'],
        ],
        doubts: ['rows-not-accepted'],
      },
    ],
  },
  'units-in-cells.txt': { delimiter: '\t', runs: [pH(2)] },
  'microlitres-grouped-with-points.csv': { marks: { decimal: ',', thousands: '.' }, runs: [pH(2, micro)] },
  'microlitres-grouped-with-commas.txt': { marks: { decimal: '.', thousands: ',' }, runs: [pH(2, micro)] },
  'exponents.csv': { delimiter: ',', marks: point, runs: [pH(2)] },
  'typographic-minus-millivolts.csv': { marks: comma, runs: [mV(2)] },
  'windows-1252-dash-as-minus.csv': { encoding: 'Windows-1252', runs: [mV(2)] },
  'volts-in-header.csv': { runs: [mV(2)] },
  'litres.csv': { runs: [pH(2)] },
  'stacked-with-sample-column.csv': {
    runs: [
      { ...pH(2), label: 'blank 1' },
      { ...pH(11, secondAcid), label: 'lot 7' },
    ],
  },
  'stacked-volume-restarts.csv': {
    runs: [
      { ...pH(2), label: '1' },
      { ...pH(11, secondAcid), label: '2', doubts: ['run-split-guessed'] },
    ],
  },
  'blocks-with-own-headers.csv': {
    runs: [
      { ...pH(3), label: 'north' },
      { ...pH(15, secondAcid), label: 'south' },
    ],
  },
  'side-by-side-with-captions.csv': {
    runs: [
      { ...pH(3), label: 'first' },
      { ...pH(3, secondAcid.slice(0, 7)), label: 'second' },
    ],
  },
  'one-volume-two-electrodes.csv': {
    runs: [
      { ...pH(2), label: 'pH A' },
      { ...pH(2, along([3.04, 3.81, 4.19, 4.55, 5.07, 5.52, 8.71, 11.4, 11.82])), label: 'pH B' },
    ],
  },
  'results-table-below.csv': { runs: [{ ...pH(2), notAccepted: [[14, undefined, 'row-outside-run']] }] },
  'remarks-between-rows.csv': { runs: [pH(2)] },
  'hash-comments-and-header.txt': { delimiter: 'spaces', runs: [pH(3)] },
  'reading-of-47.csv': {
    runs: [
      {
        ...pH(2, along([2.94, 3.71, 4.09, 4.45, 47, 5.42, 8.61, 11.3, 11.72])),
        excluded: [6],
        doubts: ['reading-beyond-range'],
      },
    ],
  },
  'every-reading-beyond-range.csv': {
    runs: [
      {
        ...pH(
          2,
          [0, 1, 2, 3, 4, 5].map((volume) => [volume, 47]),
        ),
        excluded: [2, 3, 4, 5, 6, 7],
        doubts: ['reading-beyond-range'],
      },
    ],
  },
  'negative-volume.csv': {
    runs: [
      {
        ...pH(2, [
          [-1, 2.9],
          [0, 2.94],
          [2, 3.71],
          [4, 4.09],
        ]),
        excluded: [2],
        doubts: ['volume-beyond-range'],
      },
    ],
  },
  'volume-steps-back.csv': {
    runs: [
      {
        ...pH(
          2,
          acid.slice(0, 7).map(([volume, reading]) => [volume === 8 ? 0.8 : volume, reading]),
        ),
        doubts: ['volume-steps-back'],
      },
    ],
  },
  'volumes-run-backwards.csv': { runs: [{ ...pH(2, acid.toReversed()), doubts: ['volume-steps-back'] }] },
  'one-point.csv': { runs: [pH(2, [[1, 4.2]])] },
  'two-points.csv': {
    runs: [
      pH(2, [
        [0, 2.51],
        [1, 4.2],
      ]),
    ],
  },
  'thousands-or-decimals.csv': {
    delimiter: ';',
    marks: comma,
    runs: [
      {
        ...mV(2, [
          [1.234, 345],
          [1.468, 341],
          [1.702, 336],
        ]),
        doubts: ['delimiter-guessed'],
      },
    ],
  },
  'one-number-or-two.csv': { runs: [{ ...mV(1, [[1, 234]]), doubts: ['delimiter-guessed', 'column-guessed'] }] },
  'number-time-temperature-columns.csv': { delimiter: ';', marks: comma, runs: [pH(2)] },
  'readings-before-volumes.txt': { runs: [{ ...pH(1), doubts: ['column-guessed'] }] },
  'headed-ph-but-millivolts.csv': { runs: [{ ...mV(2), doubts: ['column-guessed'] }] },
  'headers-over-wrong-columns.csv': {
    runs: [
      {
        ...pH(
          2,
          acid.map(([volume, reading]) => [3 * volume, reading]),
        ),
        doubts: ['column-guessed'],
      },
    ],
  },
  'no-second-column.txt': { refused: ['table-no-columns'] },
  'time-and-temperature-only.csv': { refused: ['table-no-columns'] },
  'picture-named-as-export.csv': { refused: ['file-not-text'] },
  'empty.csv': { refused: ['file-empty'] },
  'blank-lines-only.csv': { refused: ['file-empty'] },
  'quote-that-never-closes.csv': {
    runs: [
      {
        ...pH(2, without(acid, 2).slice(0, 4)),
        notAccepted: [[4, 1, 'cell-not-a-number']],
        doubts: ['rows-not-accepted'],
      },
    ],
  },
  'header-quoted-over-two-lines.csv': { runs: [pH(3)] },
  'decimal-comma-slip.csv': {
    marks: point,
    runs: [
      {
        ...pH(2, without(acid, 2).slice(0, 4)),
        notAccepted: [[4, 2, 'cell-not-a-number']],
        doubts: ['rows-not-accepted'],
      },
    ],
  },
  'comma-slip-in-comma-table.csv': {
    runs: [
      {
        ...pH(2, without(acid, 2).slice(0, 4)),
        notAccepted: [[4, 3, 'row-wrong-width']],
        doubts: ['rows-not-accepted'],
      },
    ],
  },
  'markup-and-formula-cells.csv': {
    runs: [
      {
        ...pH(2, without(acid, 1, 2).slice(0, 3)),
        notAccepted: [
          [3, 1, 'cell-not-a-number'],
          [4, 2, 'cell-not-a-number'],
        ],
        doubts: ['rows-not-accepted'],
      },
    ],
  },
  'empty-last-cell-on-every-row.csv': { delimiter: ';', runs: [pH(2)] },
  'words-french.csv': { runs: [mV(2)] },
  'words-spanish.csv': { runs: [pH(2)] },
  'words-italian.csv': { runs: [pH(2)] },
  'words-portuguese.csv': { delimiter: '\t', runs: [mV(2)] },
  'words-dutch.csv': { runs: [{ ...pH(2), doubts: ['column-guessed'] }] },
  'increments-in-header.csv': { runs: [{ ...pH(2), proposals: [] }] },
  'increments-only-by-figures.csv': { runs: [{ ...pH(2), doubts: ['volume-meaning-guessed'] }] },
  'increment-missing.csv': {
    runs: [
      {
        ...pH(
          2,
          without(acid, 3).map(([volume, reading]) => [volume > 6 ? volume - 2 : volume, reading]),
        ),
        notAccepted: [[5, 1, 'cell-missing']],
        doubts: ['dose-missing', 'rows-not-accepted'],
      },
    ],
  },
  'burette-reading-above-zero.csv': { runs: [{ ...pH(2), proposals: [] }] },
  'burette-reading-french-above-zero.csv': { runs: [pH(2)] },
  'start-above-zero-only-by-figures.csv': {
    runs: [
      {
        ...pH(
          2,
          secondAcid.map(([, reading], at) => [1.5 * at, reading]),
        ),
        doubts: ['volume-meaning-guessed'],
      },
    ],
  },
  'burette-counts-down.csv': { runs: [{ ...pH(2), proposals: [] }] },
  'counts-down-only-by-figures.csv': { runs: [{ ...pH(2), doubts: ['volume-meaning-guessed'] }] },
  'slipped-digit.csv': {
    runs: [{ ...pH(2, replaced(4, 80)), doubts: ['volume-steps-back'], proposals: [['volume-slipped', 6]] }],
  },
  'slipped-decimal-mark.csv': {
    runs: [{ ...pH(2, replaced(3, 0.6)), doubts: ['volume-steps-back'], proposals: [['volume-slipped', 5]] }],
  },
  'stuck-sensor.csv': {
    runs: [
      {
        ...pH(
          2,
          [3.1, 3.35, 3.6, 3.84, 4.1, 4.1, 4.1, 4.1, 4.1, 4.1, 5.6, 5.88, 6.2, 6.7].map((reading, at) => [at, reading]),
        ),
        proposals: [['sensor-stuck', 7, 8, 9, 10, 11]],
      },
    ],
  },
  'isolated-spike.csv': {
    runs: [
      { ...pH(2, along([2.94, 3.71, 7.77, 4.45, 4.97, 5.42, 8.61, 11.3, 11.72])), proposals: [['reading-spike', 4]] },
    ],
  },
  'spike-in-millivolts.csv': {
    runs: [
      {
        ...mV(2, along([312.5, 267.4, 245.1, -310, 193, 166.6, -21.9, -180.4, -205.2])),
        proposals: [['reading-spike', 5]],
      },
    ],
  },
  'beyond-two-volts.csv': {
    runs: [
      {
        ...mV(2, along([312.5, 267.4, 9999, 223.8, 193, 166.6, -21.9, -180.4, -205.2])),
        excluded: [4],
        doubts: ['reading-beyond-range'],
        proposals: [['reading-beyond-range', 4]],
      },
    ],
  },
  'row-written-twice.csv': {
    runs: [{ ...pH(2, [...acid.slice(0, 4), ...acid.slice(3)]), proposals: [['row-duplicated', 6]] }],
  },
  'several-readings-at-one-volume.csv': {
    runs: [
      {
        ...pH(2, [...acid.slice(0, 3), [4, 4.11], acid[3], [6, 4.47], ...acid.slice(4)]),
        proposals: [
          ['volume-repeated', 4, 5],
          ['volume-repeated', 6, 7],
        ],
      },
    ],
  },
  'temperature-in-kelvin-and-minutes.csv': {
    runs: [{ ...pH(2), temperatures_C: acid.map(() => 25), times_s: acid.map((_, at) => 30 * at) }],
  },
  'time-of-day.csv': { runs: [{ ...pH(2), times_s: acid.map((_, at) => 36030 + 60 * at) }] },
  'microlitres-in-units-row.txt': { runs: [pH(3)] },
  'set-up-above-german.csv': {
    runs: [pH(7)],
    suggestions: [
      ['sample.volume_mL', 25, 'mL', 2],
      ['titrant.concentration_M', 0.1002, 'mol/L', 3],
      ['medium.temperature_C', 24.5, '°C', 4],
    ],
  },
  'set-up-above-french.csv': {
    runs: [pH(8)],
    suggestions: [
      ['sample.volume_mL', 20, 'mL', 2],
      ['sample.extraWater_mL', 30, 'mL', 3],
      ['titrant.concentration_M', 0.105, 'mol/L', 4],
      ['medium.temperature_C', 22, '°C', 5],
    ],
  },
  'set-up-in-cells-spanish.csv': {
    runs: [pH(6)],
    suggestions: [
      ['sample.volume_mL', 10, 'mL', 1],
      ['titrant.concentration_M', 0.0987, 'mM', 2],
      ['medium.temperature_C', 24, 'K', 3],
    ],
  },
  'set-up-in-one-line.txt': {
    runs: [pH(4)],
    suggestions: [
      ['sample.volume_mL', 15, 'mL', 1],
      ['titrant.concentration_M', 0.0512, 'M', 1],
      ['medium.temperature_C', 21.5, '°C', 1],
    ],
  },
  'control-characters-in-cells.csv': {
    runs: [
      {
        ...pH(2, without(acid, 5, 6)),
        notAccepted: [
          [7, 2, 'cell-not-a-number'],
          [8, 2, 'cell-not-a-number'],
        ],
        doubts: ['rows-not-accepted'],
      },
    ],
  },
  'very-long-line.csv': { runs: [pH(2)] },
  'numbers-in-blocks-with-remark.csv': { runs: [pH(2)] },
  'exponents-with-capital-and-comma.csv': { delimiter: ';', marks: comma, runs: [mV(2)] },
};
