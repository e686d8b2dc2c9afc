import { computed, isDefined, type Paired, type Statistic } from '../paired.ts';
import { errorDeviationRatio } from './error-deviation-ratio.ts';

/**
 * RSR as it comes out when the root mean square error (with n) is divided by the sample deviation (with n - 1). Not
 * the published statistic: computed only to name the mix-up where a stated RSR fits it.
 *
 * Formula: RSR * sqrt((n - 1) / n)
 * Inputs: pairs in one unit, any.
 * Range: 0 upwards; best 0.
 * Read: smaller than RSR by 0.14 % for a year of days, by 4 % for twelve months.
 * Undefined: as RSR.
 * Source: algebra on Moriasi et al. 2007, Trans. ASABE 50(3):885-900, eq. 3.
 * Example: errorSampleDeviationRatio(pairInOrder({observed: [1, 2, 3, 6], simulated: [3, 3, 3, 3]})) -> {value: 0.866}
 */
export function errorSampleDeviationRatio(paired: Paired): Statistic {
  const ratio = errorDeviationRatio(paired);
  if (!isDefined(ratio)) return ratio;
  const pairs = paired.observed.length;
  return computed(ratio.value * Math.sqrt((pairs - 1) / pairs));
}
