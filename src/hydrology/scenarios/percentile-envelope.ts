import { quantile } from '../distribution/quantile.ts';
import { computedTogether, isDefined, type Statistic, undefinedBecause } from '../paired.ts';

export interface PercentileEnvelope {
  /** 1st and 99th percentile and maximum of the calibration, in its unit. */
  readonly low: number;
  readonly high: number;
  readonly highest: number;
  readonly stepsAboveHigh: number;
  /** Share of the scenario's steps; 0.01 is expected of unchanged conditions. */
  readonly shareAboveHigh: number;
  readonly shareBelowLow: number;
  readonly stepsAboveHighest: number;
}

/**
 * How often a scenario leaves what all but the rarest days of the calibration were.
 *
 * Formula: share of scenario values above the 99th, and below the 1st percentile of the calibration (type 7)
 * Inputs: values of one driver, one unit and step.
 * Range: shares 0 to 1; 0.01 each if nothing changed.
 * Read: rain has a 1st percentile of 0, so that only its upper end speaks.
 * Undefined: no values on either side.
 * Source: our choice; no published limit is known.
 * Example: percentileEnvelope({calibration: [0, 10], scenario: [5, 9.95, 11]}) -> {value: {high: 9.9, stepsAboveHigh: 2, stepsAboveHighest: 1}}
 */
export function percentileEnvelope(of: {
  readonly calibration: ArrayLike<number>;
  readonly scenario: ArrayLike<number>;
}): Statistic<PercentileEnvelope> {
  const scenario = Array.from(of.scenario);
  if (scenario.length === 0) return undefinedBecause('the scenario has no values');
  const at = (probability: number) => quantile({ values: of.calibration, probability, type: 7 });
  const [low, high, highest] = [at(0.01), at(0.99), at(1)];
  if (!isDefined(low)) return low;
  if (!isDefined(high)) return high;
  if (!isDefined(highest)) return highest;
  const share = (steps: readonly number[]) => steps.length / scenario.length;
  const above = scenario.filter((value) => value > high.value);
  return computedTogether({
    low: low.value,
    high: high.value,
    highest: highest.value,
    stepsAboveHigh: above.length,
    shareAboveHigh: share(above),
    shareBelowLow: share(scenario.filter((value) => value < low.value)),
    stepsAboveHighest: scenario.filter((value) => value > highest.value).length,
  });
}
