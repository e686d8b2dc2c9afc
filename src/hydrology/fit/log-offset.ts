import { mean } from '../arithmetic.ts';
import { computed, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { negativeFlow, noPairs, observedSumZero } from '../reasons.ts';

/**
 * The small flow added before logarithms are taken, so that a dry day has one.
 *
 * Formula: mean(O) / 100, over the pairs
 * Inputs: pairs of flow in one unit, none negative; the result is in that unit.
 * Range: above 0.
 * Read: belongs to its window; another window has another.
 * Undefined: no pairs, any negative flow, observations all zero.
 * Source: Pushpalatha et al. 2012, J. Hydrol. 420-421:171-182.
 * Example: logOffset(pairInOrder({observed: [1, 2, 3, 6], simulated: [3, 3, 3, 3]})) -> {value: 0.03}
 */
export function logOffset(paired: Paired): Statistic {
  const { observed, simulated } = paired;
  if (observed.length === 0) return undefinedBecause(noPairs);
  const negative = (flow: number) => flow < 0;
  if (observed.some(negative) || simulated.some(negative)) return undefinedBecause(negativeFlow);
  const offset = mean(observed) / 100;
  return offset > 0 ? computed(offset) : undefinedBecause(observedSumZero);
}
