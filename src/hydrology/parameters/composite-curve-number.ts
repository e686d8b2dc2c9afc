import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * Curve number of an area that is sealed in part.
 *
 * Formula: CN_p + (sealed percent / 100) (98 - CN_p)
 * Inputs: curve number of the pervious part; sealed share in percent, connected to the drains.
 * Range: CN_p to 98.
 * Read: sealing raises the curve number on every soil.
 * Undefined: a curve number outside 0 to 98, or a share outside 0 to 100 %.
 * Source: TR-55 1986, figure 2-3; NRCS National Engineering Handbook 630, ch. 9.
 * Example: compositeCurveNumber({pervious: 61, sealedPercent: 65}) -> {value: 85.05}
 */
export function compositeCurveNumber(of: {
  readonly pervious: number;
  readonly sealedPercent: number;
}): Statistic {
  const { pervious, sealedPercent } = of;
  if (!(pervious >= 0 && pervious <= 98 && sealedPercent >= 0 && sealedPercent <= 100))
    return undefinedBecause('a curve number lies between 0 and 98, a sealed share between 0 and 100 %');
  return computed(pervious + (sealedPercent / 100) * (98 - pervious));
}
