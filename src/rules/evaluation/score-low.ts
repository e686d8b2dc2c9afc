import { type ScoredWindow, scoredWindows } from '../../facts/scores/stated.ts';
import type { TargetFigures } from '../../facts/scores.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { lowestRating } from '../../hydrology/ratings/lowest-rating.ts';
import { type RatedScore, rateScore } from '../../hydrology/ratings/rate-score.ts';
import type { RatingBasis } from '../../hydrology/ratings/rating-basis.ts';
import type { RatedStatistic } from '../../hydrology/tables/performance-ratings.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { scoreOver } from './over.ts';
import { ratingTable } from './rating-table.ts';

const rated = { NSE: 'nse', RSR: 'rsr', PBIAS: 'pbias', R2: 'r2' } as const;

export const evaluationScoreLow = rule({
  id: 'evaluation.score-low',
  scope: 'evaluation',
  from: 'validation',
  means: null,
  acceptable: true,
  statement:
    'A score is unsatisfactory by the named table for its variable and time step; the lowest class governs. Monthly flow blocks, others warn.',
  why: 'A model below what is usually asked of its kind may still serve a purpose, but somebody has to say that it does, and answer for it.',
  source: {
    basis: 'published',
    citation:
      'Moriasi, D. N. et al. (2007) Trans. ASABE 50(3):885-900, Table 4 (monthly values); Moriasi, D. N. et al. (2015) Hydrologic and water quality models: performance measures and evaluation criteria. Trans. ASABE 58(6):1763-1785',
  },
  clear:
    'Improve the model or its data; or say in the record, under `accepts`, why this fit serves the purpose, with name and date.',
  check: ({ id, name, field, fragment }, { scores }) => {
    const figures = scores.get(name ?? '');
    if (figures === undefined) return [];
    const step = isDefined(figures.recomputed) ? figures.recomputed.value.step : (fragment.step ?? '');
    const table = ratingTable(fragment.rated_by, fragment.variable ?? 'other', step);
    const drafts: Draft[] = [];
    if (table.fault !== null)
      drafts.push({
        record: id,
        field: [...field, 'rated_by'],
        subject: 'table',
        from: 'warn',
        stated: fragment.rated_by ?? '',
        message: `The scores of ${name} can’t be rated as stated: ${table.fault}.`,
        clear:
          table.known.length === 0
            ? `Leave \`rated_by\` out; no table is published for ${step} values of this variable.`
            : `Name a table that serves: ${table.known.join(', ')}.`,
      });
    if (table.basis === null) return drafts;
    const { basis } = table;
    const isMonthlyFlow = basis.step === 'monthly' && basis.variable === 'streamflow';
    for (const window of scoredWindows) {
      const classes = classesOver(figures, window, basis);
      const lowest = lowestRating(classes.map(({ score }) => score.rating));
      if (!isDefined(lowest) || lowest.value !== 'unsatisfactory') continue;
      const low = classes.filter(({ score }) => score.rating === lowest.value);
      drafts.push({
        record: id,
        field: [...field, 'scores', window],
        subject: window,
        ...(isMonthlyFlow ? {} : { from: 'warn' as const }),
        found: 'unsatisfactory',
        message: `The ${window} of ${name} is unsatisfactory by ${table.id}${fragment.rated_by === table.id ? '' : ' (the usual table, as the record names none that serves)'}: ${low.map(inWords).join(', ')}.`,
        detail: [
          classes
            .map(({ statistic, score, value }) => `${statistic} ${figure(value)} ${score.rating}`)
            .join(', '),
          ...classes.flatMap(({ score }) => score.disputed ?? []),
        ],
      });
    }
    return drafts;
  },
});

interface Class {
  readonly statistic: RatedStatistic;
  readonly value: number;
  readonly score: RatedScore;
}

function classesOver(figures: TargetFigures, window: ScoredWindow, basis: RatingBasis): readonly Class[] {
  return Object.entries(rated).flatMap(([key, score]) => {
    const value = scoreOver(figures, window, score);
    if (value === null) return [];
    const statistic = key as keyof typeof rated;
    const found = rateScore({ ...basis, statistic, scale: 'watershed', value });
    return isDefined(found) ? [{ statistic, value, score: found.value }] : [];
  });
}

function inWords({ statistic, value, score: { row } }: Class): string {
  const [, , limit] = row.limits;
  const asked = { '>': `above ${limit}`, '<=': `at most ${limit}`, '|x| <': `within ${limit} %` }[
    row.reaches
  ];
  return `${statistic} is ${figure(value)} (satisfactory is ${asked})`;
}
