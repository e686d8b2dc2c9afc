import type { ParameterValue } from '../../manifest/data.generated.ts';

/** A calibrated parameter with the number that its range bounds. */
export interface Searched {
  readonly name: string;
  readonly index: number;
  /** The value, or the factor or shift where the range bounds that. */
  readonly searched: number;
  readonly what: string;
  readonly low: number;
  readonly high: number;
  readonly unit: string;
  readonly logarithmic: boolean;
}

/** The parameters whose range and searched number are stated; the range bounds `by` where it says `range_of: factor`. */
export function searchedParameters(values: readonly ParameterValue[]): readonly Searched[] {
  return values.flatMap((parameter, index) => {
    const factor = parameter.range_of === 'factor';
    const searched = factor ? parameter.by : parameter.value;
    if (parameter.range === undefined || searched === undefined || parameter.calibrated === false) return [];
    const [low, high] = parameter.range;
    return {
      name: parameter.name,
      index,
      searched,
      what: factor ? (parameter.change === 'shift' ? 'shift' : 'factor') : 'value',
      low,
      high,
      unit: factor && parameter.change !== 'shift' ? '1' : (parameter.unit ?? ''),
      logarithmic: parameter.search === 'log',
    };
  });
}
