import { correlation } from '../fit/correlation.ts';
import { computed, defined, isDefined, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { seasonPhase } from './season-phase.ts';

export interface SeasonLag {
  /** Whole months by which the simulated season is late; negative = early. */
  readonly months: number;
  readonly correlationAtLag: number;
  readonly correlationAtZero: number;
  /** By lag, -5 to 6. */
  readonly correlations: ReadonlyMap<number, number>;
  /** Lag of the first harmonic, in months and parts of them, -6 to 6. */
  readonly phaseMonths: Statistic;
}

/**
 * By how many months the simulated season lags the observed one.
 *
 * Formula: the k in -5..6 of the largest correlation between O_m and S_m+k (months turning round the year); of equal ones
 * the smaller |k|, then the positive; besides, the difference of the phases of the first harmonics
 * Inputs: twelve pairs, January first, as `climatology` gives them; any units.
 * Range: -5 to 6 months; best 0; 6 late and 6 early are the same.
 * Read: positive = simulated too late. Six months often is a calendar of the other hemisphere.
 * Undefined: other than twelve pairs; either climatology flat. The phase also for two seasons a year.
 * Source: our choice of method; no published limit is known.
 * Example: seasonLag(pairInOrder({observed: [0.6, 0.7, 1.1, 2, 3.4, 4.6, 5, 4.3, 2.9, 1.7, 0.9, 0.6], simulated: [0.9, 0.6, 0.6, 0.7, 1.2, 2.1, 3.3, 4.5, 5.1, 4.2, 2.8, 1.6]})) -> {value: {months: 2, correlationAtLag: 0.9988, correlationAtZero: 0.47, phaseMonths: {value: 1.9552}}}
 */
export function seasonLag(climatology: Paired): Statistic<SeasonLag> {
  const { observed, simulated } = climatology;
  if (observed.length !== 12) return undefinedBecause('a climatology has twelve months');
  const correlations = new Map<number, number>();
  for (let lag = -5; lag <= 6; lag++) {
    const turned = simulated.map((_, month) => simulated[(month + lag + 12) % 12] ?? 0);
    const r = correlation({ ...climatology, simulated: turned });
    if (!isDefined(r)) return r;
    correlations.set(lag, r.value);
  }
  const at = (lag: number) => correlations.get(lag) ?? Number.NaN;
  let months = 0;
  // In order of preference, so that only a truly larger correlation replaces one.
  for (const lag of [1, -1, 2, -2, 3, -3, 4, -4, 5, -5, 6]) if (at(lag) > at(months) + 1e-12) months = lag;
  return defined({
    months,
    correlationAtLag: at(months),
    correlationAtZero: at(0),
    correlations,
    phaseMonths: phaseLag(climatology),
  });
}

function phaseLag({ observed, simulated }: Paired): Statistic {
  const reference = seasonPhase(observed);
  if (!isDefined(reference)) return reference;
  const phase = seasonPhase(simulated);
  if (!isDefined(phase)) return phase;
  const lag = (phase.value - reference.value + 24) % 12;
  return computed(lag > 6 ? lag - 12 : lag);
}
