import type { Facts } from '../../facts/facts.ts';
import type { RecordNode } from '../../records/record.ts';
import type { Change, Seal, Standing } from '../../records/seal.ts';
import { few } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { type FileChange, fileChange } from './file-change.ts';
import { fromPhase } from './required.ts';
import { restatement } from './restatement.ts';

export const sealStale = rule({
  id: 'seal.stale',
  scope: 'manifest',
  from: 'calibration',
  before: 'warn',
  means: 'stale',
  statement:
    'What a record states, its files or what it rests on changed since it was sealed; of all but study, catchment, model, inputs and periods it blocks from the validation on.',
  why: 'A score, a balance or a scenario is true of the data and the parameters that it was computed from. When one of these changes, what was reviewed is no longer what is there.',
  source: { basis: 'definition', citation: 'A seal is the fingerprint of what was reviewed.' },
  clear: 'Check what changed, repeat what rests on it, then: stoplog seal RECORD',
  check: (_, facts) =>
    [...facts.records.nodes.values()].flatMap((record) => {
      const standing = facts.standings.get(record.id);
      return standing?.state === 'stale' && standing.seal !== null
        ? stale(record, standing, standing.seal, facts)
        : [];
    }),
});

function stale(record: RecordNode, { changes, trails }: Standing, seal: Seal, facts: Facts): Draft {
  const own = changes.filter(({ kind }) => kind !== 'rests-on');
  const files = own.filter((change) => change.kind === 'file');
  const [first, ...others] = trails.map(({ steps, path }) => (path === null ? steps : [...steps, path]));
  return {
    record: record.id,
    ...fromPhase(record.area),
    message:
      own.length > 0
        ? ownChange(own, seal)
        : `What this rests on has changed since it was sealed on ${seal.sealed_on}.`,
    ...(first === undefined ? {} : { trail: first }),
    detail: [
      ...restatement(facts.restated.get(record.id) ?? []),
      ...files.slice(0, shownAtMost).flatMap((change) => fileChange(change, files.length > 1, record, facts)),
      ...others
        .filter((trail) => trail.length > 2)
        .slice(0, shownAtMost)
        .map((trail) => `also rests on ${trail.slice(1).join(' <- ')}`),
    ],
    clear: ofLostFiles(record, files) ?? nextStep(record, own.length > 0),
  };
}

const shownAtMost = 5;

function ownChange(own: readonly Change[], { sealed_on }: Seal): string {
  const on = `sealed on ${sealed_on}`;
  const say = (kind: ReturnType<typeof kindOf>, one: string, several: string): readonly string[] => {
    const paths = own.flatMap((change) =>
      change.kind === 'file' && kindOf(change) === kind ? change.path : [],
    );
    return paths.length === 0 ? [] : [`${few(paths)} ${paths.length === 1 ? one : several} ${on}.`];
  };
  const restated = own.some(({ kind }) => kind === 'substance');
  return [
    ...(restated ? [`What this record states was changed since it was ${on}.`] : []),
    ...say('changed', 'is not the file that was', 'are not the files that were'),
    ...say('gone', 'is gone since this was', 'are gone since this was'),
    ...say('added', 'was not there when this was', 'were not there when this was'),
    ...say(
      'unread',
      'can’t be read here to compare it with what was',
      'can’t be read here to compare them with what was',
    ),
  ].join(' ');
}

function kindOf({ was, now }: FileChange): 'changed' | 'gone' | 'added' | 'unread' {
  if (now === null) return 'gone';
  if (was === null) return 'added';
  return now.kind === 'unavailable' ? 'unread' : 'changed';
}

/** What to do where files are gone, which may only be called otherwise now; null where none is. */
function ofLostFiles({ id }: RecordNode, files: readonly FileChange[]): string | null {
  const gone = files.flatMap(({ was, now }) => (now === null ? [was?.sha256 ?? null] : []));
  if (gone.length === 0) return null;
  const added = new Set(
    files.flatMap(({ was, now }) =>
      was === null && now !== null && now.kind !== 'unavailable' ? now.sha256 : [],
    ),
  );
  const isFound = gone.some((sha256) => sha256 !== null && added.has(sha256));
  const first = isFound
    ? 'For the renamed file'
    : 'If it was renamed, write its new path in the manifest, then';
  return `${first}: stoplog seal --moved (keeps who sealed it, and when). Otherwise check what changed, then: stoplog seal ${id}`;
}

function nextStep({ id, area }: RecordNode, own: boolean): string {
  if (own) return `Check what changed, then: stoplog seal ${id}`;
  if (area === 'runs') return `Run the model again on what is there now, then: stoplog seal ${id}`;
  if (area === 'parameters') return `Calibrate again on what is there now, then: stoplog seal ${id}`;
  return `Clear what it rests on first, look at this again, then: stoplog seal --figures ${id}`;
}
