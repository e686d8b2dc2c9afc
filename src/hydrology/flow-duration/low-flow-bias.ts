import { computedTogether, isDefined, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { flowsAboveZero } from './flows-above-zero.ts';

export interface LowFlowBias {
  readonly percent: number;
  /** Steps in the segment, on either side. */
  readonly steps: number;
  /** Added to both sides before logarithms, in the unit of flow; 0 when no flow was zero. */
  readonly offset: number;
}

/**
 * Bias of the low end of the flow-duration curve (%BiasFLV): flows exceeded at least 70 % of the time.
 *
 * Formula: -100 (a(S) - a(O)) / a(O), a(x) = sum(ln x - ln min x) over ranks i with i / (n + 1) >= 0.70
 * Inputs: pairs of flow in one unit, none negative; each side is ranked by itself.
 * Range: up to 100; best 0; in percent.
 * Read: positive = the simulated low flows spread too little above their own minimum. Whether that minimum is right it does not say.
 * Undefined: no pairs, a negative flow, observations all zero, or observed low flows all equal.
 * Variant: where a flow is zero, both sides get a hundredth of the observed mean before logarithms are taken.
 * Source: Yilmaz, Gupta & Wagener 2008, Water Resour. Res. 44:W09417, eq. A4; treatment of zeros is our choice.
 * Example: lowFlowBias(pairInOrder({observed: [12, 9, 30, 4.4, 2.2, 7.5, 1.1, 3.8, 18, 0.9], simulated: [10, 9.5, 24, 5, 2, 8.1, 1.6, 3, 20, 0.7]})) -> {value: {percent: -71.45, steps: 3, offset: 0}}
 */
export function lowFlowBias(paired: Paired): Statistic<LowFlowBias> {
  const flows = flowsAboveZero(paired);
  if (!isDefined(flows)) return flows;
  const { observed, simulated, offset } = flows.value;
  const count = observed.length;
  let steps = 0;
  while (steps < count && (count - steps) / (count + 1) >= 0.7) steps++;
  const reference = spread(observed.subarray(0, steps));
  if (reference === 0) return undefinedBecause('the observed low flows are all equal');
  const percent = (-100 * (spread(simulated.subarray(0, steps)) - reference)) / reference;
  return computedTogether({ percent, steps, offset });
}

/** Sum of logarithms above that of the smallest, from ascending flows. */
function spread(flows: Float64Array): number {
  const lowest = flows[0] ?? 1;
  return flows.reduce((sum, flow) => sum + Math.log(flow / lowest), 0);
}
