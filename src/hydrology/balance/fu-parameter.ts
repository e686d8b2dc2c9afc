import { computed, isDefined, type Statistic, undefinedBecause } from '../paired.ts';
import { evaporationLimit } from './evaporation-limit.ts';
import { fuCurve } from './fu-curve.ts';

/**
 * The parameter of Fu's curve on which a catchment lies.
 *
 * Formula: the w that solves Fu's equation, by halving the interval
 * Inputs: aridity and evaporative index of a long window, no units.
 * Range: above 1; under 1.3 or over 5 is unusual (our choice).
 * Read: a point near a limit has a very large w and says little.
 * Undefined: a point on or beyond the limits of water and energy, or an evaporative index that is not above 0.
 * Source: Fu 1981, in Zhang et al. 2004, Water Resour. Res. 40:W02502 (from memory).
 * Example: fuParameter({aridity: 0.8, evaporativeIndex: 0.55}) -> {value: 2.1565}
 */
export function fuParameter(of: { readonly aridity: number; readonly evaporativeIndex: number }): Statistic {
  const limit = evaporationLimit(of.aridity);
  if (!isDefined(limit)) return limit;
  if (!(of.evaporativeIndex > 0)) return undefinedBecause('the evaporative index is not above zero');
  if (of.evaporativeIndex >= limit.value)
    return undefinedBecause('the point lies on or beyond the limits of water and energy');
  const below = (omega: number) => {
    const index = fuCurve({ aridity: of.aridity, omega });
    return isDefined(index) && index.value < of.evaporativeIndex;
  };
  let low = 1;
  let high = 2;
  while (below(high)) {
    low = high;
    high *= 2;
    if (high > 1e6) return undefinedBecause('the point lies too near a limit to tell its curve');
  }
  for (let halving = 0; halving < 200 && high - low > Number.EPSILON * high; halving++) {
    const middle = (low + high) / 2;
    if (below(middle)) low = middle;
    else high = middle;
  }
  return computed((low + high) / 2);
}
