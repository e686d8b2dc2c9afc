import { posix } from 'node:path';

/** A path from the top of the repository as the manifest's folder sees it. */
export function fromFolder(folder: string, path: string): string {
  return posix.relative(`/${folder}`, `/${path}`);
}

/** A path from the manifest's folder as the top of the repository sees it. */
export function fromTop(folder: string, path: string): string {
  return posix.join(folder, path);
}

/** A path from the top of the repository, for a git command that is typed in any folder of it. */
export function gitPath(path: string): string {
  return shellPath(`:/${path}`);
}

/** A path as a shell takes it. */
export function shellPath(path: string): string {
  return /^:?[\w./-]+$/.test(path) ? path : `'${path.replaceAll("'", "'\\''")}'`;
}
