import { defined, isDefined, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import { hullDistance } from '../../hydrology/scenarios/hull-distance.ts';
import { leverageLimit } from '../../hydrology/scenarios/leverage-limit.ts';
import { mahalanobis } from '../../hydrology/scenarios/mahalanobis.ts';
import { rangeExceedance } from '../../hydrology/scenarios/range-exceedance.ts';
import type { ConditionFigures } from './figures.ts';

/** How far one driver leaves its calibrated range. */
export interface Reach {
  /** Of the means; undefined where the calibrated one is zero. */
  readonly changePercent: Statistic;
  /** Null where the mean lies inside the range. */
  readonly mean: Outside | null;
  /** Years, months or steps outside, in order of time. */
  readonly outside: readonly Outside[];
}

export interface Outside {
  /** Empty for the mean. */
  readonly label: string;
  readonly value: number;
  /** How far outside, as a share of the range; undefined where that has no width. */
  readonly share: Statistic;
}

export function reachOf(calibrated: ConditionFigures, scenario: ConditionFigures): Reach {
  const outside = (label: string, value: number): readonly Outside[] =>
    isInside(value, calibrated) ? [] : [{ label, value, share: rangeExceedance({ value, ...calibrated }) }];
  return {
    changePercent:
      calibrated.mean === 0
        ? undefinedBecause('the calibrated mean is zero')
        : defined((100 * (scenario.mean - calibrated.mean)) / Math.abs(calibrated.mean)),
    mean: outside('', scenario.mean)[0] ?? null,
    outside: scenario.values.flatMap((value, place) => outside(scenario.labels[place] ?? '', value)),
  };
}

/** Within the range, rounding apart: the same days added up in another order are no new climate. */
function isInside(value: number, { lowest, highest }: Pick<ConditionFigures, 'lowest' | 'highest'>): boolean {
  const slack = 1e-9 * Math.max(Math.abs(lowest), Math.abs(highest));
  return value >= lowest - slack && value <= highest + slack;
}

/** How a scenario lies to the calibrated years in all its drivers together. */
export interface JointReach {
  readonly drivers: readonly string[];
  /** Calibrated years that have a value of every driver. */
  readonly calibratedYears: number;
  readonly mean: JointPoint;
  /** Scenario years that have a value of every driver. */
  readonly years: readonly JointPoint[];
}

export interface JointPoint {
  /** Empty for the mean of the years. */
  readonly label: string;
  /** Inside the calibrated range of every single driver. */
  readonly isInEveryRange: boolean;
  /** Mahalanobis distance squared, and the square that 2.5 % exceed. */
  readonly squared: number;
  readonly limit: number;
  readonly leverage: number;
  readonly leverageLimit: number;
  /** Distance from the convex hull in standard deviations, 0 inside; undefined with more than three drivers. */
  readonly hull: Statistic;
}

export const jointVersion = 1;

/**
 * Drivers by name, year by year. One that never varied in the calibration has no part: its range alone says whether it is left.
 * Undefined with fewer than two others, and where the joint distance is.
 */
export function jointReach(
  all: ReadonlyMap<string, { readonly calibrated: ConditionFigures; readonly scenario: ConditionFigures }>,
): Statistic<JointReach> {
  const drivers = new Map(
    [...all].filter(
      ([, { calibrated }]) => !isInside(calibrated.highest, { ...calibrated, highest: calibrated.lowest }),
    ),
  );
  if (drivers.size < 2) return undefinedBecause('fewer than two drivers are known year by year');
  const sides = [...drivers.values()];
  const calibrated = yearsOfAll(sides.map((side) => side.calibrated));
  const sample = calibrated.map(({ values }) => values);
  const leverages = leverageLimit(sample);
  if (!isDefined(leverages)) return leverages;
  const pointOf = (label: string, point: readonly number[]): Statistic<JointPoint> => {
    const distance = mahalanobis({ sample, point });
    if (!isDefined(distance)) return distance;
    const { squared, limit, leverage } = distance.value;
    const isInEveryRange = point.every((value, place) => {
      const side = sides[place]?.calibrated;
      return side !== undefined && isInside(value, side);
    });
    const hull = hullDistance({ sample, point });
    return defined({
      label,
      isInEveryRange,
      squared,
      limit,
      leverage,
      leverageLimit: leverages.value.limit,
      hull,
    });
  };
  const mean = pointOf(
    '',
    sides.map(({ scenario }) => scenario.mean),
  );
  if (!isDefined(mean)) return mean;
  return defined({
    drivers: [...drivers.keys()],
    calibratedYears: sample.length,
    mean: mean.value,
    years: yearsOfAll(sides.map(({ scenario }) => scenario)).flatMap(({ label, values }) => {
      const point = pointOf(label, values);
      return isDefined(point) ? [point.value] : [];
    }),
  });
}

interface Year {
  readonly label: string;
  readonly values: readonly number[];
}

/** Years of which every quantity has a value. */
function yearsOfAll(quantities: readonly ConditionFigures[]): readonly Year[] {
  const byLabel = quantities.map(
    ({ labels, values }) => new Map(labels.map((label, place) => [label, values[place] ?? 0])),
  );
  return [...(byLabel[0]?.keys() ?? [])].flatMap((label) => {
    const values = byLabel.flatMap((of) => of.get(label) ?? []);
    return values.length === quantities.length ? [{ label, values }] : [];
  });
}
