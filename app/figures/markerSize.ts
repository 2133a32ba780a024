/** Markers smaller than this, px, stand in a crowd. */
export const dense = 5;

/** Diameter of a marker, px: smaller where points stand so close that circles would run into a caterpillar. */
export function markerSize(points: number, width: number): number {
  const perPoint = width / Math.max(1, points);
  if (perPoint > 6) return 6.5;
  if (perPoint > 2.5) return 5;
  return perPoint > 0.8 ? 4.2 : 3.2;
}
