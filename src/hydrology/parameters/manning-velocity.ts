import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * Mean velocity of uniform flow by Manning's equation.
 *
 * Formula: R^(2/3) sqrt(S) / n
 * Inputs: hydraulic radius R in m, slope S in m per m, roughness n in s m^(-1/3); the result is in m/s.
 * Range: 0 upwards.
 * Read: a check of what a roughness means: 3 m/s in a lowland stream is not plausible.
 * Undefined: a radius or roughness that is not above 0, a negative slope.
 * Source: Chow 1959, Open-Channel Hydraulics, eq. 5-6 (equation number from memory).
 * Example: manningVelocity({hydraulicRadiusM: 1.2, slope: 0.0009, roughness: 0.035}) -> {value: 0.9679}
 */
export function manningVelocity(of: {
  readonly hydraulicRadiusM: number;
  readonly slope: number;
  readonly roughness: number;
}): Statistic {
  if (!(of.hydraulicRadiusM > 0 && of.roughness > 0 && of.slope >= 0))
    return undefinedBecause('hydraulic radius and roughness are above zero, and the slope is not negative');
  return computed((of.hydraulicRadiusM ** (2 / 3) * Math.sqrt(of.slope)) / of.roughness);
}
