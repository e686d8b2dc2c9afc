import { isDefined } from '../../hydrology/paired.ts';
import { boundPosition } from '../../hydrology/parameters/bound-position.ts';
import { rule } from '../rule.ts';
import { placeOf } from './place.ts';
import { type Searched, searchedParameters } from './searched.ts';

export const parametersAtBound = rule({
  id: 'parameters.at-bound',
  scope: 'parameters',
  from: 'warn',
  means: null,
  statement:
    'A calibrated value lies within 1 % of an end of its range (on the log scale where it was searched so); several at once block.',
  why: 'A search that ends at its wall would have gone on: the range, the data or the structure decides the value, not the catchment.',
  source: { basis: 'house', citation: 'Our own choice; no published limit was found.' },
  clear:
    'Look at the range and its source; widen it where physics allows and calibrate again, or fix the parameter and say so with `calibrated: false`.',
  limits: {
    at_bound_share: {
      default: 0.01,
      unit: '1',
      states: 'share of the range counted as its end',
      looser: 'lower',
    },
    at_bound_several: {
      default: 3,
      unit: 'parameters',
      states: 'number at an end from which it blocks',
      looser: 'higher',
    },
  },
  check: (_, { parameters }, limits) => {
    const atEnd = searchedParameters(parameters.values).flatMap((parameter) => {
      const end = endReached(parameter, limits.at_bound_share ?? 0);
      return end === null ? [] : [{ parameter, end }];
    });
    const several = atEnd.length >= (limits.at_bound_several ?? Number.POSITIVE_INFINITY);
    return atEnd.map(({ parameter: { of, searched, what, low, high, unit }, end }) => ({
      ...placeOf(of),
      stated: `${low} to ${high}`,
      found: searched,
      ...(unit === '' ? {} : { unit }),
      ...(several ? { from: 'calibration' as const } : {}),
      message: `The ${what} of ${of.label} stopped at the ${end} end of its range${several ? `, one of ${atEnd.length} that did` : ''}.`,
    }));
  },
});

/** Which end the value stopped at; null inside, outside (another rule), and for a range of no width (a fixed value). */
function endReached(
  { searched, low, high, logarithmic }: Searched,
  tolerance: number,
): 'lower' | 'upper' | null {
  const position = boundPosition({
    value: searched,
    lower: low,
    upper: high,
    tolerance,
    logarithmic: logarithmic && low > 0,
  });
  if (!isDefined(position)) return null;
  const { state } = position.value;
  return state === 'at lower bound' ? 'lower' : state === 'at upper bound' ? 'upper' : null;
}
