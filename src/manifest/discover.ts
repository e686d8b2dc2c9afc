export const manifestName = 'stoplog.yaml';

export interface FoundManifest {
  /** From the top of the repository. */
  readonly path: string;
  /** The folder that it governs, from the top of the repository, without a final `/`; empty for the top. */
  readonly folder: string;
}

/** The manifests among the paths of a snapshot, in code-unit order of path. */
export function discoverManifests(paths: Iterable<string>): readonly FoundManifest[] {
  return [...paths]
    .filter((path) => path === manifestName || path.endsWith(`/${manifestName}`))
    .sort()
    .map((path) => ({ path, folder: folderOf(path) }));
}

/** The manifest that governs a path: that of the nearest enclosing folder; undefined where none does. */
export function governing(path: string, manifests: readonly FoundManifest[]): FoundManifest | undefined {
  const byFolder = new Map(manifests.map((manifest) => [manifest.folder, manifest]));
  let folder = path;
  while (folder !== '') {
    folder = folderOf(folder);
    const manifest = byFolder.get(folder);
    if (manifest !== undefined) return manifest;
  }
  return undefined;
}

/** The folder of a path, without a final `/`; empty for the top. */
export function folderOf(path: string): string {
  return path.slice(0, Math.max(0, path.lastIndexOf('/')));
}
