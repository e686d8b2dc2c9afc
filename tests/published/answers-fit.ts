import { quantile } from '../../src/hydrology/distribution/quantile.ts';
import { agreementIndex } from '../../src/hydrology/fit/agreement-index.ts';
import { biasRatio } from '../../src/hydrology/fit/bias-ratio.ts';
import { correlation } from '../../src/hydrology/fit/correlation.ts';
import { determination } from '../../src/hydrology/fit/determination.ts';
import { errorDeviationRatio } from '../../src/hydrology/fit/error-deviation-ratio.ts';
import { errorSampleDeviationRatio } from '../../src/hydrology/fit/error-sample-deviation-ratio.ts';
import { klingGupta2009, klingGuptaOfTheMean } from '../../src/hydrology/fit/kling-gupta-2009.ts';
import { klingGupta2012 } from '../../src/hydrology/fit/kling-gupta-2012.ts';
import { klingGuptaSkill } from '../../src/hydrology/fit/kling-gupta-skill.ts';
import { logNashSutcliffe } from '../../src/hydrology/fit/log-nash-sutcliffe.ts';
import { logOffset } from '../../src/hydrology/fit/log-offset.ts';
import { meanAbsoluteError } from '../../src/hydrology/fit/mean-absolute-error.ts';
import { nashSutcliffe } from '../../src/hydrology/fit/nash-sutcliffe.ts';
import { percentBias } from '../../src/hydrology/fit/percent-bias.ts';
import { regression } from '../../src/hydrology/fit/regression.ts';
import { rootMeanSquareError } from '../../src/hydrology/fit/root-mean-square-error.ts';
import { variabilityRatio } from '../../src/hydrology/fit/variability-ratio.ts';
import { highFlowBias } from '../../src/hydrology/flow-duration/high-flow-bias.ts';
import { lowFlowBias } from '../../src/hydrology/flow-duration/low-flow-bias.ts';
import { middleSlopeBias } from '../../src/hydrology/flow-duration/middle-slope-bias.ts';
import type { Paired, Value } from '../../src/hydrology/paired.ts';
import { peakHits } from '../../src/hydrology/peaks/peak-hits.ts';
import { rateScore } from '../../src/hydrology/ratings/rate-score.ts';
import type { RatedStatistic, RatedStep } from '../../src/hydrology/tables/performance-ratings.ts';
import { byMonth, columns, grouped, pairs, plain } from './columns.ts';

interface Pairing {
  readonly csv?: string;
  readonly obs: string | readonly Value[];
  readonly sim: string | readonly Value[];
  readonly window: readonly [string, string];
  readonly rule?: 'strict' | 'wmo_11_5';
}

export const fitAnswers = {
  'gof/mean-flow-benchmark': () => ({ kge_of_the_mean_flow: klingGuptaOfTheMean }),
  'gof/nile-persistence': () => {
    const volume = columns('nile.csv').column('volume');
    const times = volume.slice(1).map((_, index) => index);
    return scores(pairs({ times, observed: volume.slice(1), simulated: volume.slice(0, -1) }));
  },
  'gof/monthly-means': (input: Pairing) => scores(monthlyMeans(input)),
  gof: (input: Pairing) => scores(paired(input)),
  fdc: (input: Pairing) => {
    const both = paired(input);
    const exceeded = (values: Float64Array, share: number) =>
      plain(quantile({ values, probability: 1 - share, type: 6 }));
    const high = plain(highFlowBias(both));
    const low = plain(lowFlowBias(both));
    return {
      n: both.observed.length,
      n_high: high?.steps,
      fhv: high?.percent,
      q20_obs: exceeded(both.observed, 0.2),
      q70_obs: exceeded(both.observed, 0.7),
      q20_sim: exceeded(both.simulated, 0.2),
      q70_sim: exceeded(both.simulated, 0.7),
      fms: plain(middleSlopeBias(both))?.percent,
      n_low: low?.steps,
      epsilon: low?.offset,
      flv: low?.percent,
    };
  },
  peaks: (input: Pairing & { threshold: number; min_distance: number; tolerance_steps: number }) => {
    const found = plain(
      peakHits({
        paired: paired(input),
        threshold: input.threshold,
        minimumDistanceDays: input.min_distance,
        toleranceDays: input.tolerance_steps,
      }),
    );
    if (!found) return null;
    return {
      threshold: input.threshold,
      obs_peaks: found.observedPeaks,
      sim_peaks: found.simulatedPeaks,
      hits: found.hits.map((hit) => [hit.observed, hit.simulated]),
      n_hits: found.hits.length,
      misses: found.misses,
      false_alarms: found.falseAlarms,
      pod: plain(found.detected),
      far: plain(found.falseShare),
      csi: plain(found.success),
      mean_peak_error_pct: plain(found.heightErrorPercent),
      mean_timing_error: plain(found.delayDays),
    };
  },
  ratings: (input: {
    items: {
      table: string;
      statistic: RatedStatistic;
      constituent: string;
      value: number;
      timeStep: RatedStep;
      scale: 'watershed' | 'field' | null;
    }[];
  }) =>
    input.items.map(
      ({ table, statistic, constituent, value, timeStep, scale }) =>
        plain(
          rateScore({
            table: table === 'moriasi-2007-table-4' ? 'moriasi-2007' : table,
            statistic,
            variable: constituent,
            step: timeStep,
            scale: scale ?? 'watershed',
            value,
          }),
        )?.rating ?? null,
    ),
  'published/moriasi-2007-table-5': (input: Record<'NSE' | 'RSR' | 'PBIAS', number[]>) => {
    const rate = (statistic: RatedStatistic) => (value: number) =>
      plain(
        rateScore({
          table: 'moriasi-2007',
          statistic,
          variable: 'streamflow',
          step: 'monthly',
          scale: 'watershed',
          value,
        }),
      )?.rating;
    return {
      NSE: input.NSE.map(rate('NSE')),
      RSR: input.RSR.map(rate('RSR')),
      PBIAS: input.PBIAS.map(rate('PBIAS')),
    };
  },
};

