import type { Entry } from './snapshot.ts';

/** Where a path leads once links are followed; `link` is the last link on the way. */
export type Followed =
  | { readonly kind: 'path'; readonly path: string; readonly link: Entry | null }
  | { readonly kind: 'submodule'; readonly entry: Entry }
  | { readonly kind: 'outside' | 'too-many' | 'unknown-target'; readonly link: Entry | null };

/** As many as Linux follows on the way to one file (path_resolution(7)). */
const mostLinks = 40;

/**
 * Follows symbolic links of the snapshot, in any component of the path, as a file system would but inside
 * the repository only. `targets` holds what links say, by blob id.
 */
export function followLinks(
  path: string,
  entries: ReadonlyMap<string, Entry>,
  targets: ReadonlyMap<string, string>,
): Followed {
  const ahead = path.split('/').reverse();
  const behind: string[] = [];
  let link: Entry | null = null;
  if (path.startsWith('/')) return { kind: 'outside', link };
  let links = 0;
  for (let part = ahead.pop(); part !== undefined; part = ahead.pop()) {
    if (part === '' || part === '.') continue;
    if (part === '..') {
      if (behind.pop() === undefined) return { kind: 'outside', link };
      continue;
    }
    behind.push(part);
    const entry = entries.get(behind.join('/'));
    if (entry?.mode === '160000') return { kind: 'submodule', entry };
    if (entry?.mode !== '120000') continue;
    link = entry;
    links += 1;
    if (links > mostLinks) return { kind: 'too-many', link };
    const target = targets.get(link.blob);
    if (target === undefined) return { kind: 'unknown-target', link };
    if (target.startsWith('/')) return { kind: 'outside', link };
    behind.pop();
    ahead.push(...target.split('/').reverse());
  }
  return { kind: 'path', path: behind.join('/'), link };
}
