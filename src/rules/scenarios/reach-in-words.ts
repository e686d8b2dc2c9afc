import type { ConditionFigures } from '../../facts/conditions/figures.ts';
import type { Outside, Reach } from '../../facts/conditions/reach.ts';
import type { DriverFigures } from '../../facts/conditions.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { few, figure } from '../figures.ts';

interface Told {
  readonly calibrated: ConditionFigures;
  readonly scenario: ConditionFigures;
  readonly reach: Reach;
  readonly envelope: DriverFigures['envelope'];
  /** `1` for none. */
  readonly unit: string;
  readonly by: 'year' | 'month' | 'step';
}

/** How far a driver reaches, for messages: figures with their unit, and the lines below the finding. */
export function reachInWords({ calibrated, scenario, reach, envelope, unit, by }: Told): {
  readonly range: string;
  readonly calibratedMean: string;
  readonly scenarioMean: string;
  /** ` (-12.7 %)`; empty where the calibrated mean is zero. */
  readonly change: string;
  readonly detail: readonly string[];
} {
  const ofUnit = unit === '1' ? '' : ` ${unit}`;
  const amount = (value: number) => `${figure(value)}${ofUnit}`;
  const span = (low: number, high: number) => `${figure(low)} to ${amount(high)}`;
  const { changePercent, outside } = reach;
  const change = isDefined(changePercent) ? ` (${signed(changePercent.value)} %)` : '';
  const range = span(calibrated.lowest, calibrated.highest);
  const [furthest] = outside.toSorted((one, other) => sizeOf(other) - sizeOf(one));
  const detail: string[] = [];
  if (furthest !== undefined) {
    const all = outside.map(({ label, value }) => `${label} (${figure(value)})`);
    const { label, value, share } = furthest;
    const size = isDefined(share) ? `, ${figure(100 * share.value)} % of the range beyond its end` : '';
    detail.push(`${by}s outside (${outside.length} of ${scenario.values.length}): ${few(all, 6)}`);
    detail.push(`furthest: ${label} with ${amount(value)}${size}`);
  }
  detail.push(
    `calibrated mean ${amount(calibrated.mean)} of ${calibrated.values.length} ${by}s (10th to 90th percentile ${span(calibrated.p10, calibrated.p90)}); in the scenario ${amount(scenario.mean)} of ${scenario.values.length}${change}`,
  );
  if (isDefined(envelope)) {
    const { shareAboveHigh, shareBelowLow } = envelope.value;
    detail.push(
      `single steps: ${figure(100 * shareAboveHigh)} % above the calibrated 99th percentile and ${figure(100 * shareBelowLow)} % below the 1st (1 % each if nothing changed)`,
    );
  }
  return {
    range,
    calibratedMean: amount(calibrated.mean),
    scenarioMean: amount(scenario.mean),
    change,
    detail,
  };
}

function sizeOf({ share }: Outside): number {
  return isDefined(share) ? share.value : Number.POSITIVE_INFINITY;
}

function signed(percent: number): string {
  return `${percent > 0 ? '+' : ''}${percent.toFixed(1)}`;
}
