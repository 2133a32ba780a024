import type { Doubt, RunResult } from '../../../core/index.ts';
import { DoubtNote } from '../../widgets/DoubtNote.tsx';
import { usePointing } from '../page/pointing.ts';
import { placeWords } from './placeWords.ts';

interface Props {
  readonly doubt: Doubt;
  readonly result: RunResult;
  /** True where it stands under the quantity it is about. */
  readonly isAtQuantity: boolean;
}

/** A doubt with a button that marks what it is about, on the figure or in the table. */
export function DoubtAtPlace({ doubt, result, isAtQuantity }: Props) {
  const { pointed, point } = usePointing();
  const shown = placeWords(doubt.place, result, isAtQuantity);
  if (shown === null) return <DoubtNote doubt={doubt} />;
  const { place, words, where } = shown;
  const isShown =
    pointed !== null &&
    pointed.line === place.line &&
    pointed.volume_mL === place.volume_mL &&
    pointed.quantity === place.quantity;
  return (
    <DoubtNote doubt={doubt}>
      <button
        type="button"
        className="link show-place"
        aria-pressed={isShown}
        onClick={() => point(isShown ? null : place, where)}
      >
        {words}
      </button>
    </DoubtNote>
  );
}
