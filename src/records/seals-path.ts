import { posix } from 'node:path';
import { manifestName } from '../manifest/discover.ts';

/** The machine-written half of a manifest. */
export const sealsName = 'stoplog.seals.json';

/** Where the seals of a manifest are kept: beside it. */
export function sealsPathOf({ folder }: { readonly folder: string }): string {
  return posix.join(folder, sealsName);
}

/** Whether a path is a manifest or a seals file: neither is ever a file of a record. */
export function isStoplogFile(path: string): boolean {
  return [manifestName, sealsName].includes(posix.basename(path));
}
