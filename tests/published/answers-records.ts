import { total } from '../../src/hydrology/arithmetic.ts';
import { kolmogorovSmirnov } from '../../src/hydrology/distribution/kolmogorov-smirnov.ts';
import { quantile } from '../../src/hydrology/distribution/quantile.ts';
import { correlation } from '../../src/hydrology/fit/correlation.ts';
import { annualBias } from '../../src/hydrology/forcing/annual-bias.ts';
import { doubleMass } from '../../src/hydrology/forcing/double-mass.ts';
import { monthlyAnomalyCorrelation } from '../../src/hydrology/forcing/monthly-anomaly-correlation.ts';
import { stuckRuns } from '../../src/hydrology/forcing/stuck-runs.ts';
import { wetDayShare } from '../../src/hydrology/forcing/wet-day-share.ts';
import { isDefined, type Paired, pairInOrder, type Value } from '../../src/hydrology/paired.ts';
import { climatology } from '../../src/hydrology/season/climatology.ts';
import { seasonLag } from '../../src/hydrology/season/season-lag.ts';
import { seasonPhase } from '../../src/hydrology/season/season-phase.ts';
import { kendallTau } from '../../src/hydrology/trend/kendall-tau.ts';
import { lagOneCorrelation } from '../../src/hydrology/trend/lag-one-correlation.ts';
import { mannKendall } from '../../src/hydrology/trend/mann-kendall.ts';
import { type ChangePoint, pettitt } from '../../src/hydrology/trend/pettitt.ts';
import { senSlope } from '../../src/hydrology/trend/sen-slope.ts';
import { linearStoreDays } from '../../src/hydrology/warm-up/linear-store-days.ts';
import { linearStoreError } from '../../src/hydrology/warm-up/linear-store-error.ts';
import { settledYear } from '../../src/hydrology/warm-up/settled-year.ts';
import { yearlyChange } from '../../src/hydrology/warm-up/yearly-change.ts';
import { representativeness } from '../../src/hydrology/windows/representativeness.ts';
import { wetnessClasses } from '../../src/hydrology/windows/wetness-classes.ts';
import { byMonth, byWaterYear, byYear, columns, grouped, numbers, pairs, plain } from './columns.ts';

interface Record {
  readonly csv?: string;
  readonly t?: string | number[];
  readonly x: string | number[];
}

export const recordAnswers = {
  quantile: (input: { x: number[]; p: number[] }) =>
    input.p.map((probability) => plain(quantile({ values: input.x, probability, type: 7 }))),
  'trend/nile-lag1': (input: Record) => ({ lag1: plain(lagOneCorrelation(record(input).values)) }),
  trend: (input: Record) => trend(record(input)),
  pettitt: (input: Record) => change(record(input)),
  'ks/nile-two-windows': (input: { windows: [number, number][] }) => {
    const { times, values } = nile();
    const [sample = [], other = []] = input.windows.map(([first, last]) =>
      values.filter((_, index) => (times[index] ?? 0) >= first && (times[index] ?? 0) <= last),
    );
    return gap({ sample, other });
  },
  ks: (input: { a: number[]; b: number[] }) => gap({ sample: input.a, other: input.b }),
  window: (input: { window: [number, number] }) => {
    const { times, values } = nile();
    const [first, last] = input.window;
    const window = plain(representativeness({ years: times, totals: values, first, last }));
    const classes = plain(wetnessClasses({ years: times, totals: values }));
    if (!window || !classes) return null;
    return {
      n: window.years,
      mean: window.mean,
      ratio_to_long_mean: window.meanRatio,
      z_of_mean: window.meanDeviations,
      rank_fraction_of_moving_means: window.meanRank,
      years_above_long_mean: window.yearsAboveMean,
      range_coverage: window.rangeShare,
      terciles: [classes.lowerTercile, classes.upperTercile],
      dry_normal_wet_years: [window.dryYears, window.averageYears, window.wetYears],
      ks_vs_long: window.distance,
    };
  },
  'warmup/percent-change': (input: { annual_mean_storage_mm: number[] }) => {
    const storage = input.annual_mean_storage_mm;
    const below = (limitPercent: number) => plain(settledYear({ storage, limitPercent }));
    return {
      percent_change: yearlyChange(storage).map(plain),
      first_year_below: { '1': below(1), '0.1': below(0.1), '0.01': below(0.01) },
    };
  },
  'warmup/annual-storage-trend': () => {
    const rows = columns('rr-daily.csv');
    const years = grouped({ times: rows.times, values: rows.column('storage_mm'), by: byWaterYear });
    const means = years.map(({ values }) => total(numbers(values)) / values.length);
    const labels = years.map(({ group }) => group);
    return {
      mean_by_water_year: means,
      percent_change: yearlyChange(means).map(plain),
      mk_all: trend({ times: labels.map((_, index) => index), values: means }),
      drift_mm_per_year_cal_val: plain(senSlope({ times: labels.slice(1), values: means.slice(1) }))?.slope,
    };
  },
  'warmup/linear-store': (input: { k_days: number; initial_error_mm: number; limit: number }) => ({
    days_until_below_limit: plain(
      linearStoreDays({ storeConstantDays: input.k_days, remainingShare: input.limit }),
    ),
    error_after_365_days: plain(
      linearStoreError({ storeConstantDays: input.k_days, initialError: input.initial_error_mm, days: 365 }),
    ),
  }),
  'forcing/gauge-vs-product': () => {
    const rows = columns('seattle-weather.csv');
    const gauge = numbers(rows.column('precipitation'));
    const product = gauge.map((_, index) => (gauge[(index + 365) % gauge.length] ?? 0) * 0.8);
    const totals = (by: (date: Date) => number) =>
      totalsOf({ times: rows.times, observed: gauge, simulated: product, by });
    const season = climatology(totals(byMonth));
    const years = totals(byYear);
    const { totalPercent, yearsPercent } = annualBias(years);
    return {
      daily_r: plain(correlation(pairInOrder({ observed: gauge, simulated: product }))),
      monthly_r: plain(correlation(totals(byMonth))),
      climatology_r: isDefined(season) ? plain(correlation(season.value)) : null,
      monthly_anomaly_r: plain(monthlyAnomalyCorrelation(totals(byMonth))),
      annual_r: plain(correlation(years)),
      annual_bias_pct: yearsPercent.map(plain),
      total_bias_pct: plain(totalPercent),
      wet_day_frequency: [gauge, product].map((rainMm) => plain(wetDayShare({ rainMm, thresholdMm: 1 }))),
    };
  },
  'forcing/double-mass': () => {
    const rows = columns('double-mass.csv');
    const [pattern, station] = [numbers(rows.column('pattern_mm')), numbers(rows.column('station_mm'))];
    const curve = plain(doubleMass({ years: rows.times, pattern, station }));
    if (!curve) return null;
    return {
      cum_x_last: curve.patternTotal,
      cum_y_last: curve.stationTotal,
      slope_before: curve.slopeBefore,
      slope_after: curve.slopeAfter,
      slope_ratio_after_over_before: curve.adjustment,
      factor_to_adjust_earlier_to_later: curve.adjustment,
      pettitt_on_ratio: { n: pattern.length, ...changeKeys(curve.change) },
      anova_F: plain(curve.difference)?.f,
      anova_p: plain(curve.difference)?.p,
    };
  },
  'forcing/stuck': (input: { x: Value[]; min_run: number }) =>
    stuckRuns({ values: input.x, minimumLength: input.min_run, of: 'non-zero' }).map((run) => [
      run.first,
      run.last,
      run.length,
      run.value,
    ]),
  'seasonality/temperature-vs-precipitation': () => {
    const rows = columns('seattle-weather.csv');
    const [warm, wet] = [rows.column('temp_max'), numbers(rows.column('precipitation'))];
    // Temperature: mean of all days of a calendar month; rainfall: mean of the months' totals.
    const days = climatology(pairs({ times: rows.times, observed: warm, simulated: wet }));
    const months = climatology(totalsOf({ times: rows.times, observed: wet, simulated: wet, by: byMonth }));
    if (!isDefined(days) || !isDefined(months)) return null;
    return season({ ...months.value, observed: days.value.observed });
  },
  seasonality: (input: { obs: number[]; sim: number[] }) =>
    season(pairInOrder({ observed: input.obs, simulated: input.sim })),
};

