import type { Scores } from '../../manifest/data.generated.ts';
import { rule } from '../rule.ts';
import { moriasi2007 } from '../sources.ts';
import { scoreKinds } from './score-kinds.ts';

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
  check: ({ id, name, fragment }) =>
    (['calibration', 'validation'] as const).flatMap((window) => {
      const scores = Object.keys(fragment.scores?.[window] ?? {}) as (keyof Scores)[];
      const told = new Set(scores.flatMap((score) => scoreKinds[score]));
      const untold = (Object.keys(kinds) as (keyof typeof kinds)[]).filter((kind) => !told.has(kind));
      if (scores.length === 0 || untold.length === 0) return [];
      return [
        {
          record: id,
          field: ['evaluation', name ?? '', 'scores', window],
          subject: window,
          message: `The ${window} scores of ${name} (${scores.join(', ')}) say nothing of ${untold.map((kind) => kinds[kind]).join(', nor of ')}.`,
        },
      ];
    }),
});
