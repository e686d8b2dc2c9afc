import { isConstant, mean, sampleDeviation } from '../arithmetic.ts';
import { kolmogorovSmirnov } from '../distribution/kolmogorov-smirnov.ts';
import { computedTogether, isDefined, type Statistic, undefinedBecause } from '../paired.ts';
import { wetnessClasses } from './wetness-classes.ts';

export interface Representativeness {
  readonly years: number;
  readonly mean: number;
  /** Mean of the window over mean of the record. */
  readonly meanRatio: number;
  /** Distance of the means in standard deviations (n - 1) of single years. */
  readonly meanDeviations: number;
  /** Share of all windows of this length with a smaller mean. */
  readonly meanRank: number;
  readonly yearsAboveMean: number;
  /** Range of the window over range of the record. */
  readonly rangeShare: number;
  readonly dryYears: number;
  readonly averageYears: number;
  readonly wetYears: number;
  /** Kolmogorov-Smirnov distance between window and record. */
  readonly distance: number;
}

/**
 * How well a window of years stands for the long record that holds it.
 *
 * Formula: ratio and deviations of the mean, its rank among all moving windows of the same length, tercile counts, share of the range, two-sample Kolmogorov-Smirnov distance
 * Inputs: years and totals of the long record, whole years, ascending and without gaps; first and last year of the window, both included.
 * Range: ratio 1, deviations 0, rank 0.5 and range share 1 stand for a typical window.
 * Read: a rank near 0 or 1 says that the model was fitted in unusually dry or wet years.
 * Undefined: the record is all equal, sums to zero, has under three years, or is not longer than the window; the window holds no year of it.
 * Source: our choice of measures; the question: Klemes 1986, Hydrol. Sci. J. 31(1):13-24; Gan et al. 1997, in Moriasi et al. 2007, Trans. ASABE 50(3):885-900.
 * Example: representativeness({years: [2001, 2002, 2003, 2004], totals: [800, 1200, 900, 1000], first: 2003, last: 2004}) -> {value: {years: 2, mean: 950, meanRatio: 0.974, meanRank: 0, rangeShare: 0.25, dryYears: 0, averageYears: 2}}
 */
export function representativeness(of: {
  readonly years: ArrayLike<number>;
  readonly totals: ArrayLike<number>;
  readonly first: number;
  readonly last: number;
}): Statistic<Representativeness> {
  const record = Array.from(of.totals);
  const inside = (_: number, index: number) => {
    const year = of.years[index] ?? Number.NaN;
    return year >= of.first && year <= of.last;
  };
  const window = record.filter(inside);
  if (window.length === 0) return undefinedBecause('the window holds no year of the record');
  if (window.length >= record.length)
    return undefinedBecause('the record is no longer than the window, so there is nothing to compare with');
  if (isConstant(record)) return undefinedBecause('the years of the record are all equal');
  const recordMean = mean(record);
  if (recordMean === 0) return undefinedBecause('the record sums to zero');
  const classes = wetnessClasses(of);
  if (!isDefined(classes)) return classes;
  const gap = kolmogorovSmirnov({ sample: window, other: record });
  if (!isDefined(gap)) return gap;
  const windowMean = mean(window);
  const windows = record.length - window.length + 1;
  const lower = Array.from({ length: windows }, (_, start) =>
    mean(record.slice(start, start + window.length)),
  ).filter((other) => other < windowMean).length;
  const range = (values: readonly number[]) => Math.max(...values) - Math.min(...values);
  const classed = classes.value.years.filter(({ year }) => year >= of.first && year <= of.last);
  const count = (wetness: string) => classed.filter((year) => year.wetness === wetness).length;
  return computedTogether({
    years: window.length,
    mean: windowMean,
    meanRatio: windowMean / recordMean,
    meanDeviations: (windowMean - recordMean) / sampleDeviation(record),
    meanRank: lower / windows,
    yearsAboveMean: window.filter((total) => total > recordMean).length,
    rangeShare: range(window) / range(record),
    dryYears: count('dry'),
    averageYears: count('average'),
    wetYears: count('wet'),
    distance: gap.value.distance,
  });
}
