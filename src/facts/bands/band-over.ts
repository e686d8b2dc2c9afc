import { defined, isDefined, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import type { Band } from '../../hydrology/uncertainty/band.ts';
import { coverage } from '../../hydrology/uncertainty/coverage.ts';
import { crossedSteps } from '../../hydrology/uncertainty/crossed-steps.ts';
import { intervalScore } from '../../hydrology/uncertainty/interval-score.ts';
import { meanWidth } from '../../hydrology/uncertainty/mean-width.ts';
import { relativeWidth } from '../../hydrology/uncertainty/relative-width.ts';
import type { YearBegins } from '../../series/hydrological-year.ts';
import { pairByDate } from '../../series/pair.ts';
import type { Series } from '../../series/series.ts';
import type { Days } from '../over.ts';

/** Both ends of a band, step beside step. */
export interface Ends {
  readonly lower: Series;
  readonly upper: Series;
}

/** What a band does over one window. */
export interface BandOver {
  /** Steps of the window, or samples in it. */
  readonly windowSteps: number;
  /** Steps with an observation and both ends. */
  readonly steps: number;
  /** Steps with an observation, but without one end or both. */
  readonly withoutBand: number;
  readonly coverage: Statistic;
  readonly relativeWidth: Statistic;
  readonly meanWidth: Statistic;
  readonly intervalScore: Statistic;
}

/** Figures of a band that holds a series of its own step and unit. Undefined where the two have no steps in common. */
export function bandOver(
  observed: Series,
  { lower, upper }: Ends,
  level: number | undefined,
  days: Days,
  yearBegins: YearBegins,
): Statistic<BandOver> {
  const low = pairByDate({ observed, simulated: lower, ...days, yearBegins });
  if (!isDefined(low)) return low;
  const high = pairByDate({ observed, simulated: upper, ...days, yearBegins });
  if (!isDefined(high)) return high;
  const band = together(low.value, high.value);
  const steps = band.observed.length;
  const { windowSteps, dropped } = low.value;
  return defined({
    windowSteps,
    steps,
    withoutBand: low.value.observed.length + dropped.missingSimulated - steps,
    coverage: coverage(band),
    relativeWidth: relativeWidth(band),
    meanWidth: meanWidth(band),
    intervalScore:
      level === undefined ? undefinedBecause('the band has no level') : intervalScore({ band, level }),
  });
}

type Pairs = {
  readonly times: Float64Array;
  readonly observed: Float64Array;
  readonly simulated: Float64Array;
};

/** The steps that both hold. */
function together(low: Pairs, high: Pairs): Band {
  const [observed, lower, upper]: [number[], number[], number[]] = [[], [], []];
  let other = 0;
  for (const [place, time] of low.times.entries()) {
    while (other < high.times.length && (high.times[other] ?? 0) < time) other++;
    if (high.times[other] !== time) continue;
    observed.push(low.observed[place] ?? Number.NaN);
    lower.push(low.simulated[place] ?? Number.NaN);
    upper.push(high.simulated[other] ?? Number.NaN);
  }
  return {
    observed: Float64Array.from(observed),
    lower: Float64Array.from(lower),
    upper: Float64Array.from(upper),
  };
}

/** Steps of the whole file on which the lower end lies above the upper one, and the time of the first. */
export function crossings({ lower, upper }: Ends): { readonly steps: number; readonly firstSeconds: number } {
  const crossed = crossedSteps({ observed: lower.values, lower: lower.values, upper: upper.values });
  return { steps: crossed.length, firstSeconds: lower.timeSeconds[crossed[0] ?? 0] ?? 0 };
}
