/**
 * A seeded stream of uniform numbers in [0, 1): 32-bit mixing generator, the same on every machine. For test
 * rays only, where a period of 2³² is ample.
 */
export function uniformStream(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x9e3779b9) >>> 0;
    let mixed = state;
    mixed = Math.imul(mixed ^ (mixed >>> 16), 0x85ebca6b);
    mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
    return ((mixed ^ (mixed >>> 16)) >>> 0) / 2 ** 32;
  };
}

/** Standard normal numbers from a uniform stream. Source: Box & Muller 1958, Ann. Math. Stat. 29:610. */
export function normalStream(uniform: () => number): () => number {
  let spare: number | undefined;
  return () => {
    if (spare !== undefined) {
      const kept = spare;
      spare = undefined;
      return kept;
    }
    const length = Math.sqrt(-2 * Math.log(1 - uniform()));
    const angle = 2 * Math.PI * uniform();
    spare = length * Math.sin(angle);
    return length * Math.cos(angle);
  };
}
