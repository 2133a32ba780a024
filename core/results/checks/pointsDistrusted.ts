import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Standard uncertainties by which a result must move before single points are called to account. */
const noticeableMove = 0.5;
/** Points named one by one; more are counted. */
const mostNamed = 5;

/** Single points far off the curve that move a result; not where something wrong with the curve explains them. */
export function pointsDistrusted({ robust, quantities, causes }: Analysis): Doubt[] {
  if (robust === null || robust.distrusted.length === 0 || causes.length > 0) return [];
  const moved = robust.moves.filter(({ inU }) => Math.abs(inU) > noticeableMove);
  if (moved.length === 0) return [];
  const { distrusted } = robust;
  const named = distrusted
    .slice(0, mostNamed)
    .map(({ line, volume_mL }) => `line ${line} (${volume_mL.toFixed(3)} mL)`);
  const more = distrusted.length - named.length;
  const labelOf = (id: string) => quantities.find((quantity) => quantity.id === id)?.label ?? id;
  return [
    {
      code: 'points-distrusted',
      seen: `${distrusted.length === 1 ? '1 point lies' : `${distrusted.length} points lie`} too far from the curve for chance: ${named.join(', ')}${more > 0 ? ` and ${more} more` : ''}.`,
      means: `Without ${distrusted.length === 1 ? 'it' : 'them'} ${moved.map(({ id, shift, inU }) => `${labelOf(id)} would move by ${signed(shift)} (${signed(inU)} u)`).join(', ')}. ${distrusted.length === 1 ? 'It is' : 'They are'} used all the same.`,
      remedy:
        'See whether something happened there at the bench; exclude a point only with a reason that you can state.',
      place: { line: distrusted[0].line, volume_mL: distrusted[0].volume_mL },
    },
  ];
}

function signed(value: number): string {
  return `${value < 0 ? '−' : '+'}${Math.abs(value).toPrecision(2)}`;
}
