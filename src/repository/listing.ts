import { Failure } from '../failure.ts';
import { ask, type Place, type Question } from './git.ts';
import { namesFromOutput, splitAtNul } from './names.ts';
import { type ObjectFormat, objectId } from './object-id.ts';
import type { Entry, Mode } from './snapshot.ts';

const slash = 0x2f;

/** What a tree or an index holds. */
export interface Listing {
  /** In code-unit order of path. */
  readonly entries: ReadonlyMap<string, Entry>;
  readonly unmerged: readonly string[];
  readonly intentToAdd: readonly string[];
}

interface StagedEntry extends Entry {
  /** 0; or 1 to 3 for the sides of a conflict. */
  readonly stage: string;
}

/** Entries of the index, conflict sides included. */
export const stagedEntries: Question<StagedEntry[]> = {
  args: ['ls-files', '--stage', '-z'],
  parse: (output) =>
    namesFromOutput(output).map((line) => {
      const tab = line.indexOf('\t');
      const [mode = '', blob = '', stage = ''] = line.slice(0, tab).split(' ');
      return { path: line.slice(tab + 1), mode: mode as Mode, blob, stage };
    }),
};

/** Files of a commit's tree, folders opened; all of them, or those at or below the paths. */
export function treeEntries(commit: string, paths: readonly string[] = []): Question<Entry[]> {
  return {
    args: ['ls-tree', '-r', '-z', '--full-tree', commit, '--', ...paths],
    parse: (output) =>
      namesFromOutput(output).map((line) => {
        const tab = line.indexOf('\t');
        const [mode = '', , blob = ''] = line.slice(0, tab).split(' ');
        // Trees written by early versions of git may have 100664.
        return { path: line.slice(tab + 1), mode: (mode === '100664' ? '100644' : mode) as Mode, blob };
      }),
  };
}

/** Paths that a commit of the index would hold: `git diff-index` against the empty tree leaves out `git add -N` ones. */
export function committablePaths(format: ObjectFormat): Question<Set<string>> {
  return {
    args: [
      ...['diff-index', '--cached', '--raw', '--no-abbrev', '-z', '--no-renames', '--ita-invisible-in-index'],
      objectId('tree', '', format),
    ],
    parse: (output) => new Set(namesFromOutput(output).filter((_, place) => place % 2 === 1)),
  };
}

/** Names of files on disk that git neither tracks nor ignores. A repository inside comes as a folder, and is left out. */
export const untrackedFiles: Question<Buffer[]> = {
  args: ['ls-files', '--others', '--exclude-standard', '-z'],
  parse: (output) => splitAtNul(output).filter((name) => name.at(-1) !== slash),
};

/** Lists the index that the place's environment names. */
export async function listIndex(place: Place, format: ObjectFormat): Promise<Listing> {
  const staged = await ask(place, stagedEntries);
  const merged = staged.filter((entry) => entry.stage === '0');
  const unmerged = [...new Set(staged.filter((entry) => entry.stage !== '0').map((entry) => entry.path))];
  // Only an entry with the empty blob can be an intent to add, so most repositories need no second question.
  const emptyBlob = objectId('blob', '', format);
  const empty = merged.filter((entry) => entry.blob === emptyBlob).map((entry) => entry.path);
  const committable = empty.length > 0 ? await ask(place, committablePaths(format)) : new Set<string>();
  const intended = new Set(empty.filter((path) => !committable.has(path)));
  return {
    entries: byPath(merged.filter((entry) => !intended.has(entry.path))),
    unmerged: unmerged.sort(),
    intentToAdd: [...intended].sort(),
  };
}

/** Lists the tree of a commit. */
export async function listCommit(place: Place, commit: string): Promise<Listing> {
  return { entries: byPath(await ask(place, treeEntries(commit))), unmerged: [], intentToAdd: [] };
}

/** Entries by path, in code-unit order, which is not git's order for characters beyond the basic plane. */
export function byPath(entries: Iterable<Entry>): Map<string, Entry> {
  const sorted = [...entries].sort((a, b) => (a.path < b.path ? -1 : 1));
  const map = new Map(sorted.map(({ path, mode, blob }) => [path, { path, mode, blob }]));
  if (map.size < sorted.length) {
    const twice = sorted.find((entry, place) => entry.path === sorted[place + 1]?.path)?.path;
    throw new Failure(
      'unreadable-file',
      `Two tracked files can both only be shown as ${JSON.stringify(twice)}: the name of one is not UTF-8.`,
      'Give one of them another name with `git mv`.',
    );
  }
  return map;
}
