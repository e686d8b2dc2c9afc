import type { Scores } from '../../manifest/data.generated.ts';

/** What a statistic is most telling of: the size of errors, bias, or agreement in time. KGE holds all three in one number and so tells none apart; it counts for agreement. Parts of the flow-duration curve, of a regression or of KGE tell too little of any. */
export const scoreKinds: Readonly<Record<keyof Scores, readonly ('error' | 'bias' | 'correlation')[]>> = {
  nse: ['error'],
  log_nse: ['error'],
  rsr: ['error'],
  rmse: ['error'],
  mae: ['error'],
  d: ['error'],
  pbias: ['bias'],
  beta: ['bias'],
  fhv: [],
  fms: [],
  flv: [],
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
