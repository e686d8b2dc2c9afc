import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { togetherOrAlone } from './together-or-alone.ts';

export const inputsDayShifted = rule({
  id: 'inputs.day-shifted',
  scope: 'inputs',
  from: 'warn',
  means: null,
  statement:
    'A daily series fits the reference that it is compared with clearly better one day earlier or later.',
  why: 'A total read at 09:00 and written to the wrong day makes the river rise before the rain, and calibration bends the routing to make up for it.',
  source: {
    basis: 'practice',
    citation: 'Common practice: lagged correlation of neighbouring gauges; the limit is our choice.',
  },
  clear:
    'See at which hour the day ends in both sources and whether the date is that of its begin or end; shift the series and say so in `preparation`.',
  limits: {
    day_shift_gain: {
      default: 0.1,
      unit: '1',
      states: 'How much higher the correlation must be on the neighbouring day.',
      looser: 'higher',
    },
  },
  check: ({ id, name, field }, { profiles }, { day_shift_gain: least = 0 }) =>
    togetherOrAlone(
      profiles.get(name ?? '')?.comparisons ?? [],
      ({ file, reference, outcome }): readonly Draft[] => {
        if (!isDefined(outcome) || !isDefined(outcome.value.dayShift)) return [];
        const { days, gain, sameDay } = outcome.value.dayShift.value;
        if (days === 0 || gain < least) return [];
        return [
          {
            record: id,
            field: [...field, 'series'],
            ...(file === null ? {} : { subject: file }),
            found: days > 0 ? 'one day late' : 'one day early',
            message: `${file ?? 'The series'} seems to stand one day ${days > 0 ? 'late' : 'early'}: its correlation with ${reference} is ${figure(sameDay + gain)} against the day ${days > 0 ? 'before' : 'after'} and ${figure(sameDay)} on the same day.`,
          },
        ];
      },
    ),
});
