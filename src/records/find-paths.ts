import { posix } from 'node:path';
import picomatch from 'picomatch';
import { RE2JS } from 're2js';

/** What a path or pattern of a manifest names; paths are from the top of the repository. */
export interface Named {
  /** The path or pattern itself, seen from there. */
  readonly whole: string;
  /** The known files that it names, sorted. */
  readonly paths: readonly string[];
}

/** Finds what a path or pattern names; null when it leads out of the repository. */
export type FindPaths = (pattern: string) => Named | null;

/**
 * Over paths from the top of the repository, for a manifest that governs `folder`. A pattern is a file, a folder
 * (all below it) or a glob with `*`, `**`, `?`, `[...]` and `{a,b}`. As in a shell, names that begin with a dot
 * are found only by patterns that write the dot.
 */
export function pathFinder(paths: Iterable<string>, folder: string): FindPaths {
  const sorted = [...paths].sort();
  const known = new Set(sorted);
  return (pattern) => {
    const place = resolvePattern(folder, pattern);
    if (place === null) return null;
    const { root, rest } = place;
    const whole = root + rest;
    if (known.has(whole)) return { whole, paths: [whole] };
    if (!picomatch.scan(rest).isGlob) {
      return { whole, paths: startingWith(sorted, whole === '' ? '' : `${whole}/`) };
    }
    const matches = globMatcher(rest);
    const near = startingWith(sorted, root + literalStart(rest));
    return { whole, paths: near.filter((path) => matches(path.slice(root.length))) };
  };
}

/** Takes a pattern apart into the folder that it starts from (with `/` at its end, or empty) and the rest; null when it leads out. */
export function resolvePattern(folder: string, pattern: string): { root: string; rest: string } | null {
  if (/^([/\\]|[A-Za-z]:)/.test(pattern)) return null;
  const parts = posix.normalize(pattern).replace(/\/$/, '').split('/');
  const down = parts.findIndex((part) => part !== '..');
  const rest = down < 0 ? [] : parts.slice(down).filter((part) => part !== '.');
  const climbed = parts.length - (down < 0 ? 0 : parts.length - down);
  const folders = folder === '' ? [] : folder.split('/');
  if (climbed > folders.length) return null;
  const root = folders.slice(0, folders.length - climbed).map((part) => `${part}/`);
  return { root: root.join(''), rest: rest.join('/') };
}

/** Everything before the first sign that may have a meaning in a glob. */
function literalStart(pattern: string): string {
  return pattern.slice(0, pattern.search(/[*?[\]{}()!+@\\]/));
}

/**
 * picomatch reads the glob; RE2 runs it, in time that grows with the length of the path only, so that a stranger's
 * pattern can't stall a check. RE2 knows no look-ahead: what picomatch guards with it (empty names, `.` and `..`)
 * does not occur in paths of git.
 */
function globMatcher(pattern: string): (path: string) => boolean {
  const showsDot = hasDotName(pattern);
  const guards = /\(\?=\.\)|\(\?!(?:\(\?:\^\|\\\/\))?\\\.\{[01],[12]\}\(\?:\\\/\|\$\)\)/g;
  try {
    const glob = picomatch.makeRe(pattern, { dot: true, posix: true, noextglob: true, nonegate: true });
    const compiled = RE2JS.compile(glob.source.replace(guards, ''), RE2JS.DOTALL);
    return (path) => (showsDot || !hasDotName(path)) && compiled.matches(path);
  } catch {
    return () => false; // a pattern that can't be read names nothing, and is said to match nothing
  }
}

function hasDotName(path: string): boolean {
  return /(^|\/)\./.test(path);
}

/** The part of a sorted list that begins with `start`. */
function startingWith(sorted: readonly string[], start: string): readonly string[] {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((sorted[middle] ?? '') < start) low = middle + 1;
    else high = middle;
  }
  let end = low;
  while (sorted[end]?.startsWith(start)) end++;
  return sorted.slice(low, end);
}
