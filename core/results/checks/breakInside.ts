import { triangularise } from '../../numerics/triangularise.ts';

/**
 * How strongly numbers break in the middle of a window: the larger t value of a
 * jump and of a bend there, each beside a cubic through the whole window.
 *
 * @param places in rising order, an even number of them; the break lies between the middle two
 * @param values of unit variance, if all is well
 * @param leastScatter standard deviation that is granted in any case
 */
export function breakInside(places: readonly number[], values: readonly number[], leastScatter: number): number {
  const count = places.length;
  const half = count >> 1;
  const at = 0.5 * (places[half - 1] + places[half]);
  const width = Math.max(places[count - 1] - at, at - places[0]);
  if (!(width > 0)) return 0;
  const shapes: ((x: number) => number)[] = [(x) => (x > 0 ? 1 : 0), (x) => Math.max(0, x)];
  return Math.max(...shapes.map((shape) => Math.abs(strengthOf(shape))));

  function strengthOf(shape: (x: number) => number): number {
    const columnCount = 5;
    const columns = new Float64Array(count * (columnCount + 1));
    places.forEach((place, i) => {
      const x = (place - at) / width;
      [1, x, x * x, x ** 3, shape(x), values[i]].forEach((entry, j) => {
        columns[j * count + i] = entry;
      });
    });
    const result = {
      triangle: new Float64Array(columnCount * columnCount),
      rightHand: new Float64Array(columnCount),
    };
    triangularise(columns, count, columnCount, result);
    let squares = 0;
    for (let i = columnCount; i < count; i++) squares += columns[columnCount * count + i] ** 2;
    const scatter = Math.max(leastScatter, Math.sqrt(squares / (count - columnCount)));
    // The last column of the triangle holds what the shape adds alone.
    return scatter > 0 ? result.rightHand[columnCount - 1] / scatter : 0;
  }
}
