import { graphVersion, reviewDigest } from '../../facts/seen-series.ts';
import { isDefined } from '../../hydrology/paired.ts';
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
  check: ({ id, name, field, fragment }, { standings, scores }) => {
    const { review, none_because } = fragment;
    if (isStated(none_because)) return [];
    const about = { record: id, field: [...field, 'review'] };
    if (!isStated(review?.by) || review?.on === undefined || !isStated(review.says))
      return [
        { ...about, message: `Nobody says, with name and date, to have looked at the graph of ${name}.` },
      ];
    const sealed = standings.get(id)?.seal?.facts;
    const seen = sealed?.review?.value === reviewDigest(review) ? sealed.series_seen : undefined;
    const recomputed = scores.get(name ?? '')?.recomputed;
    if (seen?.computed_by !== graphVersion || recomputed === undefined || !isDefined(recomputed)) return [];
    if (seen.value === recomputed.value.graph) return [];
    return [
      {
        ...about,
        stated: review.on,
        message: `The observed or simulated series of ${name} changed after the review of ${review.on}, so nobody has seen the hydrograph that the scores are about.`,
      },
    ];
  },
});
