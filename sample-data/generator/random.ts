/** A source of repeatable numbers: the same seed gives the same city. */
export interface Random {
  /** From `low` up to, not including, `high`. */
  between(low: number, high: number): number;
  /** True with this probability, 0 to 1. */
  chance(probability: number): boolean;
  pick<T>(from: readonly [T, ...T[]]): T;
}

/**
 * Mulberry32, a 32-bit generator in the public domain (Tommy Ettinger, 2017; written out from memory):
 * small, and good enough to scatter houses.
 */
export function createRandom(seed: number): Random {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = state;
    mixed = Math.imul(mixed ^ (mixed >>> 15), mixed | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  return {
    between: (low, high) => low + next() * (high - low),
    chance: (probability) => next() < probability,
    pick: (from) => from[Math.floor(next() * from.length)] ?? from[0],
  };
}
