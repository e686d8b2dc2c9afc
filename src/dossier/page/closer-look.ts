import type { Paired } from '../../hydrology/paired.ts';
import { formatDate, type Window } from '../../series/calendar.ts';
import { daysOfYear, type YearBegins, yearOf } from '../../series/hydrological-year.ts';
import type { OverTime } from '../charts/hydrograph.ts';
import type { Line } from '../charts/thin.ts';

/** A year of a target's series, short enough that single days can be told apart. */
export interface CloserLook {
  readonly series: OverTime;
  /** Such as `2007-10-01 to 2008-09-30, with the highest observed value`. */
  readonly when: string;
}

/** The years (as the study counts them) in which the highest and the lowest value was observed. */
export function closerLooks(
  pairs: Paired,
  series: OverTime,
  yearBegins: YearBegins,
): { readonly highest: CloserLook; readonly lowest: CloserLook } {
  let [highest, lowest] = [0, 0];
  for (const [place, value] of pairs.observed.entries()) {
    if (value > (pairs.observed[highest] as number)) highest = place;
    if (value < (pairs.observed[lowest] as number)) lowest = place;
  }
  const look = (place: number, which: string): CloserLook => {
    const year = yearOf(Math.floor(pairs.times[place] as number), yearBegins);
    const days = daysOfYear(year, yearBegins);
    return {
      series: cropped(series, days),
      when: `${formatDate(days.firstDay)} to ${formatDate(days.lastDay)}, with the ${which} observed value`,
    };
  };
  return { highest: look(highest, 'highest'), lowest: look(lowest, 'lowest') };
}

function cropped({ observed, simulated, band, longestStep }: OverTime, days: Window): OverTime {
  const line = ({ x, y }: Line): Line => ({ x: inDays(x, x, days), y: inDays(y, x, days) });
  return {
    observed: line(observed),
    simulated: line(simulated),
    band:
      band === null
        ? null
        : {
            x: inDays(band.x, band.x, days),
            lower: inDays(band.lower, band.x, days),
            upper: inDays(band.upper, band.x, days),
          },
    longestStep,
  };
}

function inDays(
  values: ArrayLike<number>,
  x: ArrayLike<number>,
  { firstDay, lastDay }: Window,
): Float64Array {
  return Float64Array.from(values).filter((_, row) => {
    const day = x[row] as number;
    return day >= firstDay && day < lastDay + 1;
  });
}
