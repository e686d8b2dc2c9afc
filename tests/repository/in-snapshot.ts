import { openSnapshot, type SnapshotOptions } from '../../src/repository/open-snapshot.ts';
import { openRepository } from '../../src/repository/repository.ts';
import type { At, Snapshot } from '../../src/repository/snapshot.ts';

export interface Surroundings {
  readonly cwd: string;
  readonly environment: NodeJS.ProcessEnv;
}

/** Opens a snapshot from a folder, uses it and closes it. */
export async function inSnapshot<Answer>(
  { cwd, environment }: Surroundings,
  at: At,
  use: (snapshot: Snapshot) => Answer | Promise<Answer>,
  options?: SnapshotOptions,
): Promise<Answer> {
  const snapshot = await openSnapshot(await openRepository(cwd, environment), at, options);
  try {
    return await use(snapshot);
  } finally {
    await snapshot.close();
  }
}

/** Entries as `git ls-tree -r` writes them, for names that it need not quote. */
export function asTree(snapshot: Snapshot): string {
  return [...snapshot.entries.values()]
    .map(({ mode, blob, path }) => `${mode} ${mode === '160000' ? 'commit' : 'blob'} ${blob}\t${path}\n`)
    .join('');
}

/** Text of a path; the reason where it has none. */
export async function textOf(snapshot: Snapshot, path: string): Promise<string> {
  const content = await snapshot.read(path);
  if (content !== null) return Buffer.from(content).toString();
  const identity = (await snapshot.identify([path])).get(path);
  return identity !== undefined && 'why' in identity ? identity.why : 'no content';
}
