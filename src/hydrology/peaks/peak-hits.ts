import { mean } from '../arithmetic.ts';
import { computed, defined, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { noPairs } from '../reasons.ts';
import { findPeaks } from './find-peaks.ts';

export interface PeakHits {
  /** Indices into the pairs. */
  readonly observedPeaks: readonly number[];
  readonly simulatedPeaks: readonly number[];
  /** One to one, in order of time. */
  readonly hits: readonly { readonly observed: number; readonly simulated: number }[];
  readonly misses: number;
  readonly falseAlarms: number;
  /** Share of observed peaks that were hit. */
  readonly detected: Statistic;
  /** Share of simulated peaks that nothing was observed for. */
  readonly falseShare: Statistic;
  /** Hits among all peaks of either side. */
  readonly success: Statistic;
  /** Mean of 100 (S - O) / O over the hits: positive = simulated peaks too high. */
  readonly heightErrorPercent: Statistic;
  /** Mean of simulated minus observed position over the hits, in days: positive = simulated late. */
  readonly delayDays: Statistic;
}

/**
 * How many observed peaks the simulation hits, one to one within a tolerance of time: POD, FAR, CSI and percent error in peak.
 *
 * Formula: in order of time each observed peak takes the nearest unused simulated peak within the tolerance, the earlier
 * of two; detected (POD) = hits / (hits + misses); false share (FAR) = false alarms / (hits + false alarms);
 * success (CSI) = hits / (hits + misses + false alarms); height error = mean of 100 (S - O) / O over the hits
 * Inputs: pairs of flow in one unit, threshold above zero in that unit; distances in days, on the times of the pairs.
 * Range: shares 0 to 1, best detected 1, false share 0, success 1; best height error and delay 0.
 * Read: NSE can pass while peaks are missed; the height error speaks only of peaks that were hit.
 * Undefined: no pairs; threshold not above zero. Each share: nothing to divide by.
 * Source: usual contingency definitions (from memory); percent error in peak: ASCE 1993, in Moriasi et al. 2007, Trans. ASABE 50(3):885-900; matching is our choice.
 * Example: peakHits({paired: pairInOrder({observed: [1, 9, 2, 2, 8, 1], simulated: [1, 2, 6, 2, 2, 1]}), threshold: 5, minimumDistanceDays: 2, toleranceDays: 1}) -> {value: {misses: 1, falseAlarms: 0, detected: {value: 0.5}, heightErrorPercent: {value: -33.33}, delayDays: {value: 1}}}
 */
export function peakHits(of: {
  readonly paired: Paired;
  readonly threshold: number;
  readonly minimumDistanceDays: number;
  readonly toleranceDays: number;
}): Statistic<PeakHits> {
  const { observed, simulated, times } = of.paired;
  if (observed.length === 0) return undefinedBecause(noPairs);
  if (!(of.threshold > 0)) return undefinedBecause('a peak needs a threshold above zero');
  const apart = { positions: times, threshold: of.threshold, minimumDistance: of.minimumDistanceDays };
  const observedPeaks = findPeaks({ values: observed, ...apart });
  const simulatedPeaks = findPeaks({ values: simulated, ...apart });
  const unused = new Set(simulatedPeaks);
  const hits: { observed: number; simulated: number }[] = [];
  const delay = (hit: { observed: number; simulated: number }) =>
    (times[hit.simulated] ?? 0) - (times[hit.observed] ?? 0);
  for (const peak of observedPeaks) {
    let nearest: { observed: number; simulated: number } | null = null;
    for (const candidate of unused) {
      const hit = { observed: peak, simulated: candidate };
      if (Math.abs(delay(hit)) > of.toleranceDays + rounding) continue;
      if (nearest === null || Math.abs(delay(hit)) < Math.abs(delay(nearest)) - rounding) nearest = hit;
    }
    if (nearest === null) continue;
    hits.push(nearest);
    unused.delete(nearest.simulated);
  }
  const misses = observedPeaks.length - hits.length;
  const falseAlarms = unused.size;
  const heightError = (hit: { observed: number; simulated: number }) =>
    (100 * ((simulated[hit.simulated] ?? 0) - (observed[hit.observed] ?? 0))) / (observed[hit.observed] ?? 0);
  const overHits = (figure: (hit: { observed: number; simulated: number }) => number) =>
    hits.length === 0 ? undefinedBecause('no observed peak was hit') : computed(mean(hits.map(figure)));
  return defined({
    observedPeaks,
    simulatedPeaks,
    hits,
    misses,
    falseAlarms,
    detected: share(hits.length, observedPeaks.length, 'no observed peak reaches the threshold'),
    falseShare: share(falseAlarms, simulatedPeaks.length, 'no simulated peak reaches the threshold'),
    success: share(hits.length, hits.length + misses + falseAlarms, 'no peak reaches the threshold'),
    heightErrorPercent: overHits(heightError),
    delayDays: overHits(delay),
  });
}

/** Times of hours are fractions of a day, whose differences are not exact. */
const rounding = 1e-6;

function share(part: number, whole: number, whenNone: string): Statistic {
  return whole === 0 ? undefinedBecause(whenNone) : computed(part / whole);
}
