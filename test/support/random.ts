/** Deterministic numbers in [0, 1) for made-up arrays: the minimal standard generator of Park & Miller (CACM 31 (1988) 1192). */
export function parkMiller(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 16807) % 2147483647;
    return state / 2147483647;
  };
}
