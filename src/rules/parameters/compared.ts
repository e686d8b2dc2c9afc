import type { StatedParameter } from '../../facts/parameters/stated.ts';
import type { Draft } from '../rule.ts';
import { placeOf } from './place.ts';

type Place = 'scope' | 'layer';

/** Whether two stand for the same layer, or scope, or both. */
export function isBeside(one: StatedParameter, other: StatedParameter, keys: readonly Place[]): boolean {
  return keys.every((key) => String(one.parameter[key]) === String(other.parameter[key]));
}

/** Whether the value that should be smaller is greater, or with `strictly` as great; false where units differ or one is not stated. */
export function isAbove(low: StatedParameter, high: StatedParameter, strictly: boolean): boolean {
  const [less, more] = [low.parameter.value, high.parameter.value];
  if (less === undefined || more === undefined || low.parameter.unit !== high.parameter.unit) return false;
  return strictly ? less >= more : less > more;
}

/** The final value as people write it. */
export function told({ written, parameter: { value, unit } }: StatedParameter): string {
  return `${written ?? value}${unit === undefined || unit === '1' ? '' : ` ${unit}`}`;
}

/** What findings on two parameters in the wrong order have in common. */
export function pair(low: StatedParameter, high: StatedParameter): Omit<Draft, 'message'> {
  return {
    ...placeOf(low, 'value'),
    subject: `${low.label} < ${high.label}`,
    found: low.parameter.value ?? '',
  };
}
