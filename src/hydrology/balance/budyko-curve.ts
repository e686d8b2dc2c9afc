import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * Evaporative index that Budyko's curve gives for an aridity.
 *
 * Formula: ET / P = sqrt(f tanh(1 / f) (1 - exp(-f))), f = PET / P
 * Inputs: aridity, no unit.
 * Range: 0 to 1, always below `evaporationLimit`.
 * Read: where catchments lie on average; one far off has snow, storage, imported water, or a fault in its data.
 * Undefined: an aridity that is not above 0.
 * Source: Budyko 1974, Climate and Life.
 * Example: budykoCurve(1) -> {value: 0.6938}
 */
export function budykoCurve(aridity: number): Statistic {
  if (!(aridity > 0)) return undefinedBecause('an aridity is above zero');
  return computed(Math.sqrt(aridity * Math.tanh(1 / aridity) * -Math.expm1(-aridity)));
}
