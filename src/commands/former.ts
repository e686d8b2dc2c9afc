import { folderOf } from '../manifest/discover.ts';
import type { Manifest } from '../manifest/manifest.ts';

/**
 * Where manifests that were moved lay in the base, by their paths now: the study of one that is new, by its id or else its
 * title, is that of one that is gone. Two of one name are not told apart, and count as new.
 * `now` holds the path of every manifest, with null for one that can't be read.
 */
export function formerPaths(
  now: ReadonlyMap<string, Manifest | null>,
  base: readonly Manifest[],
): ReadonlyMap<string, string> {
  const gone = base.filter(({ path }) => !now.has(path));
  const arrived = [...now.values()].filter(
    (one): one is Manifest => one !== null && !base.some(({ path }) => path === one.path),
  );
  return new Map(
    arrived.flatMap((one) => {
      const ofOneName = (others: readonly Manifest[]) =>
        others.filter((other) => nameOf(other) === nameOf(one));
      const [before, ...more] = ofOneName(gone);
      const told = nameOf(one) !== undefined && more.length === 0 && ofOneName(arrived).length === 1;
      return before !== undefined && told ? [[one.path, before.path] as const] : [];
    }),
  );
}

/** A path of a manifest's folder as it was while the manifest lay elsewhere; other paths stay. */
export function formerly(path: string, manifest: string, former: string): string {
  const [is, was] = [inside(manifest), inside(former)];
  return path.startsWith(is) ? was + path.slice(is.length) : path;
}

function nameOf({ data }: Manifest): string | undefined {
  return data.study?.id ?? data.study?.title;
}

/** With a final `/`, or empty for the top. */
function inside(manifest: string): string {
  const folder = folderOf(manifest);
  return folder === '' ? '' : `${folder}/`;
}
