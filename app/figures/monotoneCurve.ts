/**
 * A smooth curve through points that never overshoots them: cubic pieces with slopes limited by those of the
 * neighbouring chords. Source: Fritsch, F. N.; Butland, J., SIAM J. Sci. Stat. Comput. 5 (1984) 300–304 (from memory).
 *
 * @param x strictly rising, at least two
 * @param y as many
 * @returns the curve between the first and the last point
 */
export function monotoneCurve(x: readonly number[], y: readonly number[]): (at: number) => number {
  const last = x.length - 1;
  const chords = Array.from({ length: last }, (_, i) => (y[i + 1] - y[i]) / (x[i + 1] - x[i]));
  const slopes = x.map((_, i) => {
    if (i === 0) return chords[0];
    if (i === last) return chords[last - 1];
    const [left, right] = [chords[i - 1], chords[i]];
    return left * right > 0 ? (2 * left * right) / (left + right) : 0;
  });
  return (at) => {
    let i = 0;
    while (i < last - 1 && at > x[i + 1]) i++;
    const width = x[i + 1] - x[i];
    const t = (at - x[i]) / width;
    const rest = 1 - t;
    return (
      rest * rest * ((1 + 2 * t) * y[i] + t * width * slopes[i]) +
      t * t * ((3 - 2 * t) * y[i + 1] - rest * width * slopes[i + 1])
    );
  };
}
