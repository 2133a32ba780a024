import type { SpeciationResult } from '../../core/index.ts';
import type { FigureRun } from './figureRun.ts';
import { formatNumber } from './formatNumber.ts';
import { formLabel, symbolOfSystem } from './formLabel.ts';
import { readingOfPH } from './pHLink.ts';
import type { RichText } from './richText.ts';

/** A constant of the plotted scale, where two neighbouring forms are equal. */
export interface ConstantMark {
  readonly pH: number;
  /** The reading that this pH gives, in the unit of the run. */
  readonly reading: number;
  readonly label: RichText;
}

/**
 * @param shown prefixes of the systems whose constants are wanted
 * @returns in order of rising pH
 */
export function constantMarks(run: FigureRun, shown: ReadonlySet<string>): ConstantMark[] {
  const { link } = run;
  const { speciation } = run.result;
  if (speciation === null || link === null) return [];
  const systems = speciation.systems.filter((system) => shown.has(system.prefix));
  const areSeveral = systems.filter((system) => system.crossings.length > 0).length > 1;
  return systems
    .flatMap((system) =>
      system.crossings.map(({ quantityId, pH }) => ({
        pH,
        reading: readingOfPH(link, pH),
        label: constantLabel(quantityId, areSeveral ? whose(speciation, system) : [], pH),
      })),
    )
    .sort((a, b) => a.pH - b.pH);
}

function constantLabel(quantityId: string, whose: RichText, pH: number): RichText {
  return [
    { text: 'pK', at: 'line' },
    { text: `a${/\d+$/.exec(quantityId)?.[0] ?? ''}`, at: 'sub' },
    { text: '′', at: 'line' },
    ...whose,
    { text: ` ${formatNumber(pH, 2)}`, at: 'line' },
  ];
}

/** Letter of the system, or the first form of carbonate, in brackets. */
function whose(speciation: SpeciationResult, system: SpeciationResult['systems'][number]): RichText {
  const symbol = symbolOfSystem(speciation, system);
  return [
    { text: ' (', at: 'line' },
    ...(symbol === null ? formLabel(speciation, system, 0) : [{ text: symbol, at: 'line' } as const]),
    { text: ')', at: 'line' },
  ];
}
