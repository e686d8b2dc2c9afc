import { scoredWindows } from '../../facts/scores/stated.ts';
import { rule } from '../rule.ts';
import { moriasi2007 } from '../sources.ts';
import { scoreKinds } from './score-kinds.ts';
import { scoreNames } from './score-names.ts';

const kinds = {
  error: 'the size of errors (such as NSE or RMSE)',
  bias: 'bias (such as PBIAS)',
  correlation: 'agreement in time (such as r2 or KGE)',
} as const;

export const evaluationSingleScore = rule({
  id: 'evaluation.single-score',
  scope: 'evaluation',
  from: 'calibration',
  means: 'incomplete',
  statement: 'The scores of a window are not of all three kinds: error, bias, correlation.',
  why: 'One statistic hides what another shows: a simulation that is always a third too low can have an r2 of 1.',
  source: moriasi2007,
  clear: 'State at least one score of each kind, such as nse, pbias and r2.',
  check: ({ id, name, field }, { scores }) =>
    scoredWindows.flatMap((window) => {
      const stated = (scores.get(name ?? '')?.stated ?? [])
        .filter((score) => score.window === window)
        .map(({ score }) => score);
      const told = new Set(stated.flatMap((score) => scoreKinds[score]));
      const untold = (Object.keys(kinds) as (keyof typeof kinds)[]).filter((kind) => !told.has(kind));
      if (stated.length === 0 || untold.length === 0) return [];
      return [
        {
          record: id,
          field: [...field, 'scores', window],
          subject: window,
          message: `The ${window} scores of ${name} (${stated.map((score) => scoreNames[score]).join(', ')}) say nothing of ${untold.map((kind) => kinds[kind]).join(', nor of ')}.`,
        },
      ];
    }),
});
