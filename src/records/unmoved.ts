import type { Area } from './record.ts';
import type { Seal } from './seal.ts';
import type { SealedContent } from './sealed-content.ts';

/**
 * What changed below between two states of a run or of parameters while their outcome stayed the same: record ids,
 * field addresses, paths from the manifest's folder. For a run that is all it rests on and takes; for parameters the
 * data and the window of the calibration. Something that is newly recorded below did not change. Empty where the
 * outcome moved, where there is none, and between seals of different schemes.
 */
export function unmovedBelow(
  area: Area,
  before: Pick<Seal, 'scheme' | 'outcome' | 'rests_on' | 'files'>,
  after: Pick<SealedContent, 'scheme' | 'outcome' | 'rests_on' | 'files'>,
): readonly string[] {
  if (before.outcome === null || before.outcome !== after.outcome || before.scheme !== after.scheme)
    return [];
  const changedIds = Object.keys(before.rests_on).filter((id) => before.rests_on[id] !== after.rests_on[id]);
  if (area === 'parameters')
    return changedIds.filter((id) => /^inputs\.|periods\.calibration$/.test(id)).sort();
  const changedPaths = Object.keys(before.files).filter(
    (path) => before.files[path]?.sha256 !== after.files[path]?.sha256,
  );
  return [...changedIds, ...changedPaths].sort();
}

/**
 * Whether a run or parameters were sealed though what lies below had changed and their outcome had not, without a
 * rerun or a reason. `before` is the seal that the record had in the commit before, if it had one: from it a seal
 * shows that was taken out and made anew.
 */
export function isUnmoved(area: Area, seal: Seal, before?: Seal): boolean {
  const below = before === undefined ? seal.unmoved : [...seal.unmoved, ...unmovedBelow(area, before, seal)];
  return below.length > 0 && seal.grade !== 'rerun' && seal.because === null;
}
