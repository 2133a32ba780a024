/** A linear axis on the page: `range[0]` lies at `pixels[0]`, `range[1]` at `pixels[1]`. */
export interface PixelAxis {
  readonly range: Range;
  readonly pixels: Range;
}

/** Two ends, in the order in which they stand on the axis. */
export type Range = readonly [number, number];

export function toPixels({ range, pixels }: PixelAxis, value: number): number {
  return pixels[0] + ((value - range[0]) / (range[1] - range[0])) * (pixels[1] - pixels[0]);
}

export function fromPixels({ range, pixels }: PixelAxis, pixel: number): number {
  return range[0] + ((pixel - pixels[0]) / (pixels[1] - pixels[0])) * (range[1] - range[0]);
}

export function contains([a, b]: Range, value: number): boolean {
  return a <= b ? value >= a && value <= b : value >= b && value <= a;
}
