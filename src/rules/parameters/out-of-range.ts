import { rule } from '../rule.ts';
import { placeOf } from './place.ts';
import { searchedParameters } from './searched.ts';

export const parametersOutOfRange = rule({
  id: 'parameters.out-of-range',
  scope: 'parameters',
  from: 'calibration',
  means: 'contradicted',
  statement:
    'A calibrated value lies outside the range it was searched in, or the range ends before it begins.',
  why: 'The search can’t have found it there: either the value or the range is not the one that was used.',
  source: { basis: 'house', citation: 'Our own choice: both ends of the range belong to it.' },
  clear: 'Correct the value or the range to what the calibration used.',
  check: (_, { parameters }) =>
    searchedParameters(parameters.values).flatMap(({ of, searched, what, low, high, unit }) => {
      if (searched >= low && searched <= high) return [];
      return [
        {
          ...placeOf(of),
          stated: `${low} to ${high}`,
          found: searched,
          ...(unit === '' ? {} : { unit }),
          message:
            low > high
              ? `The range of ${of.label} ends at ${high}, below its beginning at ${low}.`
              : `The ${what} of ${of.label} lies outside its own range.`,
        },
      ];
    }),
});
