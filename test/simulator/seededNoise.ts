import { randomNormal } from 'd3-random';
import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { skipN } from 'pure-rand/utils/skipN';

/** Random numbers that are the same on every machine for the same seed. */
export interface SeededNoise {
  /** Next number from the normal distribution of mean 0 and standard deviation 1. */
  normal(): number;
  /** Next number from [low, high). */
  uniform(low: number, high: number): number;
  /** Next whole number from low to high, both included. */
  integer(low: number, high: number): number;
}

/**
 * xoroshiro128+ under the polar method for normal numbers. The first draws of
 * neighbouring small seeds resemble each other, so they are thrown away.
 */
export function seededNoise(seed: number): SeededNoise {
  const generator = xoroshiro128plus(seed);
  skipN(generator, 64);
  const draw = () => uniformFloat64(generator);
  const normal = randomNormal.source(draw)(0, 1);
  return {
    normal: () => normal(),
    uniform: (low, high) => low + (high - low) * draw(),
    integer: (low, high) => low + Math.floor((high - low + 1) * draw()),
  };
}