function paired(input: Pairing): Paired {
  if (typeof input.obs !== 'string' || typeof input.sim !== 'string') {
    const [observed, simulated] = [input.obs as readonly Value[], input.sim as readonly Value[]];
    return pairs({ times: observed.map((_, index) => index), observed, simulated });
  }
  const rows = columns(input.csv ?? '').window(input.window);
  return pairs({
    times: rows.times,
    observed: rows.column(input.obs),
    simulated: rows.column(input.sim),
  });
}

/** Means of the present days of months that both sides fill well enough. */
function monthlyMeans(input: Pairing): Paired {
  const rows = columns(input.csv ?? '').window(input.window);
  const side = (name: string) =>
    grouped({ times: rows.times, values: rows.column(name), by: byMonth }).map(({ values }) => {
      const present = values.filter((value) => value !== null);
      if (!enough(values, input.rule ?? 'strict')) return null;
      return present.reduce((sum, value) => sum + value, 0) / present.length;
    });
  const observed = side(String(input.obs));
  const simulated = side(String(input.sim));
  return pairs({ times: observed.map((_, month) => month), observed, simulated });
}

function enough(values: readonly Value[], rule: 'strict' | 'wmo_11_5'): boolean {
  const missing = values.filter((value) => value === null).length;
  let longest = 0;
  let gap = 0;
  for (const value of values) {
    gap = value === null ? gap + 1 : 0;
    longest = Math.max(longest, gap);
  }
  return rule === 'strict' ? missing === 0 : missing < 11 && longest < 5;
}

function scores(both: Paired) {
  const line = plain(regression(both));
  const newer = plain(klingGupta2012(both));
  const older = plain(klingGupta2009(both));
  return {
    n: both.observed.length,
    nse: plain(nashSutcliffe(both)),
    rmse: plain(rootMeanSquareError(both)),
    mae: plain(meanAbsoluteError(both)),
    rsr: plain(errorDeviationRatio(both)),
    rsr_sample_sd: plain(errorSampleDeviationRatio(both)),
    pbias: plain(percentBias(both)),
    r: plain(correlation(both)),
    r2_pearson: plain(determination(both)),
    slope: line?.gradient ?? null,
    intercept: line?.intercept ?? null,
    alpha: plain(variabilityRatio(both)),
    beta: plain(biasRatio(both)),
    gamma: newer?.gamma ?? null,
    kge2009: older?.efficiency ?? null,
    kge2012: newer?.efficiency ?? null,
    kge2009_skill: older ? plain(klingGuptaSkill(older.efficiency)) : null,
    d: plain(agreementIndex(both)),
    epsilon: plain(logOffset(both)),
    log_nse: plain(logNashSutcliffe(both)),
  };
}
