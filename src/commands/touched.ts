import { discoverManifests } from '../manifest/discover.ts';
import type { Entry, Snapshot } from '../repository/snapshot.ts';

/** Whether a manifest of either state governs something that differs between them; without a base, whether there is a manifest. */
export async function touchesGoverned(snapshot: Snapshot, base: Snapshot | null): Promise<boolean> {
  const states = base === null ? [snapshot] : [snapshot, base];
  const folders = new Set<string>();
  for (const state of states) {
    for (const { path, folder } of discoverManifests(state.entries.keys())) {
      folders.add((await mayReachOut(state, path, folder)) ? '' : folder);
    }
  }
  if (base === null || folders.size === 0) return folders.size > 0;
  return [...new Set([...snapshot.entries.keys(), ...base.entries.keys()])]
    .filter((path) => !same(snapshot.entries.get(path), base.entries.get(path)))
    .some((path) => [...folders].some((folder) => within(path, folder)));
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
