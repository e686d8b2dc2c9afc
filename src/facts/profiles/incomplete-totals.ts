import { isDefined } from '../../hydrology/paired.ts';
import { aggregate, type Completeness } from '../../series/aggregate.ts';
import { secondsOfDay } from '../../series/calendar.ts';
import type { YearBegins } from '../../series/hydrological-year.ts';
import type { Series } from '../../series/series.ts';
import { formatTime, monthly, sameStep, yearly } from '../../series/step.ts';
import { asDepth } from './as-depth.ts';

/** A month or year whose stated figure is that of the days that happen to be there. */
export interface IncompleteTotal {
  readonly label: string;
  /** Steps of the finer series in it, and how many of them are missing. */
  readonly steps: number;
  readonly missing: number;
  readonly longestGap: number;
}

/** Raised whenever the same content may get another list. */
export const incompleteTotalsVersion = 1;

/** Figures alike to half a percent: they are printed with few digits. */
const alike = 0.005;

/**
 * Months or years that a coarse series gives a value for though its finer series lacks steps of them, and whose value is that
 * of the steps that are there. One filled by other means has another value and is not listed. Of totals every step counts; means may
 * lack a few (WMO-No. 1203: fewer than 11 days, and fewer than 5 in a row). Empty unless one is monthly or yearly and the other daily or finer, and where units differ.
 */
export function incompleteTotals(of: {
  readonly coarse: Series;
  readonly fine: Series;
  readonly yearBegins: YearBegins;
}): readonly IncompleteTotal[] {
  const { yearBegins } = of;
  const by = sameStep(of.coarse.step, monthly) ? 'month' : sameStep(of.coarse.step, yearly) ? 'year' : null;
  const [coarseDepth, fineDepth] = [asDepth(of.coarse), asDepth(of.fine)];
  const adds = isDefined(coarseDepth) && isDefined(fineDepth);
  const isFine = of.fine.step.kind === 'seconds' && of.fine.step.length <= secondsOfDay;
  if (by === null || !isFine || (!adds && of.coarse.unit !== of.fine.unit)) return [];
  const coarse = adds ? coarseDepth.value : of.coarse;
  const fine = adds ? fineDepth.value : of.fine;
  const values = new Map(
    Array.from(coarse.timeSeconds, (time, row) => [
      formatTime(time, coarse.step),
      coarse.values[row] as number,
    ]),
  );
  const how = adds ? 'total' : 'mean';
  const completeness: Completeness = adds ? 'every-step' : 'eleven-five';
  return aggregate(fine, { by, how, completeness, yearBegins }).flatMap((group) => {
    const { label, steps, missing, longestGap, presentSum, value } = group;
    const stated = values.get(label) ?? Number.NaN;
    const ofThese = adds ? presentSum : presentSum / (steps - missing);
    const isMade = Math.abs(stated - ofThese) <= alike * Math.abs(ofThese);
    return isDefined(value) || steps === missing || !isMade ? [] : [{ label, steps, missing, longestGap }];
  });
}
