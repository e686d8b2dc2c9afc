import type { StatedParameter } from '../../facts/parameters/stated.ts';
import type { Draft } from '../rule.ts';

/** Where a parameter stands, in the manifest or in its table, and its name for a finding. */
export function placeOf(
  { label, field, at }: StatedParameter,
  key?: string,
): Pick<Draft, 'record' | 'field' | 'file' | 'line' | 'subject'> {
  const place = key === undefined || at !== null ? field : [...field, key];
  return { record: 'parameters', field: place, subject: label, ...(at ?? {}) };
}
