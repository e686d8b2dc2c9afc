import { quantile } from '../distribution/quantile.ts';
import { computedTogether, isDefined, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { flowsAboveZero } from './flows-above-zero.ts';

export interface MiddleSlopeBias {
  readonly percent: number;
}

/**
 * Bias of the slope of the flow-duration curve between 20 and 70 % exceedance (%BiasFMS).
 *
 * Formula: 100 (a(S) - a(O)) / a(O), a(x) = ln x(0.2) - ln x(0.7), x(e) the type-6 quantile exceeded with frequency e
 * Inputs: pairs of flow in one unit, none negative; each side is ranked by itself.
 * Range: any; best 0; in percent.
 * Read: positive = the simulated curve is too steep: the catchment answers too fast and stores too little.
 * Undefined: no pairs, a negative flow, observations all zero, or an observed curve that is flat there.
 * Variant: where a flow is zero, both sides get a hundredth of the observed mean before logarithms are taken.
 * Source: Yilmaz, Gupta & Wagener 2008, Water Resour. Res. 44:W09417, %BiasFMS; quantiles and treatment of zeros are our choice.
 * Example: middleSlopeBias(pairInOrder({observed: [12, 9, 30, 4.4, 2.2, 7.5, 1.1, 3.8, 18, 0.9], simulated: [10, 9.5, 24, 5, 2, 8.1, 1.6, 3, 20, 0.7]})) -> {value: {percent: 12.089}}
 */
export function middleSlopeBias(paired: Paired): Statistic<MiddleSlopeBias> {
  const flows = flowsAboveZero(paired);
  if (!isDefined(flows)) return flows;
  const observed = slope(flows.value.observed);
  if (observed === 0) return undefinedBecause('the observed flow-duration curve is flat between 20 and 70 %');
  return computedTogether({ percent: (100 * (slope(flows.value.simulated) - observed)) / observed });
}

function slope(flows: Float64Array): number {
  const logarithm = (probability: number) => {
    const flow = quantile({ values: flows, probability, type: 6 });
    return isDefined(flow) ? Math.log(flow.value) : Number.NaN;
  };
  return logarithm(1 - 0.2) - logarithm(1 - 0.7);
}
