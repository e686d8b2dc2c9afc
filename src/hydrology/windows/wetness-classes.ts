import { isConstant } from '../arithmetic.ts';
import { quantile } from '../distribution/quantile.ts';
import { defined, isDefined, type Statistic, undefinedBecause } from '../paired.ts';

export type Wetness = 'dry' | 'average' | 'wet';

export interface WetnessClasses {
  /** Terciles of the long record, in its unit. */
  readonly lowerTercile: number;
  readonly upperTercile: number;
  readonly years: readonly { readonly year: number; readonly total: number; readonly wetness: Wetness }[];
}

/**
 * Wet, average and dry years of a long record.
 *
 * Formula: dry below the first tercile, wet above the second, average between and on them (type-7 quantiles)
 * Inputs: years and their totals, step beside step, whole years only; classify by rainfall (or the forcing at stake), not by simulated flow.
 * Range: three classes of about a third of the years each.
 * Read: a calibration should see all three; one wet year does not make a wet window.
 * Undefined: fewer than three years, or totals all equal.
 * Variant: Moriasi et al. 2007 (p. 892) call years above the mean wet and below it dry; Klemes 1986 gives no number.
 * Source: terciles as in climatology (from memory); need of all three: Gan et al. 1997, in Moriasi et al. 2007, Trans. ASABE 50(3):885-900.
 * Example: wetnessClasses({years: [2001, 2002, 2003, 2004], totals: [800, 1200, 900, 1000]}) -> {value: {lowerTercile: 900, upperTercile: 1000, years: [{wetness: 'dry'}, {wetness: 'wet'}, {wetness: 'average'}, {wetness: 'average'}]}}
 */
export function wetnessClasses(record: {
  readonly years: ArrayLike<number>;
  readonly totals: ArrayLike<number>;
}): Statistic<WetnessClasses> {
  const { years, totals } = record;
  if (totals.length < 3) return undefinedBecause('three classes need at least three years');
  if (isConstant(totals)) return undefinedBecause('the years are all equal, so none is wet or dry');
  const lower = quantile({ values: totals, probability: 1 / 3, type: 7 });
  const upper = quantile({ values: totals, probability: 2 / 3, type: 7 });
  if (!isDefined(lower)) return lower;
  if (!isDefined(upper)) return upper;
  const [lowerTercile, upperTercile] = [lower.value, upper.value];
  const classed = Array.from(totals, (total, index) => {
    const wetness: Wetness = total < lowerTercile ? 'dry' : total > upperTercile ? 'wet' : 'average';
    return { year: years[index] ?? Number.NaN, total, wetness };
  });
  return defined({ lowerTercile, upperTercile, years: classed });
}
