import type { Outcome } from './outcome.ts';
import type { Seal } from './seal.ts';

/**
 * What drives an outcome and changed between two states of a run or of parameters while the outcome did not: record
 * ids, field addresses, paths from the manifest's folder. What is newly recorded did not change. Empty where the
 * outcome moved and where there is none.
 */
export function unmovedBelow(before: Outcome, after: Outcome): readonly string[] {
  if (before.outcome === null || before.outcome !== after.outcome) return [];
  return Object.keys(before.driven_by)
    .filter((one) => before.driven_by[one] !== after.driven_by[one])
    .sort();
}

/**
 * Whether a run or parameters were sealed though what drives them had changed and their outcome had not, without a
 * rerun or a reason. `before` is the seal that the record had in the commit before, if it had one: against it shows
 * a seal that was taken out and made anew.
 */
export function isUnmoved(seal: Seal, before?: Seal): boolean {
  const below = before === undefined ? seal.unmoved : [...seal.unmoved, ...unmovedBelow(before, seal)];
  return below.length > 0 && seal.grade !== 'rerun' && seal.because === null;
}
