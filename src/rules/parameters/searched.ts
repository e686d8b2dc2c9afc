import type { StatedParameter } from '../../facts/parameters/stated.ts';

/** A calibrated parameter with the number that its range bounds. */
export interface Searched {
  readonly of: StatedParameter;
  /** The value, or the factor or shift where the range bounds that. */
  readonly searched: number;
  readonly what: string;
  readonly low: number;
  readonly high: number;
  readonly unit: string;
  readonly logarithmic: boolean;
}

/** The parameters whose range and searched number are stated; the range bounds `by` where it says `range_of: factor`. */
export function searchedParameters(values: readonly StatedParameter[]): readonly Searched[] {
  return values.flatMap((of) => {
    const { range, range_of, by, value, calibrated, change, unit, search } = of.parameter;
    const factor = range_of === 'factor';
    const searched = factor ? by : value;
    if (range === undefined || searched === undefined || calibrated === false) return [];
    const [low, high] = range;
    return {
      of,
      searched,
      what: factor ? (change === 'shift' ? 'shift' : 'factor') : 'value',
      low,
      high,
      unit: factor && change !== 'shift' ? '1' : (unit ?? ''),
      logarithmic: search === 'log',
    };
  });
}
