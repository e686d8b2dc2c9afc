import { scoredWindows } from '../../facts/scores/stated.ts';
import { klingGuptaOfTheMean } from '../../hydrology/fit/kling-gupta-2009.ts';
import { figure } from '../figures.ts';
import { rule } from '../rule.ts';
import { scoreOver } from './over.ts';

export const evaluationWorseThanMean = rule({
  id: 'evaluation.worse-than-mean',
  scope: 'evaluation',
  from: 'validation',
  means: null,
  acceptable: true,
  statement: 'NSE is 0 or below, or KGE is 1 - sqrt 2 (-0.41) or below.',
  why: 'The mean of the observations, drawn as a straight line, is as near to them as the model is.',
  source: {
    basis: 'published',
    citation:
      'Nash, J. E. & Sutcliffe, J. V. (1970) J. Hydrol. 10(3):282-290; Knoben, W. J. M., Freer, J. E. & Woods, R. A. (2019) Hydrol. Earth Syst. Sci. 23:4323-4331',
  },
  clear:
    'Look for a shifted day, a wrong unit or a wrong window first; else say under `accepts` why the model serves all the same.',
  check: ({ id, name, field }, { scores }) =>
    scoredWindows.flatMap((window) => {
      const figures = scores.get(name ?? '');
      const nse = scoreOver(figures, window, 'nse');
      const kge = scoreOver(figures, window, 'kge');
      const worse = [
        ...(nse !== null && nse <= 0 ? [`NSE is ${figure(nse)}, and 0 is what the mean reaches`] : []),
        ...(kge !== null && kge <= klingGuptaOfTheMean
          ? [`KGE is ${figure(kge)}, and -0.41 is what the mean reaches`]
          : []),
      ];
      if (worse.length === 0) return [];
      return {
        record: id,
        field: [...field, 'scores', window],
        subject: window,
        message: `Over ${window} the model of ${name} is no better than the mean of the observations: ${worse.join('; ')}.`,
      };
    }),
});
