import { nearestName } from '../manifest/nearest.ts';
import { gitPath } from './paths.ts';
import type { RecordNode, Records } from './record.ts';
import type { SealsFile, Standing } from './seal.ts';

/** Why a record can't be sealed as it stands. */
export type RefusalReason =
  | 'unknown-record'
  | 'unreadable-seals'
  | 'circle'
  | 'no-file'
  | 'rests-on-refused'
  | 'unmoved'
  | 'fallen-acceptance';

export interface Refusal {
  /** The record's id, the name asked for, or the path of the seals file. */
  readonly record: string;
  readonly reason: RefusalReason;
  /** What stands in the way, in a sentence. */
  readonly message: string;
  /** What to do. */
  readonly next: string;
  /** For a record that rests on a refused one: the record where the trouble begins. */
  readonly root?: string;
}

/** What makes a record impossible to seal whatever a person says; null where nothing does. */
export function faultOf(record: RecordNode, records: Records): Refusal | null {
  if (record.digest === '') {
    const circle = (records.circle ?? []).join(' <- ');
    return {
      record: record.id,
      reason: 'circle',
      message: `${record.id} rests on records that rest on each other in a circle: ${circle}.`,
      next: 'Take one of them out of `rests_on` or `takes`.',
    };
  }
  const missing = records.unmatched.find((one) => one.record === record.id && one.field[0] !== 'readings');
  if (missing === undefined) return null;
  const { pattern, untracked } = missing;
  return {
    record: record.id,
    reason: 'no-file',
    message:
      missing.why === 'outside-repository'
        ? `\`${pattern}\` leads out of the repository, so nobody who clones it could check what was sealed.`
        : `\`${pattern}\` names no file that git tracks, so there is nothing to fingerprint.`,
    next:
      untracked.length > 0
        ? `git add ${untracked.map(gitPath).join(' ')}`
        : 'Correct the path, or bring the file into git.',
  };
}

/** An acceptance speaks for the state of the record that it was given for; null where none has fallen. */
export function fallenAcceptance({ record, fallen }: Standing): Refusal | null {
  if (fallen.length === 0) return null;
  const which = fallen.length === 1 ? 'An acceptance' : `${fallen.length} acceptances`;
  const it = fallen.length === 1 ? 'it' : 'them';
  return {
    record,
    reason: 'fallen-acceptance',
    message: `${which} in ${record} (entry ${fallen.map((place) => place + 1).join(', ')} of \`accepts\`) was given before the record changed.`,
    next: `Judge anew: if ${it} still holds, give ${it} a new date (\`on\`); else delete ${it} from the manifest.`,
  };
}

export function unmovedRefusal(record: RecordNode, below: readonly string[]): Refusal {
  const isRun = record.area === 'runs';
  return {
    record: record.id,
    reason: 'unmoved',
    message: `${below.join(', ')} changed since ${record.id} was sealed, but ${isRun ? 'its outputs' : 'the calibrated values'} did not: ${isRun ? 'the model was perhaps not run again' : 'the calibration was perhaps not repeated'}.`,
    next: `${isRun ? `Repeat the run, look at its outputs, then seal it. ` : 'Repeat the calibration. '}Or say why nothing should change: stoplog seal ${record.id} --because "..."`,
  };
}

/** Names the record where the trouble begins, however far below. */
export function restsOnRefused(record: string, below: Refusal): Refusal {
  const root = below.root ?? below.record;
  return {
    record,
    reason: 'rests-on-refused',
    message: `${record} rests on ${root}, which can't be sealed as it stands.`,
    next: `Clear ${root} first.`,
    root,
  };
}

export function unknownRecord(name: string, ids: readonly string[]): Refusal {
  const nearest = nearestName(name, ids);
  return {
    record: name,
    reason: 'unknown-record',
    message: `The manifest has no record ${name}.`,
    next: nearest === undefined ? `Records: ${ids.join(', ')}.` : `The nearest is ${nearest}.`,
  };
}

/** A seals file that can't be read in whole would lose entries if it were written anew; null where it can. */
export function unreadableSeals({ path, faults }: SealsFile): Refusal | null {
  const fault = faults.find(({ kind, record }) => record === null || kind === 'newer-scheme');
  if (fault === undefined) return null;
  return {
    record: path,
    reason: 'unreadable-seals',
    message: `${path} line ${fault.line}: ${fault.message}`,
    next:
      fault.kind === 'newer-scheme'
        ? 'Seal with a version of Stoplog that is at least as new.'
        : `Put a whole version in its place, then seal again: git checkout HEAD -- ${gitPath(path)} takes that of the last commit; in a merge, git checkout --ours or --theirs that of one side.`,
  };
}
