import { isDefined, type Paired, type Statistic } from '../paired.ts';
import { logOffset } from './log-offset.ts';
import { nashSutcliffe } from './nash-sutcliffe.ts';

/**
 * Nash-Sutcliffe efficiency of the logarithms of flow (log-NSE): the fit of low flows.
 *
 * Formula: NSE of ln(O + e) and ln(S + e), e = mean(O) / 100
 * Inputs: pairs of flow in one unit, none negative.
 * Range: below 1 without limit; best 1; 0 is as good as the mean of the logarithms.
 * Read: ratios count, so that missing half of a low flow weighs as much as missing half of a flood.
 * Undefined: as NSE; any negative flow; observations all zero.
 * Variant: adding to each series a hundredth of its own mean hides bias; here both get that of the observations, over the same pairs.
 * Source: Pushpalatha et al. 2012, J. Hydrol. 420-421:171-182.
 * Example: logNashSutcliffe(pairInOrder({observed: [0, 0, 0.4, 1.6, 0.9, 0, 0.2, 3.1], simulated: [0.05, 0, 0.3, 1.9, 0.7, 0.1, 0, 2.6]})) -> {value: 0.5168}
 */
export function logNashSutcliffe(paired: Paired): Statistic {
  const offset = logOffset(paired);
  if (!isDefined(offset)) return offset;
  const logarithm = (flow: number) => Math.log(flow + offset.value);
  return nashSutcliffe({
    ...paired,
    observed: paired.observed.map(logarithm),
    simulated: paired.simulated.map(logarithm),
  });
}
