import { realpath } from 'node:fs/promises';
import { join, sep } from 'node:path';

/** Folders that hold nothing a modeller would name, and may be very large. */
const neverEntered = ['**/.git/**', '**/node_modules/**'];

/**
 * Files of the work tree that a pattern matches on disk, ignored ones too, in code-unit order: to tell
 * somebody that a file is there but not in git. Never leaves the repository, by `..` or through a link.
 */
export async function onDisk(top: string, pattern: string): Promise<string[]> {
  if (pattern.startsWith('/') || pattern.split('/').includes('..')) return [];
  const { glob } = await import('glob');
  const found = await glob(pattern, { cwd: top, nodir: true, dot: true, posix: true, ignore: neverEntered });
  const root = await realpath(top);
  const inside = await Promise.all(
    found.map(async (path) => (await realpath(join(top, path)).catch(() => '')).startsWith(root + sep)),
  );
  return found.filter((_, place) => inside[place]).sort();
}
