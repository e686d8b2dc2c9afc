/**
 * Two-sided tail of Student's t: chance of lying further from 0 than t. Its square is F with 1 degree above.
 *
 * Formula: I_x(v / 2, 1 / 2), x = v / (v + t^2), the incomplete beta function by its continued fraction
 * Inputs: t, no unit; degrees of freedom v above 0.
 * Range: 0 to 1; keeps its leading digits far out in the tail.
 * Read: the p value of a comparison of two means.
 * Undefined: never for finite t and positive v.
 * Source: Abramowitz & Stegun 1964, Handbook of Mathematical Functions, 26.5.8 and 26.7.1 (from memory).
 * Example: studentTails({t: 2.228139, degrees: 10}) -> 0.05
 */
export function studentTails(of: { readonly t: number; readonly degrees: number }): number {
  const square = of.t ** 2;
  const half = of.degrees / 2;
  const x = of.degrees / (of.degrees + square);
  const rest = square / (of.degrees + square);
  const scale = Math.exp(
    logGamma(half + 0.5) -
      logGamma(half) -
      logGamma(0.5) +
      half * Math.log(x) +
      0.5 * Math.log(Math.max(rest, Number.MIN_VALUE)),
  );
  // The fraction converges quickly on one side only; the other is reached by symmetry.
  if (x < (half + 1) / (half + 2.5)) return (scale * fraction({ a: half, b: 0.5, x })) / half;
  return 1 - (scale * fraction({ a: 0.5, b: half, x: rest })) / 0.5;
}

/** Lentz's evaluation of the continued fraction of the incomplete beta function. */
function fraction({ a, b, x }: { a: number; b: number; x: number }): number {
  const tiny = 1e-300;
  let c = 1;
  let d = 1 / (1 - ((a + b) * x) / (a + 1) || tiny);
  let result = d;
  for (let m = 1; m < 10_000; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / (1 + even * d || tiny);
    c = 1 + even / c || tiny;
    result *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / (1 + odd * d || tiny);
    c = 1 + odd / c || tiny;
    result *= d * c;
    if (Math.abs(d * c - 1) < 1e-16) break;
  }
  return result;
}

/** Lanczos approximation with g = 7 and nine terms, for z of a half and above. */
function logGamma(z: number): number {
  const terms = [
    676.5203681218851, -1259.1392167224028, 771.3234287776531, -176.6150291621406, 12.507343278686905,
    -0.13857109526572012, 9.984369578019572e-6, 1.5056327351493116e-7,
  ];
  const shifted = z - 1;
  const sum = terms.reduce((so, term, index) => so + term / (shifted + index + 1), 0.9999999999998099);
  const base = shifted + 7.5;
  return 0.5 * Math.log(2 * Math.PI) + (shifted + 0.5) * Math.log(base) - base + Math.log(sum);
}
