import type { EquivalenceResult } from '../../core/index.ts';
import type { FigureRun } from './figureRun.ts';
import { formatNumber } from './formatNumber.ts';
import { symbolOfSystem } from './formLabel.ts';

/** An equivalence volume with its label. */
export interface EquivalenceMark {
  readonly volume_mL: number;
  /** For a list with one unit at its end: the number, after the letter of its substance where there are several. */
  readonly name: string;
  readonly text: string;
}

export interface EquivalenceMarks {
  /** Volumes that the fit gives: rules through the figure. */
  readonly rules: readonly EquivalenceMark[];
  /** Steepest points of the readings: small ticks at the edge, labelled only where there are no rules. */
  readonly ticks: readonly EquivalenceMark[];
}

export function equivalenceMarks(run: FigureRun): EquivalenceMarks {
  return {
    rules: marksBy(run, 'fit'),
    ticks: marksBy(run, 'derivative'),
  };
}

function marksBy(run: FigureRun, by: EquivalenceResult['by']): EquivalenceMark[] {
  const found = run.result.equivalence.filter((entry) => entry.by === by);
  // The steepest points of the readings know nothing of substances.
  const severalAnalytes = by === 'fit' && new Set(found.map((entry) => entry.analyte)).size > 1;
  // One list, one number of decimals: that of its least certain volume.
  const decimals = volumeDecimals(Math.max(...found.map((entry) => entry.u ?? 0)));
  return found
    .flatMap(({ analyte, volume_mL }) => {
      if (volume_mL === null || !Number.isFinite(volume_mL)) return [];
      const number = formatNumber(volume_mL, decimals);
      const name = severalAnalytes ? `${whose(run, analyte)} ${number}` : number;
      return [{ volume_mL, name, text: `${name} mL` }];
    })
    .sort((a, b) => a.volume_mL - b.volume_mL);
}

/** As many decimals as the uncertainty bears, two or three; a figure is no place for more. */
function volumeDecimals(u: number): number {
  return u > 0 && u < 0.01 ? 3 : 2;
}

function whose(run: FigureRun, analyte: string): string {
  const { speciation } = run.result;
  const system = speciation?.systems.find((candidate) => candidate.name === analyte);
  if (speciation === null || system === undefined) return analyte;
  return symbolOfSystem(speciation, system) ?? analyte;
}
