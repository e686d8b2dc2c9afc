import { mean } from '../../hydrology/arithmetic.ts';
import { quantile } from '../../hydrology/distribution/quantile.ts';
import { defined, isDefined, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import { aggregate, type Group } from '../../series/aggregate.ts';
import { formatDate, secondsOfDay } from '../../series/calendar.ts';
import type { Series } from '../../series/series.ts';
import { type Within, within } from '../../series/within.ts';

/** How the values of a quantity are made of its series. */
export interface Making extends Within {
  readonly by: 'year' | 'month' | 'step';
  readonly total: boolean;
}

/** What a quantity was over a window, in one value for each year, month or step. */
export interface ConditionFigures {
  /** `2004`, `2004-05` or `2004-05-01`, value beside value. */
  readonly labels: readonly string[];
  readonly values: readonly number[];
  /** Years or months that are left out because the window or the data do not hold them whole. */
  readonly incomplete: number;
  readonly mean: number;
  readonly lowest: number;
  readonly highest: number;
  /** 10th and 90th percentile of the values (type 7). */
  readonly p10: number;
  readonly p90: number;
}

export const conditionVersion = 1;

/** A mean of a year or month may lack this share of its values; a total lacks none (WMO's rule for totals; the share is our own choice). */
const mostMissing = 0.1;

/** The values of a quantity. Undefined where no year (or month, or step) of the window is there whole. */
export function conditionFigures(series: Series, making: Making): Statistic<ConditionFigures> {
  const inside = within(series, making);
  const { labels, values, incomplete } = making.by === 'step' ? steps(inside) : groups(inside, making);
  if (values.length === 0)
    return undefinedBecause(
      inside.values.length === 0
        ? 'the window holds no values'
        : `no ${making.by} of the window is there as a whole`,
    );
  const at = (probability: number) => {
    const found = quantile({ values, probability, type: 7 });
    return isDefined(found) ? found.value : Number.NaN;
  };
  return defined({
    labels,
    values,
    incomplete,
    mean: mean(values),
    lowest: at(0),
    highest: at(1),
    p10: at(0.1),
    p90: at(0.9),
  });
}

type Values = Pick<ConditionFigures, 'labels' | 'values' | 'incomplete'>;

function steps({ timeSeconds, values }: Series): Values {
  const kept = [...values.keys()].filter((row) => !Number.isNaN(values[row]));
  return {
    labels: kept.map((row) => formatDate(Math.floor((timeSeconds[row] ?? 0) / secondsOfDay))),
    values: kept.map((row) => values[row] ?? 0),
    incomplete: 0,
  };
}

function groups(inside: Series, { by, total, yearBegins, months }: Making): Values {
  const made = aggregate(inside, {
    by: by === 'month' ? 'month' : 'year',
    how: total ? 'total' : 'mean',
    completeness: 'every-step',
    yearBegins,
    ...(months === undefined ? {} : { months }),
  })
    .filter(({ steps, missing }) => steps > missing)
    .map((group) => ({ label: group.label, value: groupValue(group, total) }));
  const whole = made.filter(({ value }) => value !== null);
  return {
    labels: whole.map(({ label }) => label),
    values: whole.map(({ value }) => value ?? 0),
    incomplete: made.length - whole.length,
  };
}

function groupValue({ steps, missing, presentSum, value }: Group, total: boolean): number | null {
  if (isDefined(value)) return value.value;
  return total || missing > mostMissing * steps ? null : presentSum / (steps - missing);
}
