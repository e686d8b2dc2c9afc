/** BagIt encodes these three characters of a path, and no other (RFC 8493, 2.1.3 and 2.2.3). */
export function encodePath(path: string): string {
  return path.replaceAll('%', '%25').replaceAll('\n', '%0A').replaceAll('\r', '%0D');
}

export function decodePath(path: string): string {
  return path.replace(/%(?:25|0a|0d)/gi, (code) => decodeURIComponent(code));
}

/** A manifest: one line for each file, in code-unit order of path; GNU coreutils read it where no path is encoded. */
export function manifestText(digests: ReadonlyMap<string, string>): string {
  return [...digests]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([path, digest]) => `${digest}  ${encodePath(path)}\n`)
    .join('');
}
