import type { StatedName } from '../../facts/scores/stated.ts';
import type { PrintedNumber } from '../../hydrology/stated/printed-number.ts';

/** How scores are called in messages. */
export const scoreNames: Readonly<Record<StatedName, string>> = {
  nse: 'NSE',
  log_nse: 'log-NSE',
  rsr: 'RSR',
  pbias: 'PBIAS',
  r: 'r',
  r2: 'R2',
  gradient: 'gradient',
  intercept: 'intercept',
  rmse: 'RMSE',
  mae: 'MAE',
  kge: 'KGE',
  kge_2012: 'KGE of 2012',
  alpha: 'alpha',
  beta: 'beta',
  gamma: 'gamma',
  d: 'd',
  fhv: 'bias of the high flows (FHV)',
  fms: 'bias of the middle slope (FMS)',
  flv: 'bias of the low flows (FLV)',
  peaks_hit: 'share of peaks hit',
};

const percent: ReadonlySet<StatedName> = new Set(['pbias', 'fhv', 'fms', 'flv']);
const asTheSeries: ReadonlySet<StatedName> = new Set(['rmse', 'mae', 'intercept']);

/** The unit of a score over series in `unit`; null for a plain number. */
export function unitOf(score: StatedName, unit: string): string | null {
  if (percent.has(score)) return '%';
  return asTheSeries.has(score) && unit !== '1' ? unit : null;
}

/** A number as it was written. */
export function asPrinted({ value, decimals }: PrintedNumber): string {
  return value.toFixed(Math.min(100, Math.max(0, decimals)));
}
