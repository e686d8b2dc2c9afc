import type { Scores } from '../../manifest/data.generated.ts';

/** What a statistic is most telling of: the size of errors, bias, or agreement in time. KGE and its parts are all three. */
export const scoreKinds: Readonly<Record<keyof Scores, readonly ('error' | 'bias' | 'correlation')[]>> = {
  nse: ['error'],
  log_nse: ['error'],
  rsr: ['error'],
  rmse: ['error'],
  mae: ['error'],
  d: ['error'],
  pbias: ['bias'],
  beta: ['bias'],
  fhv: ['bias'],
  fms: ['bias'],
  flv: ['bias'],
  r: ['correlation'],
  r2: ['correlation'],
  gradient: [],
  intercept: [],
  alpha: [],
  gamma: [],
  peaks_hit: [],
  kge: ['correlation'],
  kge_2012: ['correlation'],
};
