import { type ScoredWindow, scoredWindows } from '../../../facts/scores/stated.ts';
import type { TargetFigures } from '../../../facts/scores.ts';
import { isDefined, type Statistic } from '../../../hydrology/paired.ts';
import { rateScore } from '../../../hydrology/ratings/rate-score.ts';
import type { RatedStatistic } from '../../../hydrology/tables/performance-ratings.ts';
import type { RecordNode } from '../../../records/record.ts';
import { ratingTable } from '../../../rules/evaluation/rating-table.ts';
import { asPrinted, scoreNames } from '../../../rules/evaluation/score-names.ts';
import { type Block, paragraph, type Text, tableOr } from '../document.ts';
import { besideStated, notStated } from '../say.ts';
import type { Subject } from '../subject.ts';

type Target = RecordNode<'evaluation'>;

const rated: Readonly<Record<string, RatedStatistic>> = { nse: 'NSE', rsr: 'RSR', pbias: 'PBIAS', r2: 'R2' };

/** Scores as stated and as recomputed, with their classes and the table that these come from. */
export function scoreTable(target: Target, { facts }: Subject): readonly Block[] {
  const figures = facts.scores.get(target.name ?? '');
  if (figures === undefined) return [];
  const { fragment } = target;
  const step = isDefined(figures.recomputed) ? figures.recomputed.value.step : (fragment.step ?? '');
  const table = ratingTable(fragment.rated_by, fragment.variable ?? 'other', step);
  const classes: (readonly [string, string])[] = [];
  const rows = scoredWindows.flatMap((window) =>
    namesOver(figures, window).map((score): readonly Text[] => {
      const stated = figures.stated.find((one) => one.window === window && one.score === score);
      const recomputed = stated?.recomputed ?? recomputedOver(figures, window, score);
      const rating = table.basis === null ? null : ratingOf(score, recomputed, table.basis);
      if (rating !== null) classes.push([rating.source, table.id ?? '']);
      return [
        window,
        score in scoreNames ? scoreNames[score as keyof typeof scoreNames] : score,
        stated === undefined ? notStated : asPrinted(stated.printed),
        besideStated(stated?.printed, recomputed),
        stated === undefined ? '-' : stated.agrees ? 'yes' : { strong: 'no' },
        rating?.rating ?? '-',
      ];
    }),
  );
  const [source] = classes;
  return [
    tableOr(
      'No scores are stated, and none could be computed.',
      `Scores of ${target.name}`,
      ['Window', 'Score', 'Stated', 'From the files', 'Agree', 'Class'],
      rows,
    ),
    ...(source === undefined ? [] : [paragraph(`Classes by ${source[1]}: ${source[0]}`)]),
    ...(isDefined(figures.recomputed) ? [] : [paragraph(`Not recomputed: ${figures.recomputed.undefined}.`)]),
  ];
}

/** Stated scores, and the computed ones that have a class. */
function namesOver({ stated, recomputed }: TargetFigures, window: ScoredWindow): readonly string[] {
  const said = stated.filter((one) => one.window === window).map(({ score }) => score as string);
  const over = isDefined(recomputed) ? recomputed.value.windows[window] : undefined;
  const computed =
    over !== undefined && isDefined(over)
      ? Object.keys(over.value.scores).filter((name) => name in rated)
      : [];
  return [...new Set([...said, ...computed])];
}

function recomputedOver({ recomputed }: TargetFigures, window: ScoredWindow, score: string): Statistic {
  const over = isDefined(recomputed) ? recomputed.value.windows[window] : recomputed;
  if (over === undefined) return { undefined: 'no such window' };
  if (!isDefined(over)) return over;
  return (over.value.scores as Readonly<Record<string, Statistic>>)[score] ?? { undefined: 'not computed' };
}

function ratingOf(
  score: string,
  recomputed: Statistic,
  basis: NonNullable<ReturnType<typeof ratingTable>['basis']>,
) {
  const statistic = rated[score];
  if (statistic === undefined || !isDefined(recomputed)) return null;
  const found = rateScore({ ...basis, statistic, scale: 'watershed', value: recomputed.value });
  return isDefined(found) ? found.value : null;
}
