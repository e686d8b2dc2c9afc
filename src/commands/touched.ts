import { discoverManifests } from '../manifest/discover.ts';
import { listCommit } from '../repository/listing.ts';
import type { Repository } from '../repository/repository.ts';
import type { Entry, Snapshot } from '../repository/snapshot.ts';

/** Whether a manifest of either state governs something that differs between them; without a base, whether one is concerned at all. */
export async function touchesGoverned(
  repository: Repository,
  snapshot: Snapshot,
  base: Snapshot | null,
): Promise<boolean> {
  if (base === null) return holdsManifest(repository, snapshot);
  const folders = new Set<string>();
  for (const state of [snapshot, base]) {
    for (const { path, folder } of discoverManifests(state.entries.keys())) {
      folders.add((await mayReachOut(state, path, folder)) ? '' : folder);
    }
  }
  if (folders.size === 0) return false;
  return [...new Set([...snapshot.entries.keys(), ...base.entries.keys()])]
    .filter((path) => !same(snapshot.entries.get(path), base.entries.get(path)))
    .some((path) => [...folders].some((folder) => within(path, folder)));
}

/** Whether there is a manifest; of what is not committed yet, also whether one was left out or is taken away. */
async function holdsManifest(repository: Repository, snapshot: Snapshot): Promise<boolean> {
  const { at, commit, entries, untracked } = snapshot;
  const holds = (paths: Iterable<string>) => discoverManifests(paths).length > 0;
  if (holds(entries.keys()) || holds(untracked)) return true;
  if (at.kind === 'revision' || commit === null) return false;
  return holds((await listCommit(repository, commit)).entries.keys());
}

/** `..`, also where YAML writes a dot as an escape or breaks a quoted text between the two. */
const upwards = /\.\.|\\(?:x2e|u002e|U0000002e|\r?\n)/i;

/** A manifest may name files above its folder by `..`, or through a link. */
async function mayReachOut(state: Snapshot, path: string, folder: string): Promise<boolean> {
  const linked = [...state.entries.values()].some(
    (entry) => entry.mode === '120000' && within(entry.path, folder),
  );
  if (linked || folder === '') return true;
  const bytes = await state.read(path);
  return bytes === null || upwards.test(new TextDecoder().decode(bytes));
}

function within(path: string, folder: string): boolean {
  return folder === '' || path.startsWith(`${folder}/`);
}

function same(one: Entry | undefined, other: Entry | undefined): boolean {
  return one?.blob === other?.blob && one?.mode === other?.mode;
}
