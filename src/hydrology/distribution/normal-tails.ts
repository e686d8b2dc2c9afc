/**
 * Two-sided tail of the standard normal distribution: chance of lying further from the mean than z deviations.
 *
 * Formula: 2 (1 - Phi(|z|)) = erfc(|z| / sqrt 2), by a series of positive terms below 2, else by a continued fraction
 * Inputs: z, no unit.
 * Range: 0 to 1; keeps its leading digits far out in the tail.
 * Read: the p value of a test whose statistic is standard normal.
 * Undefined: never for a finite z.
 * Source: Abramowitz & Stegun 1964, Handbook of Mathematical Functions, 7.1.6 and 7.1.14.
 * Example: normalTails(1.959963984540054) -> 0.05
 */
export function normalTails(z: number): number {
  const x = Math.abs(z) / Math.SQRT2;
  const scale = Math.exp(-x * x) / Math.sqrt(Math.PI);
  if (x < 2) {
    let term = 2 * x;
    let sum = term;
    for (let n = 1; term > sum * 1e-17; n++) {
      term *= (2 * x * x) / (2 * n + 1);
      sum += term;
    }
    return 1 - scale * sum;
  }
  let fraction = 0;
  for (let n = 60; n >= 1; n--) fraction = n / 2 / (x + fraction);
  return scale / (x + fraction);
}