function nile() {
  const rows = columns('nile.csv');
  return { times: rows.times, values: numbers(rows.column('volume')) };
}

function record(input: Record) {
  if (input.csv) return nile();
  const values = input.x as number[];
  return { times: Array.isArray(input.t) ? input.t : values.map((_, index) => index + 1), values };
}

function trend(of: { times: readonly number[]; values: readonly number[] }) {
  const test = plain(mannKendall(of.values));
  const slope = plain(senSlope(of));
  return {
    n: test?.n,
    S: test?.s,
    varS: test?.variance,
    Z: test?.z,
    p: test?.p,
    tau_b: plain(kendallTau(of)),
    sen_slope: slope?.slope,
    sen_intercept: slope?.intercept,
    sen_low95: slope?.lower95,
    sen_high95: slope?.upper95,
  };
}

function change(of: { times: readonly number[]; values: readonly number[] }) {
  const found = plain(pettitt(of));
  return found && { n: of.values.length, ...changeKeys(found) };
}

function changeKeys(found: ChangePoint) {
  return {
    K: found.k,
    tau: found.before,
    last_of_first_segment: found.lastBefore,
    first_of_second_segment: found.firstAfter,
    U_tau: found.u,
    p: found.p,
  };
}

function gap(of: { sample: readonly number[]; other: readonly number[] }) {
  const found = plain(kolmogorovSmirnov(of));
  if (!found) return null;
  return {
    n: of.sample.length,
    m: of.other.length,
    D: found.distance,
    p_limit: found.pLimit,
    p_exact: plain(found.pExact),
  };
}

function totalsOf(of: {
  times: readonly number[];
  observed: readonly number[];
  simulated: readonly number[];
  by: (date: Date) => number;
}): Paired {
  const side = (values: readonly number[]) => grouped({ times: of.times, values, by: of.by });
  const groups = side(of.observed);
  const sums = (values: readonly number[]) => side(values).map((group) => total(numbers(group.values)));
  return pairs({
    times: groups.map(({ times }) => times[0] ?? 0),
    observed: sums(of.observed),
    simulated: sums(of.simulated),
  });
}

function season(twelve: Paired) {
  const lag = plain(seasonLag(twelve));
  if (!lag) return null;
  return {
    lag_months: lag.months,
    r_at_lag: lag.correlationAtLag,
    r_at_zero: lag.correlationAtZero,
    r_by_lag: Object.fromEntries(lag.correlations),
    phase_obs_month: plain(seasonPhase(twelve.observed)),
    phase_sim_month: plain(seasonPhase(twelve.simulated)),
    phase_lag_months: plain(lag.phaseMonths),
  };
}
