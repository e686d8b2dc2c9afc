import type { Drift, RunStores, StoreFigures } from '../../facts/store-drift.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../figures.ts';
import { type Draft, type Limits, rule } from '../rule.ts';

/** Above this a trend may be chance; the usual level of tests. */
const significance = 0.05;

export const periodsWarmUpDrift = rule({
  id: 'periods.warm-up-drift',
  scope: 'runs',
  from: 'warn',
  means: null,
  statement:
    'A store still drifts after warm-up: from year to year it changes by more than the limit, and its Sen slope is more than the limit’s share of the rain. From five years on, a Mann-Kendall test must agree; under five it can’t tell.',
  why: 'Water that a store gives up year after year feeds the low flows with a guess made at the start, and the balance lacks it.',
  source: {
    basis: 'published',
    citation:
      'Ajami, H. et al. (2014) Water Resour. Res. 50:2636-2656 (limit of 1 % a year, from memory); Mann, H. B. (1945) Econometrica 13:245-259; Sen, P. K. (1968) J. Am. Stat. Assoc. 63:1379-1389; the share of rainfall is our own choice',
  },
  clear:
    'Begin the simulation earlier, repeat the first years until the stores settle, or start from observed levels. If the climate dries or wets, say so in the run’s note.',
  limits: {
    store_change: {
      default: 1,
      unit: '% a year',
      states: 'largest change of a store from a year to the next',
      looser: 'higher',
    },
    store_slope: {
      default: 1,
      unit: '% of annual rain',
      states: 'largest Sen slope of a store',
      looser: 'higher',
    },
  },
  check: ({ id, name, field }, { stores }, limits) => {
    const found = stores.get(name ?? '');
    if (found === undefined) return [];
    const about = { record: id, field: [...field, 'stores'] };
    if (!isDefined(found.stores))
      return [
        {
          ...about,
          subject: 'unread',
          message: `Whether the stores of run ${name} have settled can’t be told: ${found.stores.undefined}.`,
          clear: 'State file, time and columns of the stores so that they can be read.',
        },
      ];
    return found.stores.value.flatMap((store) => {
      const draft = judge(store, found, limits);
      return draft === null ? [] : [{ ...about, ...draft }];
    });
  },
});

function judge(
  { store, isDepth, sameDate, annualMean }: StoreFigures,
  run: RunStores,
  limits: Limits,
): Omit<Draft, 'record'> | null {
  const measures = [
    { what: 'on the same date of each year', drift: sameDate },
    { what: 'in the mean of each year', drift: annualMean },
  ];
  for (const { what, drift } of measures) {
    if (!isDefined(drift) || !isDrifting(drift.value, limits)) continue;
    const { slope, slopePercentOfRainfall: share, trend, years, largestChangePercent: change } = drift.value;
    const falls = slope.slope < 0;
    const sizes = [
      ...(isDefined(share) ? [`${figure(Math.abs(share.value))} % of the annual rain`] : []),
      ...(isDefined(change) ? [`up to ${figure(change.value)} % from a year to the next`] : []),
    ];
    const certain = isDefined(trend);
    const size = `${figure(Math.abs(slope.slope))}${isDepth ? ' mm' : ''}`;
    const { rainTrend } = run;
    const withRain =
      isDefined(rainTrend) && rainTrend.value.p <= significance && rainTrend.value.s < 0 === falls;
    return {
      subject: store,
      found: Number(slope.slope.toPrecision(4)),
      ...(isDepth ? { unit: 'mm a-1' } : {}),
      message: certain
        ? `After warm-up ${store} still ${falls ? 'falls' : 'rises'} by ${size} a year ${what} (${sizes.join(', ')}; Mann-Kendall p = ${figure(trend.value.p)} over ${years} yearly values).`
        : `After warm-up ${store} ${falls ? 'falls' : 'rises'} by ${size} a year ${what} (${sizes.join(', ')}). With ${years} yearly values a test can’t tell drift from weather.`,
      detail: [
        ...(withRain
          ? [`the rain ${falls ? 'falls' : 'rises'} too over these years, so the climate may be the cause`]
          : []),
        ...(isDepth
          ? []
          : ['the unit of the stores is not stated as a depth, so they are not held against the rain']),
      ],
    };
  }
  return null;
}

function isDrifting(
  { slope, slopePercentOfRainfall: share, trend, largestChangePercent: change }: Drift,
  limits: Limits,
): boolean {
  const changes = !isDefined(change) || change.value >= (limits.store_change ?? 0);
  const matters = isDefined(share) ? Math.abs(share.value) > (limits.store_slope ?? 0) : slope.slope !== 0;
  const isTrend = !isDefined(trend) || trend.value.p <= significance;
  return changes && matters && isTrend;
}
