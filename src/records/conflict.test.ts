import { describe, expect, it } from 'vitest';
import { conflictLine, takeVersions } from './conflict.ts';

// As git 2.39 writes them (git-merge(1), "How conflicts are presented").
const merge = `one
<<<<<<< HEAD
two ours
=======
two theirs
>>>>>>> other
three
`;
const diff3 = merge.replace('=======', '||||||| 1234567\ntwo\n=======');

describe('conflict markers', () => {
  it('give the two versions in the style `merge`, which shows no base', () => {
    expect(takeVersions(merge)).toEqual({
      base: null,
      ours: 'one\ntwo ours\nthree\n',
      theirs: 'one\ntwo theirs\nthree\n',
    });
  });

  it('give three in the styles `diff3` and `zdiff3`', () => {
    expect(takeVersions(diff3)).toEqual({
      base: 'one\ntwo\nthree\n',
      ours: 'one\ntwo ours\nthree\n',
      theirs: 'one\ntwo theirs\nthree\n',
    });
  });

  it('show no base where one of several conflicts shows none', () => {
    expect(takeVersions(diff3 + merge)?.base).toBeNull();
    expect(takeVersions(merge + diff3)?.base).toBeNull();
  });

  it('may have Windows line ends, and markers of nested merges inside the base', () => {
    expect(takeVersions(merge.replaceAll('\n', '\r\n'))?.ours).toBe('one\r\ntwo ours\r\nthree\r\n');
    const nested = diff3.replace('\ntwo\n', '\n<<<<<<<<< a\nx\n=========\ny\n>>>>>>>>> b\n');
    expect(takeVersions(nested)?.theirs).toBe('one\ntwo theirs\nthree\n');
  });

  it('are nothing where they do not close', () => {
    expect(takeVersions(merge.replace(/>.*\n/, ''))).toBeNull();
  });

  it('are found by their first line', () => {
    expect(conflictLine(merge)).toBe(2);
    expect(conflictLine('one\ntwo\n')).toBeNull();
    expect(conflictLine('"<<<<<<< in a text"\n')).toBeNull();
  });
});
