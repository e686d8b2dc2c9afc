import { type Paired, pairInOrder } from '../../hydrology/paired.ts';
import { aggregate, type Group } from '../../series/aggregate.ts';
import { secondsOfDay } from '../../series/calendar.ts';
import type { YearBegins } from '../../series/hydrological-year.ts';
import type { Series } from '../../series/series.ts';
import type { Step } from '../../series/step.ts';

/** A group counts when both series have at least this share of its steps; the choice is ours. */
export const leastShare = 0.9;

export interface CommonTotals {
  readonly labels: readonly string[];
  /** The reference as observed, the checked series as simulated; times are the first days of the groups. */
  readonly pairs: Paired;
}

/**
 * Both series by month or year, over the steps that both have: totals of amounts, means of what does not add up. So a gap of
 * one of them makes no difference between the two.
 */
export function commonTotals(
  daily: Paired,
  of: {
    readonly step: Step;
    readonly by: 'month' | 'year';
    readonly how: 'total' | 'mean';
    readonly yearBegins: YearBegins;
  },
): CommonTotals {
  const timeSeconds = daily.times.map((time) => time * secondsOfDay);
  const grouped = (values: Float64Array) =>
    aggregate({ unit: '', step: of.step, timeSeconds, values } satisfies Series, {
      ...of,
      completeness: 'any',
    });
  const observed = grouped(daily.observed);
  const simulated = grouped(daily.simulated);
  const kept = observed.flatMap((group, place) => {
    const other = simulated[place];
    return other !== undefined && isWhole(group) ? [{ group, other }] : [];
  });
  const figure = ({ presentSum, steps, missing }: Group) =>
    of.how === 'total' ? presentSum : presentSum / (steps - missing);
  return {
    labels: kept.map(({ group }) => group.label),
    pairs: {
      ...pairInOrder({
        observed: kept.map(({ group }) => figure(group)),
        simulated: kept.map(({ other }) => figure(other)),
      }),
      times: Float64Array.from(kept, ({ group }) => group.days.firstDay),
    },
  };
}

function isWhole({ steps, missing }: Group): boolean {
  return steps > 0 && (steps - missing) / steps >= leastShare;
}
