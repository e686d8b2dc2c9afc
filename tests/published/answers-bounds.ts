import { mean, sampleDeviation, total } from '../../src/hydrology/arithmetic.ts';
import { budykoCurve } from '../../src/hydrology/balance/budyko-curve.ts';
import { evaporationLimit } from '../../src/hydrology/balance/evaporation-limit.ts';
import { fuCurve } from '../../src/hydrology/balance/fu-curve.ts';
import { fuParameter } from '../../src/hydrology/balance/fu-parameter.ts';
import { waterBalance } from '../../src/hydrology/balance/water-balance.ts';
import { waterRatios } from '../../src/hydrology/balance/water-ratios.ts';
import { chiSquareLimit } from '../../src/hydrology/distribution/chi-square-limit.ts';
import { kolmogorovSmirnov } from '../../src/hydrology/distribution/kolmogorov-smirnov.ts';
import { moments } from '../../src/hydrology/moments.ts';
import { pairInOrder, type Value } from '../../src/hydrology/paired.ts';
import { boundPosition } from '../../src/hydrology/parameters/bound-position.ts';
import { compositeCurveNumber } from '../../src/hydrology/parameters/composite-curve-number.ts';
import { conductivityUnits } from '../../src/hydrology/parameters/conductivity-units.ts';
import { curveNumberRunoff } from '../../src/hydrology/parameters/curve-number-runoff.ts';
import { manningVelocity } from '../../src/hydrology/parameters/manning-velocity.ts';
import { informationCriteria } from '../../src/hydrology/parsimony/information-criteria.ts';
import { hullDistance } from '../../src/hydrology/scenarios/hull-distance.ts';
import { leverageLimit } from '../../src/hydrology/scenarios/leverage-limit.ts';
import { lineInfluence } from '../../src/hydrology/scenarios/line-influence.ts';
import { mahalanobis } from '../../src/hydrology/scenarios/mahalanobis.ts';
import { meanAnnualChange } from '../../src/hydrology/scenarios/mean-annual-change.ts';
import { percentileEnvelope } from '../../src/hydrology/scenarios/percentile-envelope.ts';
import { rangeExceedance } from '../../src/hydrology/scenarios/range-exceedance.ts';
import { bandInOrder } from '../../src/hydrology/uncertainty/band.ts';
import { coverage } from '../../src/hydrology/uncertainty/coverage.ts';
import { crossedSteps } from '../../src/hydrology/uncertainty/crossed-steps.ts';
import { intervalScore } from '../../src/hydrology/uncertainty/interval-score.ts';
import { meanWidth } from '../../src/hydrology/uncertainty/mean-width.ts';
import { relativeWidth } from '../../src/hydrology/uncertainty/relative-width.ts';
import { columns, numbers, plain } from './columns.ts';

type Window = readonly [string, string];
type Side = string | readonly Value[];

