/** A seeded source of random numbers: the same seed gives the same numbers everywhere. */
export interface Random {
  /** Even over 0 … 1, both ends excluded. */
  readonly uniform: () => number;
  /** Normal with mean 0 and standard deviation 1. */
  readonly normal: () => number;
}

/**
 * @param seed whole number, not 0 in its low 32 bits
 * Source: Marsaglia 2003, Xorshift RNGs, J. Stat. Softw. 8(14), the 32-bit triple 13, 17, 5; normal numbers by
 * Box & Muller 1958, Ann. Math. Stat. 29:610.
 */
export function createRandom(seed: number): Random {
  let state = seed | 0;
  if (state === 0) throw new RangeError('a seed must not be 0');
  const uniform = () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 4294967296;
  };
  // A small seed leaves the first numbers small: run past them.
  for (let warmUp = 0; warmUp < 20; warmUp += 1) uniform();
  const normal = () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
  return { uniform, normal };
}

/** `count` numbers of mean 0 and deviation 1, each correlated with the one before (first-order autoregression). */
export function correlatedNormals(random: Random, count: number, correlation: number): Float64Array {
  const values = new Float64Array(count);
  const fresh = Math.sqrt(1 - correlation * correlation);
  let previous = random.normal();
  for (let at = 0; at < count; at += 1) {
    values[at] = previous;
    previous = correlation * previous + fresh * random.normal();
  }
  return values;
}
