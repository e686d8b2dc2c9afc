import { ascending, total } from '../arithmetic.ts';
import { computedTogether, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { noPairs, observedSumZero } from '../reasons.ts';

export interface HighFlowBias {
  readonly percent: number;
  /** Steps in the segment, on either side. */
  readonly steps: number;
}

/**
 * Bias of the high end of the flow-duration curve (%BiasFHV): flows exceeded at most 2 % of the time.
 *
 * Formula: 100 sum(S - O) / sum(O) over ranks i with i / (n + 1) <= 0.02, at least the first
 * Inputs: pairs of flow in one unit; each side is ranked by itself, so the order of days does not matter.
 * Range: -100 upwards; best 0; in percent.
 * Read: positive = too much high flow, the opposite sense of PBIAS. No published pass limit is known.
 * Undefined: no pairs, or observed high flows that sum to zero.
 * Variant: taking the simulated flows of the days that were observed high is another statistic.
 * Source: Yilmaz, Gupta & Wagener 2008, Water Resour. Res. 44:W09417, %BiasFHV.
 * Example: highFlowBias(pairInOrder({observed: [12, 9, 30, 4.4], simulated: [10, 9.5, 5, 24]})) -> {value: {percent: -20, steps: 1}}
 */
export function highFlowBias(paired: Paired): Statistic<HighFlowBias> {
  const count = paired.observed.length;
  if (count === 0) return undefinedBecause(noPairs);
  let steps = 1;
  while ((steps + 1) / (count + 1) <= 0.02) steps++;
  const observed = total(ascending(paired.observed).subarray(count - steps));
  const simulated = total(ascending(paired.simulated).subarray(count - steps));
  if (observed === 0) return undefinedBecause(observedSumZero);
  return computedTogether({ percent: (100 * (simulated - observed)) / observed, steps });
}
