import {
  flowTargets,
  isScored,
  type Regime,
  scoresOfTarget,
  unscoredRegimes,
} from '../../facts/scores/needs.ts';
import { scoredWindows } from '../../facts/scores/stated.ts';
import { rule } from '../rule.ts';

/** What tells of a regime, and why other scores do not. */
const told: Readonly<Record<Regime, { readonly words: string; readonly because: string }>> = {
  low: {
    words: 'log-NSE (`log_nse`) or the bias of the low flows (`flv`)',
    because: 'NSE and KGE are decided by the largest flows',
  },
  high: {
    words: 'the share of peaks hit (`peaks_hit`, with `peaks` saying what counts as one)',
    because: 'a good NSE can go with every peak missed by a day',
  },
};

export const evaluationNeedUnscored = rule({
  id: 'evaluation.need-unscored',
  scope: 'manifest',
  from: 'validation',
  means: 'incomplete',
  statement:
    'The purpose needs low flows, and no low-flow score is stated; or it needs high flows, and no peaks are scored.',
  why: 'A score that the largest flows decide says nothing of a dry summer, and one over all days little of a flood.',
  source: {
    basis: 'practice',
    citation: 'Common practice: a model is scored in the regime that it is used for.',
  },
  clear: 'Add the score to each window of the target; `stoplog seal --figures` computes it.',
  check: (_, facts) => {
    const first = flowTargets(facts).find((target) => scoresOfTarget(target, facts).length > 0);
    if (first === undefined) return [];
    const stated = scoresOfTarget(first, facts);
    const unscored = (regime: Regime) =>
      scoredWindows.filter(
        (window) => stated.some((one) => one.window === window) && !isScored(regime, window, stated),
      );
    return unscoredRegimes(facts).map((regime) => ({
      record: first.id,
      field: [...first.field, 'scores'],
      subject: regime,
      message: `The purpose needs ${regime} flows, but no ${unscored(regime).join(' or ')} score of ${first.name} tells of them, and ${told[regime].because}. What tells is ${told[regime].words}.`,
    }));
  },
});
