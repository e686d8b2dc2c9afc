import { computedTogether, type Statistic, undefinedBecause } from '../paired.ts';

export interface CurveNumberRunoff {
  /** Potential retention, mm. */
  readonly retentionMm: number;
  /** Initial abstraction, a fifth of it, mm. */
  readonly abstractionMm: number;
  readonly runoffMm: number;
}

/**
 * Runoff of a storm by the curve-number method.
 *
 * Formula: S = 25400 / CN - 254; Ia = 0.2 S; Q = (P - Ia)^2 / (P + 0.8 S) if P > Ia, else 0
 * Inputs: curve number, no unit; storm rainfall in mm; results in mm.
 * Range: Q 0 to P.
 * Read: a check of what a curve number means, not a model; valid for single storms.
 * Undefined: a curve number not above 0 or over 100; negative rainfall.
 * Source: NRCS National Engineering Handbook 630, ch. 10; TR-55 1986, eqs. 2-1 to 2-4, in millimetres.
 * Example: curveNumberRunoff({curveNumber: 75, rainfallMm: 152.4}) -> {value: {retentionMm: 84.6667, abstractionMm: 16.9333, runoffMm: 83.36}}
 */
export function curveNumberRunoff(of: {
  readonly curveNumber: number;
  readonly rainfallMm: number;
}): Statistic<CurveNumberRunoff> {
  if (!(of.curveNumber > 0 && of.curveNumber <= 100))
    return undefinedBecause('a curve number lies above 0 and at most at 100');
  if (!(of.rainfallMm >= 0)) return undefinedBecause('rainfall is not negative');
  const retentionMm = 25_400 / of.curveNumber - 254;
  const abstractionMm = 0.2 * retentionMm;
  const excess = Math.max(0, of.rainfallMm - abstractionMm);
  const runoffMm = excess === 0 ? 0 : excess ** 2 / (of.rainfallMm + 0.8 * retentionMm);
  return computedTogether({ retentionMm, abstractionMm, runoffMm });
}
