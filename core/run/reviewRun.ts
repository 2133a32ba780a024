import type { Doubt } from '../notice/doubt.ts';
import type { Refusal } from '../notice/refusal.ts';
import { listLines } from './listLines.ts';
import type { ReadingKind, RunRow } from './run.ts';

/** What is suspicious about the rows of a run; each kind of doubt once, naming its lines. */
export function reviewRun(
  rows: readonly RunRow[],
  notAccepted: readonly Refusal[],
  kind: ReadingKind,
  file: string,
): readonly Doubt[] {
  return [
    ...rowsNotAccepted(notAccepted, file),
    ...volumesBeyondRange(rows, file),
    ...readingsBeyondRange(rows, kind, file),
    ...volumesStepBack(rows, file),
  ];
}

function rowsNotAccepted(refusals: readonly Refusal[], file: string): Doubt[] {
  if (refusals.length === 0) return [];
  const lines = refusals.map((refusal) => refusal.place.line ?? 0);
  const one = lines.length === 1;
  return [
    {
      code: 'rows-not-accepted',
      seen: `${one ? 'One row' : `${lines.length} rows`} could not be used (${listLines(lines)}).`,
      means: `The run goes on without ${one ? 'it' : 'them'}; a missing point near a step widens the uncertainties.`,
      remedy: 'See what stood there, and complete the file if the points were measured.',
      place: { file, line: lines[0] },
    },
  ];
}

function volumesBeyondRange(rows: readonly RunRow[], file: string): Doubt[] {
  const beyond = rows.filter(
    ({ volume_mL, decision }) => decision.use === 'excluded' && (volume_mL < 0 || volume_mL > 1e5),
  );
  if (beyond.length === 0) return [];
  return [
    {
      code: 'volume-beyond-range',
      seen: `Volumes that no burette gives: ${beyond[0].volume_mL} mL (${listLines(beyond.map(({ line }) => line))}).`,
      means: 'Such rows are kept but excluded.',
      remedy: 'Correct the volume, or its unit, in the file.',
      place: { file, line: beyond[0].line },
    },
  ];
}

function readingsBeyondRange(rows: readonly RunRow[], kind: ReadingKind, file: string): Doubt[] {
  const beyond = rows.filter(({ reading }) => (kind === 'pH' ? reading < 0 || reading > 14 : Math.abs(reading) > 2000));
  if (beyond.length === 0) return [];
  const range = kind === 'pH' ? 'pH 0–14' : '±2000 mV';
  return [
    {
      code: 'reading-beyond-range',
      seen: `Readings beyond ${range}: ${beyond[0].reading} (${listLines(beyond.map(({ line }) => line))}).`,
      means: `No electrode gives this; ${beyond.length === rows.length ? 'all rows are' : 'such rows are kept but'} excluded.`,
      remedy: 'Check the decimal mark and the column, or correct the reading in the file.',
      place: { file, line: beyond[0].line },
    },
  ];
}

function volumesStepBack(rows: readonly RunRow[], file: string): Doubt[] {
  const back = rows.filter(({ volume_mL }, index) => index > 0 && volume_mL < rows[index - 1].volume_mL);
  if (back.length === 0) return [];
  const first = rows[0];
  const last = rows[rows.length - 1];
  const backwards = back.length >= 2 && back.length >= 0.9 * (rows.length - 1);
  const before = rows[rows.indexOf(back[0]) - 1];
  return [
    {
      code: 'volume-steps-back',
      seen: backwards
        ? `The volumes run backwards, from ${first.volume_mL} mL in line ${first.line} to ${last.volume_mL} mL in line ${last.line}.`
        : `The volume steps back from ${before.volume_mL} to ${back[0].volume_mL} mL (${listLines(back.map(({ line }) => line))}).`,
      means: backwards
        ? 'Burettes that count down show what is left, not what was added.'
        : 'Titrant cannot be taken back: a figure slipped, a burette was refilled, or two runs follow each other.',
      remedy: backwards
        ? 'Give the volume added at each point.'
        : 'Compare these lines with the record; correct the file or exclude the points.',
      place: { file, line: back[0].line, volume_mL: back[0].volume_mL },
    },
  ];
}
