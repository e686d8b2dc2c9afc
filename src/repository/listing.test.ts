import { describe, expect, it } from 'vitest';
import { byPath, committablePaths, stagedEntries, treeEntries } from './listing.ts';
import type { Entry } from './snapshot.ts';

const id = (digit: string) => digit.repeat(40);
const entry = (path: string): Entry => ({ path, mode: '100644', blob: id('1') });

// Bytes in the form that git-ls-files(1), git-ls-tree(1) and git-diff-index(1) describe for -z.
describe('readings of git output', () => {
  it('of the index, with the sides of a conflict', () => {
    const output = `100644 ${id('a')} 0\ta b\n.csv\x00120000 ${id('b')} 1\tlink\x00160000 ${id('c')} 0\tsub\x00`;
    expect(stagedEntries.parse(Buffer.from(output), 0)).toEqual([
      { path: 'a b\n.csv', mode: '100644', blob: id('a'), stage: '0' },
      { path: 'link', mode: '120000', blob: id('b'), stage: '1' },
      { path: 'sub', mode: '160000', blob: id('c'), stage: '0' },
    ]);
  });

  it('of a tree, an old mode read as the ordinary one', () => {
    const output = `100664 blob ${id('a')}\ttab\there\x00160000 commit ${id('b')}\tsub\x00100755 blob ${id('c')}\trun\x00`;
    expect(treeEntries('HEAD').parse(Buffer.from(output), 0)).toEqual([
      { path: 'tab\there', mode: '100644', blob: id('a') },
      { path: 'sub', mode: '160000', blob: id('b') },
      { path: 'run', mode: '100755', blob: id('c') },
    ]);
  });

  it('of the difference from the empty tree', () => {
    const line = `:000000 100644 ${id('0')} ${id('a')} A`;
    const output = `${line}\x00a.csv\x00${line}\x00:odd name\x00`;
    expect(committablePaths('sha1').parse(Buffer.from(output), 0)).toEqual(new Set(['a.csv', ':odd name']));
  });
});

describe('byPath', () => {
  it('sorts by code unit, where git sorts by byte', () => {
    // U+1F30A is above U+FF5E, but its first code unit, D83C, is below.
    expect([...byPath(['\uff5e', '\u{1f30a}', 'b', 'B'].map(entry)).keys()]).toEqual([
      'B',
      'b',
      '\u{1f30a}',
      '\uff5e',
    ]);
  });

  it('refuses two names that can only be shown as one', () => {
    expect(() => byPath([entry('caf\\xe9'), entry('a'), entry('caf\\xe9')])).toThrow(/caf.*not UTF-8/);
  });
});
