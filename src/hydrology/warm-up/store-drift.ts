import { defined, isDefined, type Statistic, undefinedBecause } from '../paired.ts';
import { type MannKendall, mannKendall } from '../trend/mann-kendall.ts';
import { type SenSlope, senSlope } from '../trend/sen-slope.ts';
import { yearlyChange } from './yearly-change.ts';

export interface StoreDrift {
  /** Largest change from a year to the next, in percent, sign dropped. */
  readonly largestChangePercent: Statistic;
  /** Change into the last year, in percent. */
  readonly lastChangePercent: Statistic;
  /** In mm a year. */
  readonly slope: SenSlope;
  /** Slope as a share of the mean annual rainfall, in percent. */
  readonly slopePercentOfRainfall: Statistic;
  /** Undefined below five years: the test cannot tell. */
  readonly trend: Statistic<MannKendall>;
}

/**
 * Whether a store still drifts after warm-up.
 *
 * Formula: yearly changes, Sen's slope and Mann-Kendall test of the yearly values
 * Inputs: years and the store on the same date of each, or its annual means, in mm; mean annual rainfall in mm.
 * Range: best changes and slope 0.
 * Read: a slope of 1 % of the rainfall is water that the balance does not have. A drying climate drifts too.
 * Undefined: fewer than two years. The trend below five years; shares where they divide by zero.
 * Source: Ajami et al. 2014, Water Resour. Res. 50:2636-2656; Sen 1968, J. Am. Stat. Assoc. 63:1379-1389; share of rainfall is our choice.
 * Example: storeDrift({years: [1, 2, 3], storageMm: [100, 104, 108], annualRainfallMm: 800}) -> {value: {largestChangePercent: {value: 4}, slope: {slope: 4}, slopePercentOfRainfall: {value: 0.5}, trend: {undefined: 'with fewer than five years a trend test cannot tell drift from chance'}}}
 */
export function storeDrift(of: {
  readonly years: ArrayLike<number>;
  readonly storageMm: ArrayLike<number>;
  readonly annualRainfallMm: number;
}): Statistic<StoreDrift> {
  const slope = senSlope({ times: of.years, values: of.storageMm });
  if (!isDefined(slope)) return slope;
  const changes = yearlyChange(of.storageMm);
  const sizes = changes.filter(isDefined).map((change) => Math.abs(change.value));
  const empty = undefinedBecause('the store was empty the year before');
  return defined({
    largestChangePercent: sizes.length < changes.length ? empty : defined(Math.max(...sizes)),
    lastChangePercent: changes.at(-1) ?? empty,
    slope: slope.value,
    slopePercentOfRainfall:
      of.annualRainfallMm > 0
        ? defined((100 * slope.value.slope) / of.annualRainfallMm)
        : undefinedBecause('there is no mean annual rainfall to compare with'),
    trend:
      of.storageMm.length < 5
        ? undefinedBecause('with fewer than five years a trend test cannot tell drift from chance')
        : mannKendall(of.storageMm),
  });
}
