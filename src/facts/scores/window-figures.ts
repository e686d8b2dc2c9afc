import { quantile } from '../../hydrology/distribution/quantile.ts';
import {
  type Dropped,
  isDefined,
  type Paired,
  type Statistic,
  undefinedBecause,
} from '../../hydrology/paired.ts';
import { peakHits } from '../../hydrology/peaks/peak-hits.ts';
import { type ScoreName, scores } from '../../hydrology/scores.ts';
import { secondsOfDay } from '../../series/calendar.ts';
import type { Step } from '../../series/step.ts';

/** What one window's pairs give. */
export interface WindowFigures {
  /** As stated, `first-day/last-day`. */
  readonly periods: readonly string[];
  readonly pairs: number;
  /** Steps that the windows would hold if nothing were missing; for samples, those that there are. */
  readonly windowSteps: number;
  readonly dropped: Dropped;
  /** Those that were asked for. */
  readonly scores: Readonly<Partial<Record<ScoreName, Statistic>>>;
  readonly peaks: Statistic<PeakFigures>;
}

export interface PeakFigures {
  /** Least value of a peak, in the unit of the observations. */
  readonly above: number;
  /** Whether the record says what a peak is; else it is our own choice. */
  readonly stated: boolean;
  readonly observed: number;
  readonly hits: number;
  readonly falseAlarms: number;
  /** Share of observed peaks that were hit. */
  readonly share: Statistic;
  /** Of the peaks that were hit: positive = too high, too late. */
  readonly heightErrorPercent: Statistic;
  readonly delayDays: Statistic;
}

/** What counts as a peak: least value in the unit of the observations, distances in time steps. */
export interface PeakSettings {
  readonly above?: number | undefined;
  readonly apart?: number | undefined;
  readonly within?: number | undefined;
}

/** Where nothing is stated: flows that are exceeded on 2 % of the days, a week apart, hit within a day. Our own choice. */
const usual = { exceedance: 0.02, apart: 7, within: 1 };

/** What is computed of a window: rarer scores cost as much as all the usual ones together. */
export interface Asked {
  readonly scores: readonly ScoreName[];
  /** Null where nobody asks for peaks. */
  readonly peaks: PeakSettings | null;
}

/** The figures of a window that are asked for. */
export function windowFigures(
  paired: Paired,
  periods: readonly string[],
  step: Step,
  asked: Asked,
): WindowFigures {
  return {
    periods,
    pairs: paired.observed.length,
    windowSteps: paired.windowSteps,
    dropped: paired.dropped,
    scores: Object.fromEntries(asked.scores.map((name) => [name, scores[name](paired)])),
    peaks:
      asked.peaks === null
        ? undefinedBecause('nobody asks for peaks')
        : peakFigures(paired, step, asked.peaks),
  };
}

function peakFigures(paired: Paired, step: Step, settings: PeakSettings): Statistic<PeakFigures> {
  const stated = settings.above !== undefined;
  const isDaily = step.kind === 'seconds' && step.length === secondsOfDay;
  if (step.kind !== 'seconds') return undefinedBecause('peaks are counted in steps of a day or less');
  if (!stated && !isDaily) return undefinedBecause('nothing says what counts as a peak (`peaks`)');
  const { observed } = paired;
  const usualAbove = quantile({ values: observed, probability: 1 - usual.exceedance, type: 6 });
  const above = settings.above ?? (isDefined(usualAbove) ? usualAbove.value : Number.NaN);
  const days = step.length / secondsOfDay;
  const found = peakHits({
    paired,
    threshold: above,
    minimumDistanceDays: (settings.apart ?? usual.apart) * days,
    toleranceDays: (settings.within ?? usual.within) * days,
  });
  if (!isDefined(found)) return found;
  const { observedPeaks, hits, falseAlarms, detected: share, heightErrorPercent, delayDays } = found.value;
  return {
    value: {
      above,
      stated,
      observed: observedPeaks.length,
      hits: hits.length,
      falseAlarms,
      share,
      heightErrorPercent,
      delayDays,
    },
  };
}
