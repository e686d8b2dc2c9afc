import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * What a parameter becomes when its stated change is applied to its initial value.
 *
 * Formula: set: the value itself; shift: initial + by; scale: initial * by
 * Inputs: initial value and, for set and shift, `by` in the unit of the parameter; for scale, `by` is a factor without unit.
 * Range: any.
 * Read: must give the stated final value; multiplying parameters of layers or units keeps their order only for factors above 0.
 * Undefined: figures that overflow; a scale of 0, which forgets the initial value.
 * Source: definition.
 * Example: changedValue({change: 'scale', initial: 78, by: 0.95}) -> {value: 74.1}
 */
export function changedValue(of: {
  readonly change: 'set' | 'shift' | 'scale';
  readonly initial: number;
  readonly by: number;
}): Statistic {
  if (of.change === 'set') return computed(of.by);
  if (of.change === 'shift') return computed(of.initial + of.by);
  return of.by === 0
    ? undefinedBecause('a factor of zero forgets the initial value: that is a set')
    : computed(of.initial * of.by);
}
