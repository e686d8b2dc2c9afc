import { computedTogether, type Statistic, undefinedBecause } from '../paired.ts';

export interface MeanAnnualChange {
  readonly percent: number;
  /** From -15 to +20 %, ends included. */
  readonly within: boolean;
}

/**
 * Change of mean annual rainfall from calibration to scenario.
 *
 * Formula: 100 (scenario - calibration) / calibration
 * Inputs: both mean annual totals in one unit, such as sum over the window / days * 365.25.
 * Range: any; calibrated models still served from -15 to +20 %.
 * Read: outside, the parameters are trusted where they were never tested.
 * Undefined: a calibration mean that is not above 0.
 * Source: Vaze et al. 2010, J. Hydrol. 394:447-457: within about 15 %; the two unequal ends from memory.
 * Example: meanAnnualChange({calibration: 1000, scenario: 1210}) -> {value: {percent: 21, within: false}}
 */
export function meanAnnualChange(of: {
  readonly calibration: number;
  readonly scenario: number;
}): Statistic<MeanAnnualChange> {
  if (!(of.calibration > 0)) return undefinedBecause('the calibration mean is not above zero');
  const percent = (100 * (of.scenario - of.calibration)) / of.calibration;
  return computedTogether({ percent, within: percent >= -15 && percent <= 20 });
}
