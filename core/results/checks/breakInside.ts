import { triangularise } from '../../numerics/triangularise.ts';

/** A smooth term that explains more than this part of what a break explains speaks against the break. */
const smoothPart = 0.35;

/**
 * How strongly numbers break in the middle of a window: the larger t value of a
 * jump and of a bend there, each beside a polynomial through the whole window.
 * Zero where one more power does nearly as well, for then the numbers are
 * curved, not broken.
 *
 * @param places in rising order, an even number of them; the break lies between the middle two
 * @param degree of the polynomial
 * @param leastScatter standard deviation that is granted in any case
 */
export function breakInside(
  places: readonly number[],
  values: readonly number[],
  degree: number,
  leastScatter: number,
): number {
  const count = places.length;
  const half = count >> 1;
  const at = 0.5 * (places[half - 1] + places[half]);
  const width = Math.max(places[count - 1] - at, at - places[0]);
  if (!(width > 0)) return 0;
  const strongest = Math.max(
    strengthOf((x) => (x > 0 ? 1 : 0)),
    strengthOf((x) => Math.max(0, x)),
  );
  const smooth = Math.max(
    strengthOf((x) => x ** (degree + 1)),
    strengthOf((x) => x ** (degree + 2)),
  );
  return smooth > smoothPart * strongest ? 0 : strongest;

  function strengthOf(shape: (x: number) => number): number {
    const columnCount = degree + 2;
    const columns = new Float64Array(count * (columnCount + 1));
    places.forEach((place, i) => {
      const x = (place - at) / width;
      for (let power = 0; power <= degree; power++) columns[power * count + i] = x ** power;
      columns[(degree + 1) * count + i] = shape(x);
      columns[columnCount * count + i] = values[i];
    });
    const result = {
      triangle: new Float64Array(columnCount * columnCount),
      rightHand: new Float64Array(columnCount),
    };
    triangularise(columns, count, columnCount, result);
    let squares = 0;
    for (let i = columnCount; i < count; i++) squares += columns[columnCount * count + i] ** 2;
    const scatter = Math.max(leastScatter, Math.sqrt(squares / (count - columnCount)));
    // The last entry holds what the shape adds alone.
    return scatter > 0 ? Math.abs(result.rightHand[columnCount - 1]) / scatter : 0;
  }
}
