import { computed, isDefined, type Paired, type Statistic } from '../paired.ts';
import { correlation } from './correlation.ts';

/**
 * Coefficient of determination (R2): the squared Pearson correlation.
 *
 * Formula: r^2
 * Inputs: pairs, any units.
 * Range: 0 to 1; best 1.
 * Read: only beside the gradient and intercept of the regression, since a biased simulation can reach 1. NSE is never above it.
 * Undefined: fewer than two pairs, or either side all equal.
 * Variant: some libraries give NSE under the name R2; they are two statistics.
 * Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900, standard regression; Moriasi et al. 2015, Trans. ASABE 58(6):1763-1785, abstract.
 * Example: determination(pairInOrder({observed: [10, 20, 30, 40], simulated: [11, 22, 33, 44]})) -> {value: 1}
 */
export function determination(paired: Paired): Statistic {
  const r = correlation(paired);
  return isDefined(r) ? computed(r.value ** 2) : r;
}
