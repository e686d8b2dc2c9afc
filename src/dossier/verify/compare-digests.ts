import type { PackageProblem } from './findings.ts';
import type { Inventory, InventoryFile } from './inventory.ts';
import type { ReadManifest } from './read-manifest.ts';

/**
 * Holds a manifest against what is there: every listed file present with its digest. `awaited` are files that may be absent until
 * they are fetched.
 */
export function compareDigests(
  { name, algorithm, digests }: ReadManifest,
  { files }: Inventory,
  awaited: ReadonlyMap<string, unknown> = new Map(),
): readonly PackageProblem[] {
  return [...digests].flatMap(([path, stated]): readonly PackageProblem[] => {
    const file = files.get(path);
    if (file === undefined) {
      return awaited.has(path)
        ? []
        : [{ kind: 'incomplete', file: path, message: `is listed in ${name} and is not there` }];
    }
    const found = digestOf(file, algorithm);
    return found === null || found === stated
      ? []
      : [
          {
            kind: 'broken',
            file: path,
            message: `has the ${algorithm} ${found}, but ${name} says ${stated}`,
          },
        ];
  });
}

/** Files that a manifest should list and does not. */
export function unlisted(
  { name, digests }: ReadManifest,
  paths: Iterable<string>,
): readonly PackageProblem[] {
  return [...paths]
    .filter((path) => !digests.has(path))
    .map((path) => ({ kind: 'incomplete', file: path, message: `is not listed in ${name}` }));
}

function digestOf(file: InventoryFile, algorithm: string): string | null {
  return algorithm === 'sha256' || algorithm === 'sha512' ? file[algorithm] : null;
}
