import { logOffset } from '../fit/log-offset.ts';
import { defined, isDefined, type Paired, type Statistic } from '../paired.ts';

export interface FlowsAboveZero {
  /** Ascending. */
  readonly observed: Float64Array;
  readonly simulated: Float64Array;
  /** What was added to both sides; 0 when no flow was zero. */
  readonly offset: number;
}

/**
 * Both sides ranked on their own and fit for logarithms.
 *
 * Formula: flows + mean(O) / 100 when either side holds a zero, else the flows as they are
 * Inputs: pairs of flow in one unit, none negative; results in that unit.
 * Range: above 0.
 * Read: a step towards the middle and low segments of the flow-duration curve.
 * Undefined: no pairs, a negative flow, observations all zero.
 * Source: offset of Pushpalatha et al. 2012, J. Hydrol. 420-421:171-182; using it here is our choice.
 * Example: flowsAboveZero(pairInOrder({observed: [0, 2], simulated: [1, 1]})) -> {value: {observed: [0.01, 2.01], simulated: [1.01, 1.01], offset: 0.01}}
 */
export function flowsAboveZero(paired: Paired): Statistic<FlowsAboveZero> {
  const whenZero = logOffset(paired);
  if (!isDefined(whenZero)) return whenZero;
  const offset = paired.observed.includes(0) || paired.simulated.includes(0) ? whenZero.value : 0;
  const ranked = (flows: Float64Array) => flows.map((flow) => flow + offset).sort();
  return defined({ observed: ranked(paired.observed), simulated: ranked(paired.simulated), offset });
}