export const boundAnswers = {
  band: (input: { csv?: string; obs: Side; lo: Side; hi: Side; window: Window; alpha: number }) => {
    const rows = input.csv ? columns(input.csv).window(input.window) : null;
    const side = (of: Side) => (typeof of === 'string' ? (rows?.column(of) ?? []) : of);
    const band = bandInOrder({ observed: side(input.obs), lower: side(input.lo), upper: side(input.hi) });
    const n = band.observed.length;
    const share = plain(coverage(band)) ?? Number.NaN;
    const width = plain(meanWidth(band)) ?? Number.NaN;
    return {
      n,
      inside: Math.round(share * n),
      p_factor: share,
      mean_width: width,
      r_factor: plain(relativeWidth(band)),
      // The variant with n in place of n - 1, by its definition.
      r_factor_population_sd: width / (sampleDeviation(band.observed) * Math.sqrt((n - 1) / n)),
      alpha: input.alpha,
      mean_interval_score: plain(intervalScore({ band, level: 1 - input.alpha })),
      crossed: crossedSteps(band).length,
    };
  },
  balance: (input: { csv: string; window: Window; storage_before_first_row_mm: number }) => {
    const whole = columns(input.csv);
    const rows = whole.window(input.window);
    const sum = (name: string) => total(numbers(rows.column(name)));
    const stored = numbers(whole.column('storage_mm'));
    const before = stored[whole.times.indexOf(rows.times[0] ?? 0) - 1] ?? input.storage_before_first_row_mm;
    const after = numbers(rows.column('storage_mm')).at(-1) ?? Number.NaN;
    const [rain, evaporation, runoff] = [sum('rain_mm'), sum('et_mm'), sum('q_mm')];
    const balance = (outflowsMm: number[]) =>
      waterBalance({ inflowsMm: [rain], outflowsMm, storageBeforeMm: before, storageAfterMm: after });
    const closed = balance([evaporation, runoff]);
    const ratios = waterRatios({
      rainfallMm: rain,
      runoffMm: runoff,
      evapotranspirationMm: evaporation,
      potentialMm: sum('pet_mm'),
    });
    const aridity = plain(ratios.aridity) ?? Number.NaN;
    const evaporativeIndex = plain(ratios.evaporativeIndex) ?? Number.NaN;
    return {
      P: rain,
      ET: evaporation,
      Q: runoff,
      PET: sum('pet_mm'),
      dS: closed.storageChangeMm,
      residual: closed.residualMm,
      residual_pct_of_P: 100 * (plain(closed.residualShare) ?? Number.NaN),
      runoff_ratio: plain(ratios.runoffRatio),
      et_ratio: evaporativeIndex,
      aridity,
      budyko: plain(budykoCurve(aridity)),
      fu_omega: plain(fuParameter({ aridity, evaporativeIndex })),
      within_energy_limit: evaporativeIndex <= aridity,
      within_water_limit: evaporativeIndex <= 1,
      residual_with_leak: balance([evaporation, runoff, sum('leak_mm')]).residualMm,
    };
  },
  'budyko/fu-curve': (input: { aridity: number[]; omega: number[] }) => ({
    fu: Object.fromEntries(
      input.omega.map((omega) => [
        omega.toFixed(1),
        input.aridity.map((aridity) => plain(fuCurve({ aridity, omega }))),
      ]),
    ),
    budyko1974: input.aridity.map((aridity) => plain(budykoCurve(aridity))),
    limit: input.aridity.map((aridity) => plain(evaporationLimit(aridity))),
  }),
  'budyko/omega-inverse': (input: { points: [number, number][] }) =>
    input.points.map(([aridity, evaporativeIndex]) => plain(fuParameter({ aridity, evaporativeIndex }))),
  domain: (input: { X: number[][]; points: number[][] }) => {
    const sample = input.X;
    const limits = plain(leverageLimit(sample));
    const ranges = (sample[0] ?? []).map((_, driver) => {
      const values = sample.map((row) => row[driver] ?? Number.NaN);
      return { lowest: Math.min(...values), highest: Math.max(...values) };
    });
    const drivers = ranges.map((_, driver) => sample.map((row) => row[driver] ?? Number.NaN));
    const covariance = (observed: number[], simulated: number[]) =>
      moments(pairInOrder({ observed, simulated })).products / (sample.length - 1);
    return {
      n: sample.length,
      k: ranges.length,
      mean: drivers.map(mean),
      cov: drivers.map((one) => drivers.map((other) => covariance(one, other))),
      chi2_quantile_0975: chiSquareLimit({ exceeded: 0.025, degrees: ranges.length }),
      chi2_quantile_099: chiSquareLimit({ exceeded: 0.01, degrees: ranges.length }),
      leverage_warning_3p_over_n: limits?.warning,
      leverage_max_training: limits?.largest,
      points: input.points.map((point) => {
        const joint = plain(mahalanobis({ sample, point }));
        const exceedance = ranges.map((range, driver) =>
          plain(rangeExceedance({ value: point[driver] ?? Number.NaN, ...range })),
        );
        return {
          point,
          mahalanobis: joint?.distance,
          d2: joint?.squared,
          p_chi2: joint?.p,
          leverage: joint?.leverage,
          inside_ranges: exceedance.map((share) => share === 0),
          inside_hull: plain(hullDistance({ sample, point })) === 0,
          exceedance,
        };
      }),
    };
  },
  'domain/daily-percentile-envelope': (input: {
    csv: string;
    column: string;
    calibration: Window;
    scenario: { window: Window; multiply: number };
  }) => {
    const driver = (window: Window) => numbers(columns(input.csv).window(window).column(input.column));
    const calibration = driver(input.calibration);
    const scenario = driver(input.scenario.window).map((value) => value * input.scenario.multiply);
    const envelope = plain(percentileEnvelope({ calibration, scenario }));
    return {
      cal_p01: envelope?.low,
      cal_p99: envelope?.high,
      cal_max: envelope?.highest,
      days_above_p99: envelope?.stepsAboveHigh,
      share_above_p99: envelope?.shareAboveHigh,
      days_above_max: envelope?.stepsAboveHighest,
      ks_D: plain(kolmogorovSmirnov({ sample: calibration, other: scenario }))?.distance,
    };
  },
  'domain/mean-annual-change': (input: {
    csv: string;
    column: string;
    calibration: Window;
    scenario_mean_annual: number[];
  }) => {
    const days = numbers(columns(input.csv).window(input.calibration).column(input.column));
    const calibration = (total(days) / days.length) * 365.25;
    const changes = input.scenario_mean_annual.map((scenario) =>
      plain(meanAnnualChange({ calibration, scenario })),
    );
    return {
      calibration_mean_annual: calibration,
      change_pct: changes.map((change) => change?.percent),
      within_minus15_plus20: changes.map((change) => change?.within),
    };
  },
  'domain/leverage-cook': (input: { x: number[]; y: number[] }) => {
    const influence = plain(lineInfluence(input)) ?? [];
    return {
      hat: influence.map((point) => point.leverage),
      cooks_d: influence.map((point) => point.cooksDistance),
      internally_studentized: influence.map((point) => point.studentizedError),
      // A line through one variable: the same warning leverage, 3 p / n.
      h_star: plain(leverageLimit(input.x.map((value) => [value])))?.warning,
    };
  },
  'parameters/at-bound': (input: {
    tolerance: number;
    items: { name: string; value: number; lower: number; upper: number }[];
  }) =>
    input.items.map(({ name, ...item }) => ({
      name,
      ...plain(boundPosition({ ...item, tolerance: input.tolerance, logarithmic: false })),
    })),
  'parameters/curve-number-runoff': (input: { cn_P_mm: [number, number][] }) =>
    input.cn_P_mm.map(([curveNumber, rainfallMm]) => {
      const storm = plain(curveNumberRunoff({ curveNumber, rainfallMm }));
      return { S: storm?.retentionMm, Ia: storm?.abstractionMm, Q: storm?.runoffMm };
    }),
  'parameters/composite-cn': (input: { pervious_cn_impervious_pct: [number, number][] }) =>
    input.pervious_cn_impervious_pct.map(([pervious, sealedPercent]) =>
      plain(compositeCurveNumber({ pervious, sealedPercent })),
    ),
  'parameters/manning-velocity': (input: { Rh_m: number; slope: number; n: number }) =>
    plain(manningVelocity({ hydraulicRadiusM: input.Rh_m, slope: input.slope, roughness: input.n })),
  'parameters/ksat-units': (input: { cm_per_day: number }) => {
    const units = plain(conductivityUnits(input.cm_per_day));
    return { mm_per_h: units?.mmPerHour, m_per_s: units?.metresPerSecond };
  },
  parsimony: (input: { n_k_sse: [number, number, number][] }) =>
    input.n_k_sse.map(([values, parameters, squaredErrors]) => {
      const criteria = plain(informationCriteria({ values, parameters, squaredErrors }));
      return { aic: criteria?.aic, aicc: criteria && plain(criteria.aicSmallSample), bic: criteria?.bic };
    }),
};
