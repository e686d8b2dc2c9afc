import { agreementIndex } from './fit/agreement-index.ts';
import { biasRatio } from './fit/bias-ratio.ts';
import { correlation } from './fit/correlation.ts';
import { determination } from './fit/determination.ts';
import { errorDeviationRatio } from './fit/error-deviation-ratio.ts';
import { klingGupta2009 } from './fit/kling-gupta-2009.ts';
import { klingGupta2012 } from './fit/kling-gupta-2012.ts';
import { logNashSutcliffe } from './fit/log-nash-sutcliffe.ts';
import { meanAbsoluteError } from './fit/mean-absolute-error.ts';
import { nashSutcliffe } from './fit/nash-sutcliffe.ts';
import { percentBias } from './fit/percent-bias.ts';
import { regression } from './fit/regression.ts';
import { rootMeanSquareError } from './fit/root-mean-square-error.ts';
import { variabilityRatio } from './fit/variability-ratio.ts';
import { highFlowBias } from './flow-duration/high-flow-bias.ts';
import { lowFlowBias } from './flow-duration/low-flow-bias.ts';
import { middleSlopeBias } from './flow-duration/middle-slope-bias.ts';
import { defined, isDefined, type Paired, type Statistic } from './paired.ts';

/** The one list of scores that a record can state and that pairs alone decide, by their names in the manifest. Hits of peaks need settings: see `peakHits`. */
export const scores = {
  nse: nashSutcliffe,
  log_nse: logNashSutcliffe,
  rsr: errorDeviationRatio,
  pbias: percentBias,
  r: correlation,
  r2: determination,
  gradient: part(regression, 'gradient'),
  intercept: part(regression, 'intercept'),
  rmse: rootMeanSquareError,
  mae: meanAbsoluteError,
  kge: part(klingGupta2009, 'efficiency'),
  kge_2012: part(klingGupta2012, 'efficiency'),
  alpha: variabilityRatio,
  beta: biasRatio,
  gamma: part(klingGupta2012, 'gamma'),
  d: agreementIndex,
  fhv: part(highFlowBias, 'percent'),
  fms: part(middleSlopeBias, 'percent'),
  flv: part(lowFlowBias, 'percent'),
} satisfies Readonly<Record<string, (paired: Paired) => Statistic>>;

export type ScoreName = keyof typeof scores;

/** One figure of a statistic that has several. */
function part<K extends string>(
  whole: (paired: Paired) => Statistic<{ readonly [key in K]: number }>,
  key: K,
) {
  return (paired: Paired): Statistic => {
    const parts = whole(paired);
    return isDefined(parts) ? defined(parts.value[key]) : parts;
  };
}
