import { randomNormal } from 'd3-random';
import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';

/** A stream of random numbers that depends on its seed alone. */
export interface Random {
  /** From 0 (included) to 1 (excluded), evenly. */
  uniform(): number;
  /** Normal with mean 0 and standard deviation 1. */
  normal(): number;
}

/**
 * Random numbers from a seed (a whole number of 32 bits): the same on every
 * machine. The generator's first outputs are nearly the seed itself, so that
 * neighbouring seeds would begin almost alike; its jump, 2^64 draws ahead,
 * leaves that stretch behind.
 */
export function createRandom(seed: number): Random {
  if (!Number.isInteger(seed) || Math.abs(seed) > MAXIMUM_SEED) {
    throw new Error(`createRandom: seed ${seed} is not a whole number of at most ${MAXIMUM_SEED}`);
  }
  const generator = xoroshiro128plus(seed);
  generator.jump();
  const uniform = () => uniformFloat64(generator);
  return { uniform, normal: randomNormal.source(uniform)(0, 1) };
}

/** Larger seeds would share their lower 32 bits, all that the generator takes. */
const MAXIMUM_SEED = 2 ** 31 - 1;
