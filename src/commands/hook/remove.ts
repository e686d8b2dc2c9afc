import { rename, rmdir, unlink } from 'node:fs/promises';
import { dirname } from 'node:path';
import type { Repository } from '../../repository/repository.ts';
import type { Block } from './block.ts';
import { formerHomes, hookHome, hooksFor } from './home.ts';
import { type HookContent, lookAtHook } from './look.ts';
import { type Done, type HookReport, reportHooks } from './report.ts';
import { change, writeHook } from './write.ts';

/**
 * Takes our hooks away, also those that lie where git no longer looks, and puts back what was there. A hook that
 * is not ours, or that someone changed since, is left alone.
 * Failures: 'usage' (see `hookHome`), 'unreadable-file', 'unwritable-file'.
 */
export async function removeHooks(repository: Repository): Promise<HookReport> {
  const home = await hookHome(repository);
  const done = new Map<string, Done>();
  for (const one of [home, ...formerHomes(repository, home)]) {
    let foldersMade = 0;
    for (const hook of hooksFor(repository)) {
      const there = await lookAtHook(one, hook);
      if (there.block === null) continue;
      const left = there.found === 'changed';
      done.set(there.file, left ? 'left' : await removeHook(there, there.block));
      foldersMade = Math.max(foldersMade, there.block.foldersMade);
    }
    await removeFolders(one.folder, foldersMade);
  }
  return reportHooks(repository, home, done);
}

async function removeHook(there: HookContent, { was, rest }: Block): Promise<Done> {
  const { file, earlier, home, mode } = there;
  if (earlier?.exists) {
    await change(file, () => rename(earlier.file, file));
    return 'restored';
  }
  if (home.starter === 'husky' && (was === 'the lines below' || rest !== '')) {
    await writeHook(file, rest, mode);
    return 'restored';
  }
  await change(file, () => unlink(file));
  return 'removed';
}

/** Takes away the folders that `add` made, from the innermost outwards, as far as they are empty. */
async function removeFolders(innermost: string, count: number): Promise<void> {
  let folder = innermost;
  for (let left = count; left > 0; left -= 1) {
    const gone = await rmdir(folder).then(
      () => true,
      () => false,
    );
    if (!gone) return;
    folder = dirname(folder);
  }
}
