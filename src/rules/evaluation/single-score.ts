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
  check: ({ id, name, field }, { scores }) => {
    const stated = scores.get(name ?? '')?.stated ?? [];
    const lacking = scoredWindows.flatMap((window) => {
      const here = stated.flatMap((score) => (score.window === window ? score.score : []));
      const told = new Set<string>(here.flatMap((score) => scoreKinds[score]));
      const untold = Object.entries(kinds).flatMap(([kind, words]) => (told.has(kind) ? [] : words));
      return here.length === 0 || untold.length === 0
        ? []
        : [{ window, here, untold: untold.join(', nor of ') }];
    });
    const [first] = lacking;
    if (first === undefined) return [];
    const sentences = [...new Set(lacking.map(({ untold }) => untold))].map((untold) => {
      const alike = lacking.filter((one) => one.untold === untold);
      const names = new Set(alike.flatMap(({ here }) => here.map((score) => scoreNames[score])));
      return `The ${alike.map(({ window }) => window).join(' and ')} scores of ${name} (${[...names].join(', ')}) say nothing of ${untold}.`;
    });
    return [{ record: id, field: [...field, 'scores', first.window], message: sentences.join(' ') }];
  },
});
