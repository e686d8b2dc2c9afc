import { scoredWindows } from '../../facts/scores/stated.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../figures.ts';
import { rule } from '../rule.ts';
import { recomputedOver, scoreOver } from './over.ts';

export const evaluationPeaksMissed = rule({
  id: 'evaluation.peaks-missed',
  scope: 'evaluation',
  from: 'warn',
  means: null,
  statement: 'The model hits fewer of the observed peaks than the limit, while its NSE passes.',
  why: 'NSE forgives a flood that comes a day late or a third too low if all other days fit; those who live by the river do not.',
  source: {
    basis: 'house',
    citation:
      'Our own limits; one-to-one hits within a tolerance are common practice. Where `peaks` is not stated: flows exceeded on 2 % of the days, a week apart, hit within a day',
  },
  clear:
    'Look at the missed peaks on the graph (rain gauges that did not see the storm, a day shifted, a threshold of runoff); write into the review what you found.',
  limits: {
    peaks_hit: {
      default: 0.5,
      unit: '1',
      states: 'least share of observed peaks that are hit',
      looser: 'lower',
    },
    peaks_fewest: {
      default: 3,
      unit: 'peaks',
      states: 'fewest observed peaks to judge by',
      looser: 'higher',
    },
    peaks_nse: { default: 0.5, unit: '1', states: 'NSE above which it passes', looser: 'higher' },
  },
  check: ({ id, name, field, fragment }, { scores }, limits) => {
    return scoredWindows.flatMap((window) => {
      const figures = scores.get(name ?? '');
      const found = recomputedOver(figures, window)?.peaks;
      const nse = scoreOver(figures, window, 'nse');
      if (found === undefined || !isDefined(found) || nse === null || nse <= (limits.peaks_nse ?? 0))
        return [];
      const { observed, hits, above, share, heightErrorPercent, delayDays } = found.value;
      if (
        observed < (limits.peaks_fewest ?? 0) ||
        !isDefined(share) ||
        share.value >= (limits.peaks_hit ?? 0)
      )
        return [];
      const unit =
        figures !== undefined && isDefined(figures.recomputed) ? figures.recomputed.value.unit : '';
      return {
        record: id,
        field: fragment.peaks === undefined ? field : [...field, 'peaks'],
        subject: window,
        found: Number(share.value.toFixed(3)),
        message: `Over ${window} ${name} hits ${hits} of ${observed} observed peaks above ${figure(above)} ${unit}, though its NSE is ${figure(nse)}.`,
        detail: [
          ...(isDefined(heightErrorPercent)
            ? [
                `those that it hits are ${figure(Math.abs(heightErrorPercent.value))} % too ${heightErrorPercent.value < 0 ? 'low' : 'high'} on average`,
              ]
            : []),
          ...(isDefined(delayDays) && delayDays.value !== 0
            ? [`and ${figure(Math.abs(delayDays.value))} d too ${delayDays.value < 0 ? 'early' : 'late'}`]
            : []),
        ],
      };
    });
  },
});
