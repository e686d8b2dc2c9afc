import type { Blobs } from './blobs.ts';
import { followLinks } from './links.ts';
import type { Listing } from './listing.ts';
import { nameFromBytes } from './names.ts';
import type { Entry, Unavailable } from './snapshot.ts';

/** The file that a path leads to, or why it leads to none. */
export type Located = Entry | { readonly why: Unavailable; readonly blob: string | null };

const whyOf = {
  outside: 'link-outside',
  'too-many': 'link-dangling',
  'unknown-target': 'not-fetched',
} as const;

/** Finds what paths of a listing lead to; links are read from the blobs once, and only where a path could lead over one. */
export function locator(
  { entries, ...listing }: Listing,
  blobs: Blobs,
): (paths: readonly string[]) => Promise<Map<string, Located>> {
  const unmerged = new Set(listing.unmerged);
  const intended = new Set(listing.intentToAdd);
  const crossings = [...entries.values()].filter(({ mode }) => mode === '120000' || mode === '160000');
  let targets: Promise<ReadonlyMap<string, string>> | undefined;

  async function readTargets(): Promise<ReadonlyMap<string, string>> {
    const found = new Map<string, string>();
    const ids = crossings.filter(({ mode }) => mode === '120000').map(({ blob }) => blob);
    await blobs.visit([...new Set(ids)], async (id, blob) => {
      if (blob !== null) found.set(id, nameFromBytes(Buffer.from(await blob.whole())));
    });
    return found;
  }

  function ordinary(path: string): Entry | undefined {
    const entry = entries.get(path);
    return entry?.mode.startsWith('100') ? entry : undefined;
  }

  function follow(path: string, links: ReadonlyMap<string, string>): Located {
    const led = followLinks(path, entries, links);
    if (led.kind === 'submodule') return { why: 'submodule', blob: led.entry.blob };
    if (led.kind !== 'path') return { why: whyOf[led.kind], blob: led.link?.blob ?? null };
    const reached = ordinary(led.path);
    if (reached !== undefined) return reached;
    if (unmerged.has(led.path)) return { why: 'unmerged', blob: null };
    if (intended.has(led.path)) return { why: 'intent-to-add', blob: null };
    return led.link === null ? { why: 'absent', blob: null } : { why: 'link-dangling', blob: led.link.blob };
  }

  return async (paths) => {
    if (crossings.length > 0 && paths.some((path) => ordinary(path) === undefined)) targets ??= readTargets();
    const links = (await targets) ?? new Map<string, string>();
    return new Map(paths.map((path) => [path, ordinary(path) ?? follow(path, links)]));
  };
}
