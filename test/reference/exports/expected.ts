import type { DoubtCode } from '../../../core/notice/doubt.ts';
import type { RefusalCode } from '../../../core/notice/refusal.ts';
import type { ReadingKind } from '../../../core/run/run.ts';
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
}

export interface ExpectedExport {
  readonly encoding?: TextEncodingName;
  readonly delimiter?: Delimiter;
  readonly marks?: NumberMarks;
  readonly runs?: readonly ExpectedRun[];
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
};
