import { describe, expect, it } from 'vitest';
import { followLinks } from './links.ts';
import type { Entry, Mode } from './snapshot.ts';

/** A tree in short: where a link leads, a file, or a submodule. */
function treeOf(files: Record<string, { link: string } | 'file' | 'submodule'>) {
  const entries = new Map<string, Entry>();
  const targets = new Map<string, string>();
  for (const [path, file] of Object.entries(files)) {
    const mode: Mode = file === 'file' ? '100644' : file === 'submodule' ? '160000' : '120000';
    entries.set(path, { path, mode, blob: `id of ${path}` });
    if (typeof file === 'object') targets.set(`id of ${path}`, file.link);
  }
  return (path: string) => followLinks(path, entries, targets);
}

describe('followLinks', () => {
  const follow = treeOf({
    'data/2020/rain.csv': 'file',
    'data/current': { link: '2020' },
    'rain.csv': { link: 'data/current/rain.csv' },
    'data/back.csv': { link: './../data//current/../2020/rain.csv' },
    'deep/er/link.csv': { link: '../../rain.csv' },
    'up.csv': { link: '../elsewhere.csv' },
    'over.csv': { link: 'data/current/../../../out.csv' },
    'root.csv': { link: '/etc/hosts' },
    'empty.csv': { link: '' },
    loop: { link: 'loop' },
    ping: { link: 'pong' },
    pong: { link: 'ping' },
    nowhere: { link: 'data/1999/rain.csv' },
    sub: 'submodule',
    'into-sub': { link: 'sub/flow.csv' },
  });

  it.each([
    ['data/2020/rain.csv', 'data/2020/rain.csv'],
    ['rain.csv', 'data/2020/rain.csv'],
    ['data/current/rain.csv', 'data/2020/rain.csv'],
    ['data/back.csv', 'data/2020/rain.csv'],
    ['deep/er/link.csv', 'data/2020/rain.csv'],
    ['nowhere', 'data/1999/rain.csv'],
    ['empty.csv', ''],
  ])('%s leads to %j', (path, reached) => {
    expect(follow(path)).toMatchObject({ kind: 'path', path: reached });
  });

  it.each([
    ['up.csv', 'outside'],
    ['over.csv', 'outside'],
    ['root.csv', 'outside'],
    ['../x.csv', 'outside'],
    ['/data/2020/rain.csv', 'outside'],
    ['loop', 'too-many'],
    ['ping', 'too-many'],
    ['sub', 'submodule'],
    ['sub/flow.csv', 'submodule'],
    ['into-sub', 'submodule'],
  ])('%s is %s', (path, kind) => {
    expect(follow(path).kind).toBe(kind);
  });

  it('says which link it was', () => {
    expect(follow('deep/er/link.csv')).toMatchObject({ link: { path: 'data/current' } });
    expect(follow('up.csv')).toMatchObject({ link: { path: 'up.csv' } });
    expect(follow('data/2020/rain.csv')).toMatchObject({ link: null });
  });

  it('follows a chain of 40 links and no more', () => {
    const chain = Object.fromEntries(
      Array.from({ length: 41 }, (_, place) => [`link${place}`, { link: `link${place + 1}` }]),
    );
    const along = treeOf({ ...chain, link41: 'file' });
    expect(along('link1')).toMatchObject({ kind: 'path', path: 'link41' });
    expect(along('link0')).toMatchObject({ kind: 'too-many' });
  });

  it('says when it is not known where a link leads', () => {
    const entries = new Map<string, Entry>([['a', { path: 'a', mode: '120000', blob: 'not fetched' }]]);
    expect(followLinks('a', entries, new Map())).toMatchObject({
      kind: 'unknown-target',
      link: { path: 'a' },
    });
  });
});
