import { reviewDigest, seenSeriesDigest } from '../../facts/seen-series.ts';
import { rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';

export const evaluationUnseen = rule({
  id: 'evaluation.unseen',
  scope: 'evaluation',
  from: 'validation',
  means: 'incomplete',
  statement: 'Nobody says to have looked at the graph, or the series changed since and the review did not.',
  why: 'Scores hide a missed flood, a shifted season and a stuck gauge; an eye on the hydrograph sees them.',
  source: { basis: 'practice', citation: 'Common practice: graphical comparison goes with statistics.' },
  clear:
    'Look at observed and simulated on one graph, write what you saw into `review` (by, on, says), then seal the record.',
  check: ({ id, name, fragment }, { standings, records }) => {
    const { review, none_because } = fragment;
    const field = ['evaluation', name ?? '', 'review'];
    if (none_because !== undefined) return [];
    if (!isStated(review?.by) || review?.on === undefined || !isStated(review.says)) {
      return [
        {
          record: id,
          field,
          message: `Nobody says, with name and date, to have looked at the graph of ${name}.`,
        },
      ];
    }
    const sealed = standings.get(id)?.seal?.facts;
    const unchanged = sealed?.review?.value === reviewDigest(review);
    if (
      !unchanged ||
      sealed.series_seen === undefined ||
      sealed.series_seen.value === seenSeriesDigest(fragment, records)
    )
      return [];
    return [
      {
        record: id,
        field,
        stated: review.on,
        message: `The observed or simulated series of ${name} changed after the review of ${review.on}, so nobody has seen the hydrograph that the scores are about.`,
      },
    ];
  },
});
