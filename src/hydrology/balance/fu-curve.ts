import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * Evaporative index that Fu's curve gives for an aridity and a catchment parameter.
 *
 * Formula: ET / P = 1 + f - (1 + f^w)^(1 / w), f = PET / P
 * Inputs: aridity f and w, no units.
 * Range: 0 (w towards 1) to the limits of water and energy (w without limit).
 * Read: w near 2.6 follows Budyko's curve (from memory); forest has more, grass less.
 * Undefined: an aridity that is not above 0, or w not above 1.
 * Source: Fu 1981, in Zhang et al. 2004, Water Resour. Res. 40:W02502 (from memory).
 * Example: fuCurve({aridity: 1, omega: 2}) -> {value: 0.5858}
 */
export function fuCurve(of: { readonly aridity: number; readonly omega: number }): Statistic {
  const { aridity, omega } = of;
  if (!(aridity > 0 && omega > 1)) return undefinedBecause('aridity is above 0, and omega above 1');
  // The larger of 1 and the aridity is taken out, so that a large omega does not overflow.
  const larger = Math.max(1, aridity);
  const smaller = Math.min(1, aridity);
  return computed(1 + aridity - larger * (1 + (smaller / larger) ** omega) ** (1 / omega));
}
