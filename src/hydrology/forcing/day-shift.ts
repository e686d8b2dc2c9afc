import { correlation } from '../fit/correlation.ts';
import { defined, isDefined, type Paired, pairInOrder, type Statistic } from '../paired.ts';

export interface DayShift {
  readonly sameDay: number;
  /** Reference of a day against the checked series one day later: high when the checked series stands a day late. */
  readonly oneDayLate: number;
  /** Reference of a day against the checked series one day before: high when the checked series stands a day early. */
  readonly oneDayEarly: number;
  /** The best of the three: 0, 1 (checked series late) or -1 (early). */
  readonly days: number;
  /** How much higher the best correlation is than that of the same day. */
  readonly gain: number;
}

/**
 * Whether a daily series fits its reference better when moved by one day.
 *
 * Formula: r of O_t with S_t, S_t+1 and S_t-1, over days that have their neighbour
 * Inputs: daily pairs with times in days, the reference as observed, the checked series as simulated.
 * Range: shift -1, 0 or 1; best 0.
 * Read: a gain well above chance says that the hour at which the day ends, or the time zone, differs between the two.
 * Undefined: too few neighbouring days, or either side all equal.
 * Source: common practice; no published limit is known.
 * Example: dayShift(pairInOrder({observed: [0, 9, 0, 4, 0, 0], simulated: [0, 0, 9, 0, 4, 0]})) -> {value: {oneDayLate: 1, days: 1}}
 */
export function dayShift(daily: Paired): Statistic<DayShift> {
  const correlationAt = (lag: number) => {
    const observed: number[] = [];
    const simulated: number[] = [];
    for (let index = 0; index < daily.times.length; index++) {
      const other = index + lag;
      if ((daily.times[other] ?? Number.NaN) - (daily.times[index] ?? Number.NaN) !== lag) continue;
      observed.push(daily.observed[index] ?? Number.NaN);
      simulated.push(daily.simulated[other] ?? Number.NaN);
    }
    return correlation(pairInOrder({ observed, simulated }));
  };
  const same = correlationAt(0);
  if (!isDefined(same)) return same;
  const late = correlationAt(1);
  if (!isDefined(late)) return late;
  const early = correlationAt(-1);
  if (!isDefined(early)) return early;
  const best = Math.max(same.value, late.value, early.value);
  return defined({
    sameDay: same.value,
    oneDayLate: late.value,
    oneDayEarly: early.value,
    days: best === same.value ? 0 : best === late.value ? 1 : -1,
    gain: best - same.value,
  });
}
