import { discoverManifests, governing } from '../manifest/discover.ts';
import type { Manifest } from '../manifest/manifest.ts';
import type { FindPaths } from './find-paths.ts';
import { asWhole, type Unmatched } from './record.ts';

/** The files that a manifest says it accounts for, less those that it leaves out or that a manifest below governs. */
export function coveredFiles(
  manifest: Manifest,
  find: FindPaths,
  tracked: Iterable<string>,
): { readonly paths: readonly string[]; readonly unmatched: readonly Unmatched[] } {
  const unmatched: Unmatched[] = [];
  const all = (key: 'covers' | 'leaves_out'): ReadonlySet<string> =>
    new Set(
      (manifest.data[key] ?? []).flatMap((pattern, index) => {
        const found = find(pattern);
        const field = [key, index];
        if (found === null) {
          unmatched.push({
            record: asWhole,
            pattern,
            field,
            why: 'outside-repository',
            untracked: [],
            ignored: [],
          });
        }
        return found?.paths ?? [];
      }),
    );
  const covered = all('covers');
  const leftOut = all('leaves_out');
  const manifests = discoverManifests(tracked);
  const isHere = (path: string): boolean =>
    (governing(path, manifests)?.folder ?? manifest.folder) === manifest.folder;
  return { paths: [...covered].filter((path) => !leftOut.has(path) && isHere(path)).sort(), unmatched };
}
