import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { joinSeries, type Series } from './series.ts';
import { formatStep, sameStep } from './step.ts';

/** What several files make together; where nothing is stated they follow one another in time. */
export type Combination = 'mean' | 'sum' | { readonly weights: Readonly<Record<string, number>> } | undefined;

/**
 * Several series, by path or gauge, as one. A mean, sum or weighted mean has a value only at steps where all of them have one: a
 * mean of those that happen to be there would change with the gauges that fail. Weights need not add up to 1.
 * Undefined: no series, different steps or units, a series without a weight, weights that are all zero.
 */
export function combine(parts: ReadonlyMap<string, Series>, combination: Combination): Statistic<Series> {
  const [first, ...others] = parts.values();
  if (first === undefined) return undefinedBecause('there is no series to combine');
  for (const [name, part] of parts) {
    if (!sameStep(part.step, first.step))
      return undefinedBecause(
        `${name} has the step ${formatStep(part.step)}, others ${formatStep(first.step)}`,
      );
    if (part.unit !== first.unit)
      return undefinedBecause(
        `${name} is in ${part.unit || 'no stated unit'}, others in ${first.unit || 'none'}`,
      );
  }
  if (combination === undefined) return defined(joinSeries([first, ...others]));
  const weights = weightsOf([...parts.keys()], combination);
  if (!isDefined(weights)) return weights;
  const divisor = combination === 'sum' ? 1 : weights.value.reduce((sum, weight) => sum + weight, 0);
  if (!(divisor > 0)) return undefinedBecause('the weights add up to nothing');
  return defined(weightedSum([first, ...others], weights.value, divisor));
}

function weightsOf(
  names: readonly string[],
  combination: NonNullable<Combination>,
): Statistic<readonly number[]> {
  if (typeof combination === 'string') return defined(names.map(() => 1));
  const stated = combination.weights;
  const unweighted = names.find((name) => stated[name] === undefined);
  if (unweighted !== undefined) return undefinedBecause(`${unweighted} has no weight`);
  return defined(names.map((name) => stated[name] ?? 0));
}

function weightedSum(
  parts: readonly [Series, ...Series[]],
  weights: readonly number[],
  divisor: number,
): Series {
  const timeSeconds = Float64Array.from(new Set(parts.flatMap((part) => [...part.timeSeconds]))).sort();
  const values = new Float64Array(timeSeconds.length);
  for (const [index, part] of parts.entries()) {
    const weight = weights[index] ?? 0;
    let row = 0;
    for (const [place, time] of timeSeconds.entries()) {
      const here = part.timeSeconds[row] === time ? (part.values[row++] as number) : Number.NaN;
      if (weight !== 0) values[place] = (values[place] as number) + weight * here;
    }
  }
  return { ...parts[0], timeSeconds, values: values.map((sum) => sum / divisor) };
}
