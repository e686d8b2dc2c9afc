import { defined, type Statistic, undefinedBecause, type Value } from '../paired.ts';
import { type Run, stuckRuns } from './stuck-runs.ts';

export interface DrySpells {
  readonly longest: Run;
  /** Length of the second longest run of zeros. */
  readonly nextLength: number;
  /** How many times longer the longest is. */
  readonly ratio: number;
}

/**
 * The longest run of zeros against the record's own second longest.
 *
 * Formula: length of the longest run of zeros / length of the second longest
 * Inputs: daily rainfall or flow in order of time, missing values null or not finite.
 * Range: ratio 1 upwards; best near 1.
 * Read: a spell several times the next one is more often a blocked gauge than a drought.
 * Undefined: fewer than two runs of zeros.
 * Source: our choice; no published limit is known.
 * Example: longestDrySpells([0, 0, 1, 0, 0, 0, 0, 2]) -> {value: {longest: {first: 3, length: 4}, nextLength: 2, ratio: 2}}
 */
export function longestDrySpells(values: ArrayLike<Value>): Statistic<DrySpells> {
  const spells = stuckRuns({ values, minimumLength: 1, of: 'zero' });
  const [longest, next] = spells.toSorted((a, b) => b.length - a.length || a.first - b.first);
  if (!longest || !next) return undefinedBecause('the record has fewer than two runs of zeros');
  return defined({ longest, nextLength: next.length, ratio: longest.length / next.length });
}
