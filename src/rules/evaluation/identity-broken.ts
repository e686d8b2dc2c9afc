import type { StatedScore } from '../../facts/scores/stated.ts';
import { scoredWindows } from '../../facts/scores/stated.ts';
import { brokenIdentities, type Identity } from '../../hydrology/stated/broken-identities.ts';
import { rule } from '../rule.ts';
import { asPrinted, scoreNames } from './score-names.ts';

export const evaluationIdentityBroken = rule({
  id: 'evaluation.identity-broken',
  scope: 'evaluation',
  from: 'calibration',
  means: 'contradicted',
  statement: 'Scores that are stated for one window can’t all be true, whatever the data are.',
  why: 'RSR follows from NSE, PBIAS from the ratio of means, and NSE never exceeds r2. Where they part, two runs or windows are mixed, or a statistic stands under another’s name.',
  source: {
    basis: 'published',
    citation:
      'Algebra on Moriasi, D. N. et al. (2007) Trans. ASABE 50(3):885-900, eqs. 1-3, and on Gupta, H. V. et al. (2009) J. Hydrol. 377:80-91',
  },
  clear:
    'Compute the scores of the window anew, all from the same pairs; `stoplog seal --all --figures` writes them.',
  check: ({ id, name }, { scores }) =>
    scoredWindows.flatMap((window) => {
      const stated = (scores.get(name ?? '')?.stated ?? []).filter((score) => score.window === window);
      const printed = Object.fromEntries(stated.map((score) => [score.score, score.printed]));
      return brokenIdentities(printed).flatMap(({ identity, scores: parts }) => {
        const involved = parts.flatMap((part) => stated.find(({ score }) => score === part) ?? []);
        const [first] = involved;
        if (first === undefined) return [];
        return {
          record: id,
          field: first.field,
          ...(first.at ?? {}),
          subject: `${window} ${identity} ${parts.join(' ')}`,
          message: `The ${window} scores of ${name} contradict one another: ${written(involved)}; ${inWords[identity]}.`,
        };
      });
    }),
});

const inWords: Readonly<Record<Identity, string>> = {
  'RSR = sqrt(1 - NSE)': 'RSR is the square root of 1 - NSE',
  'PBIAS = 100 (1 - beta)': 'PBIAS is 100 (1 - beta), positive where the model gives too little',
  'R2 = r^2': 'R2 is r squared',
  'NSE <= r^2': 'NSE is never above r squared',
  'KGE of its parts': 'KGE follows from r, alpha and beta',
  'possible value': 'it can’t have that value',
};

function written(involved: readonly StatedScore[]): string {
  return involved.map(({ score, printed }) => `${scoreNames[score]} ${asPrinted(printed)}`).join(', ');
}
