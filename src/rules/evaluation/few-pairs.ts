import { scoredWindows } from '../../facts/scores/stated.ts';
import { figure } from '../figures.ts';
import { rule } from '../rule.ts';
import { recomputedOver } from './over.ts';

export const evaluationFewPairs = rule({
  id: 'evaluation.few-pairs',
  scope: 'evaluation',
  from: 'warn',
  means: null,
  statement:
    'A window has too few pairs of observed and simulated values, or too small a share of its steps is paired.',
  why: 'One flood decides the score of a handful of pairs; and where gaps are long, the score is that of the days on which the gauge happened to work.',
  source: { basis: 'house', citation: 'Our own limits; no published ones were found.' },
  clear: 'Say in the review what the gaps leave out, or move the window to where there are observations.',
  limits: {
    fewest_pairs: { default: 24, unit: 'pairs', states: 'fewest pairs in a window', looser: 'lower' },
    paired_share: {
      default: 0.8,
      unit: '1',
      states: 'least share of a window’s steps that are paired',
      looser: 'lower',
    },
  },
  check: ({ id, name, field }, { scores }, limits) =>
    scoredWindows.flatMap((window) => {
      const over = recomputedOver(scores.get(name ?? ''), window);
      if (over === null) return [];
      const { pairs, windowSteps, dropped } = over;
      const share = windowSteps === 0 ? 0 : pairs / windowSteps;
      const few = pairs < (limits.fewest_pairs ?? 0);
      if (!few && share >= (limits.paired_share ?? 0)) return [];
      return {
        record: id,
        field: [...field, 'scores', window],
        subject: window,
        found: few ? pairs : Number(share.toFixed(3)),
        ...(few ? { unit: 'pairs' } : {}),
        message: `Over ${window} ${name} is scored on ${figure(pairs)} of ${figure(windowSteps)} steps: ${figure(dropped.missingObserved)} lack the observation, ${figure(dropped.missingSimulated)} the simulation, ${figure(dropped.missingBoth)} both.`,
      };
    }),
});
