import { total } from '../arithmetic.ts';
import { moments } from '../moments.ts';
import { computed, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { withoutSum } from '../reasons.ts';

/**
 * Percent bias (PBIAS): how much water the simulation lacks, in percent of what was observed.
 *
 * Formula: 100 sum(O - S) / sum(O), which is 100 (1 - beta)
 * Inputs: pairs in one unit; the result is in percent.
 * Range: any; best 0.
 * Read: positive = the model gives too little, negative = too much. Errors of opposite sign cancel.
 * Undefined: no pairs, or observations that sum to zero.
 * Variant: 100 sum(S - O) / sum(O) is in use under the same name; the sign tells nothing until the formula is known.
 * Source: Gupta, Sorooshian & Yapo 1999, J. Hydrol. Eng. 4(2):135-143; Moriasi et al. 2007, Trans. ASABE 50(3):885-900, eq. 2.
 * Example: percentBias(pairInOrder({observed: [10, 20, 30, 40], simulated: [11, 22, 33, 44]})) -> {value: -10}
 */
export function percentBias(paired: Paired): Statistic {
  const { observed, simulated } = paired;
  const reason = withoutSum(moments(paired));
  if (reason) return undefinedBecause(reason);
  const lacking = total(observed.map((value, index) => value - (simulated[index] ?? 0)));
  return computed((100 * lacking) / total(observed));
}
