/** A repeatable source of chance: the same seed gives the same numbers on every machine (mulberry32). */
export function seededRandom(seed) {
  let state = seed;
  /** Uniform, from 0 to below 1. */
  const uniform = () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
  /** Near enough standard normal: twelve uniform numbers less six, so no logarithm is needed. */
  const normal = () => {
    let sum = -6;
    for (let draw = 0; draw < 12; draw += 1) sum += uniform();
    return sum;
  };
  return { uniform, normal };
}
