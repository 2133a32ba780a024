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
 * machine. Neighbouring seeds, such as the numbers of replicates, give streams
 * that have nothing in common: the generator alone would begin with little more
 * than the seed itself, so the seed is mixed first and the beginning left out.
 */
export function createRandom(seed: number): Random {
  if (!Number.isInteger(seed) || Math.abs(seed) > MAXIMUM_SEED) {
    throw new Error(`createRandom: seed ${seed} is not a whole number of at most ${MAXIMUM_SEED}`);
  }
  const generator = xoroshiro128plus(mix(seed));
  generator.jump();
  const uniform = () => uniformFloat64(generator);
  return { uniform, normal: randomNormal.source(uniform)(0, 1) };
}

/** Larger seeds would share their lower 32 bits, all that the generator takes. */
const MAXIMUM_SEED = 2 ** 31 - 1;

/** The last step of MurmurHash3 (Appleby 2011, public domain): one to one on 32 bits, each bit depending on all. */
function mix(seed: number): number {
  let bits = seed | 0;
  bits = Math.imul(bits ^ (bits >>> 16), 0x85ebca6b);
  bits = Math.imul(bits ^ (bits >>> 13), 0xc2b2ae35);
  return bits ^ (bits >>> 16);
}
