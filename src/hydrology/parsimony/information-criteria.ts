import { computed, defined, type Statistic, undefinedBecause } from '../paired.ts';

export interface InformationCriteria {
  readonly aic: number;
  /** For small samples; undefined when values are not more than parameters plus one. */
  readonly aicSmallSample: Statistic;
  readonly bic: number;
}

/**
 * Akaike and Bayesian information criteria: fit against the number of calibrated parameters.
 *
 * Formula: AIC = n ln(SSE / n) + 2 k; AICc = AIC + 2 k (k + 1) / (n - k - 1); BIC = n ln(SSE / n) + k ln n
 * Inputs: number of independent values n, calibrated parameters k (error variance not counted), sum of squared errors in squared units.
 * Range: any; smaller is better, for models of the same data only.
 * Read: errors of daily flow resemble those of the day before, so that n is overstated and parameters look cheaper than they are.
 * Undefined: no values, or a sum of squared errors that is not above 0.
 * Source: Akaike 1974, IEEE Trans. Autom. Control 19:716-723; Schwarz 1978, Ann. Stat. 6:461-464 (both from memory).
 * Example: informationCriteria({values: 60, parameters: 4, squaredErrors: 30.2}) -> {value: {aic: -33.1902, aicSmallSample: {value: -32.4629}, bic: -24.8128}}
 */
export function informationCriteria(of: {
  readonly values: number;
  readonly parameters: number;
  readonly squaredErrors: number;
}): Statistic<InformationCriteria> {
  const { values: n, parameters: k, squaredErrors } = of;
  if (!(n > 0 && squaredErrors > 0 && Number.isFinite(squaredErrors)))
    return undefinedBecause('the criteria need values and a sum of squared errors above zero');
  const fit = n * Math.log(squaredErrors / n);
  const aic = fit + 2 * k;
  return defined({
    aic,
    aicSmallSample:
      n > k + 1
        ? computed(aic + (2 * k * (k + 1)) / (n - k - 1))
        : undefinedBecause('the sample has too few values for its parameters'),
    bic: fit + k * Math.log(n),
  });
}
