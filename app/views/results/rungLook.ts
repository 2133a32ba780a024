import type { LadderRungResult } from '../../../core/index.ts';

/** What a rung fits besides groups. */
export type RungKind = 'plain' | 'carbonate' | 'excess' | 'both';

/** Without any group the strong acid or base is all there is: that is plain. */
export function rungKind({ groups, carbonate, excess }: LadderRungResult, isCarbonateAsked: boolean): RungKind {
  const extra = excess && groups > 0;
  const carbon = carbonate && !isCarbonateAsked;
  if (carbon && extra) return 'both';
  return carbon ? 'carbonate' : extra ? 'excess' : 'plain';
}

/** Carbonate that every rung fits is part of the conditions and no difference. */
export function everyRungHasCarbonate(rungs: readonly LadderRungResult[]): boolean {
  return rungs.every(({ carbonate }) => carbonate);
}

export const kindWords: Readonly<Record<RungKind, string>> = {
  plain: 'groups alone',
  carbonate: 'with carbonate',
  excess: 'with strong acid or base',
  both: 'with both',
};
