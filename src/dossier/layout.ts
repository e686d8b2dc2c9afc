/**
 * Where things lie in a dossier. All paths are from the crate's top: the folder that holds `ro-crate-metadata.json`. That is
 * `data/` of a bag. A dossier without `--bag` holds the documents only, at its top, and no crate: a crate describes files that lie
 * beside it.
 *
 * ```
 * bag/                          dossier/
 *   bagit.txt ...                 dossier.html, findings.json ...
 *   data/                         contents.json
 *     dossier.html ...            manifest-sha256.txt
 *     contents.json
 *     ro-crate-metadata.json
 *     repository/<path>
 * ```
 */
export const crateName = 'ro-crate-metadata.json';

/** What lies in the package and what does not, written by the packer. */
export const contentsName = 'contents.json';

/** Where a file of the repository lies; `path` from the top of the repository, never encoded. */
export function payloadPath(path: string): string {
  return `repository/${path}`;
}

/** Where a document that Stoplog writes lies: at the top, so no file of the repository can collide with it. */
export function documentPath(name: string): string {
  return name;
}
