/** Repeatable invented series for comparisons with other libraries: Park-Miller generator (Park & Miller 1988, from memory). */
export function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 48_271) % 2_147_483_647;
    return state / 2_147_483_647;
  };
}

export interface InventedPair {
  readonly observed: number[];
  readonly simulated: number[];
}

/** Skewed flows with some zeros, and a model with noise and bias. */
export function inventedPair(seed: number, length: number): InventedPair {
  const next = generator(seed);
  const observed = Array.from({ length }, () =>
    next() < 0.1 ? 0 : Math.round(1000 * (-5 * Math.log(next())) ** 1.4) / 1000,
  );
  const simulated = observed.map((flow) => Math.round(1000 * (0.3 + flow * (0.6 + 0.7 * next()))) / 1000);
  return { observed, simulated };
}
