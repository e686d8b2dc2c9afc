import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * The largest evaporative index that water and energy allow in the long run.
 *
 * Formula: min(1, f), f = PET / P: ET <= P (water) and ET <= PET (energy)
 * Inputs: aridity, no unit.
 * Range: 0 to 1.
 * Read: above it water is imported or taken from storage, or PET is too small: forest and open water exceed a grass reference.
 * Undefined: an aridity that is not above 0.
 * Source: Budyko 1974, Climate and Life.
 * Example: evaporationLimit(0.8) -> {value: 0.8}
 */
export function evaporationLimit(aridity: number): Statistic {
  return aridity > 0 ? computed(Math.min(1, aridity)) : undefinedBecause('an aridity is above zero');
}
