import type { Facts } from '../../facts/facts.ts';
import { nodesIn } from '../../facts/nodes-in.ts';
import type { StatedName } from '../../facts/scores/stated.ts';
import { rule } from '../rule.ts';

/** The regimes that ask for scores of their own, and the scores that answer. */
const asked = {
  low: {
    by: ['log_nse', 'flv'],
    words: 'log-NSE (`log_nse`) or the bias of the low flows (`flv`)',
    because: 'NSE and KGE are decided by the largest flows',
  },
  high: {
    by: ['peaks_hit'],
    words: 'the share of peaks hit (`peaks_hit`, with `peaks` saying what counts as one)',
    because: 'a good NSE can go with every peak missed by a day',
  },
} as const satisfies Readonly<Record<string, { by: readonly StatedName[]; words: string; because: string }>>;

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
    const regimes = new Set(
      (facts.manifest.data.study?.needs ?? [])
        .filter(({ variable = 'streamflow' }) => variable === 'streamflow')
        .flatMap(({ regime }) => (regime === 'low' || regime === 'high' ? [regime] : [])),
    );
    const targets = nodesIn(facts.records.nodes, 'evaluation').filter(
      ({ fragment }) => fragment.variable === 'streamflow' && fragment.none_because === undefined,
    );
    return [...regimes].flatMap((regime) => {
      const { by, words, because } = asked[regime];
      const [first] = targets;
      if (first === undefined || targets.some(({ name }) => isScored(name ?? '', by, facts))) return [];
      return {
        record: first.id,
        field: [...first.field, 'scores'],
        subject: regime,
        message: `The purpose needs ${regime} flows, but no score of ${first.name} tells of them, and ${because}. What tells is ${words}.`,
      };
    });
  },
});

/** Whether each window that has scores has one of these. */
function isScored(target: string, by: readonly StatedName[], { scores }: Facts): boolean {
  const stated = scores.get(target)?.stated ?? [];
  const windows = new Set(stated.map(({ window }) => window));
  return [...windows].every((window) =>
    stated.some((score) => score.window === window && by.includes(score.score)),
  );
}
