import { computedTogether, isDefined, type Statistic } from '../paired.ts';
import { mahalanobis } from './mahalanobis.ts';

export interface LeverageLimit {
  /** 3 p / n, p the drivers and the constant. */
  readonly warning: number;
  /** Largest leverage of the calibration's own years. */
  readonly largest: number;
  /** The smaller of the two. */
  readonly limit: number;
}

/**
 * The leverage above which scenario conditions count as extrapolation.
 *
 * Formula: min(3 p / n, largest h of the sample), p = drivers + 1
 * Inputs: one row of drivers per year of the calibration, each driver in its own unit.
 * Range: 0 to 1.
 * Read: with few years 3 p / n exceeds every leverage there is, even 1; then the largest of the sample decides.
 * Undefined: as `mahalanobis`.
 * Source: warning leverage of the Williams plot: Sahigara et al. 2012, Molecules 17:4791-4810 (number from memory); taking the smaller is our choice.
 * Example: leverageLimit([[1, 1], [2, 3], [3, 2], [4, 4]]) -> {value: {warning: 2.25, largest: 0.75, limit: 0.75}}
 */
export function leverageLimit(sample: readonly (readonly number[])[]): Statistic<LeverageLimit> {
  let largest = 0;
  for (const point of sample) {
    const distance = mahalanobis({ sample, point });
    if (!isDefined(distance)) return distance;
    largest = Math.max(largest, distance.value.leverage);
  }
  const warning = (3 * ((sample[0]?.length ?? 0) + 1)) / sample.length;
  return computedTogether({ warning, largest, limit: Math.min(warning, largest) });
}
