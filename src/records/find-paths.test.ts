import fc from 'fast-check';
import picomatch from 'picomatch';
import { describe, expect, it } from 'vitest';
import { pathFinder } from './find-paths.ts';

const paths = [
  'data/.gitkeep',
  'data/climate.csv',
  'data/rain (1).csv',
  'data/rain/a.csv',
  'data/rain/b.csv',
  'data/rain/deep/c.csv',
  'data/rain/read me.txt',
  'models/upper/stoplog.yaml',
  'models/upper/control.txt',
  'models/upper [old]/control.txt',
  'runs/2001.csv',
];

describe('what a path or pattern names', () => {
  const find = pathFinder(paths, '');
  const named = (pattern: string) => find(pattern)?.paths;

  it.each<[string, string[]]>([
    ['data/climate.csv', ['data/climate.csv']],
    ['./data//climate.csv', ['data/climate.csv']],
    ['data/rain/../climate.csv', ['data/climate.csv']],
    ['data/rain/*.csv', ['data/rain/a.csv', 'data/rain/b.csv']],
    ['data/rain/**/*.csv', ['data/rain/a.csv', 'data/rain/b.csv', 'data/rain/deep/c.csv']],
    ['data/**', paths.slice(1, 7)],
    ['data/.*', ['data/.gitkeep']],
    ['data/rain/{a,c}.csv', ['data/rain/a.csv']],
    ['data/rain/[!a].csv', ['data/rain/b.csv']],
    ['data/rain/[^a].csv', ['data/rain/b.csv']],
    ['data/rain/?.csv', ['data/rain/a.csv', 'data/rain/b.csv']],
    ['data/rain/deep', ['data/rain/deep/c.csv']],
    ['data/rain/deep/', ['data/rain/deep/c.csv']],
    ['**/control.txt', ['models/upper [old]/control.txt', 'models/upper/control.txt']],
    ['data/snow.csv', []],
    ['data/rain/{a', []],
    ['Data/climate.csv', []],
  ])('%s', (pattern, found) => {
    expect([...(find(pattern)?.paths ?? ['outside'])].sort()).toEqual([...found].sort());
  });

  it('takes a file whose name holds signs of a glob for itself', () => {
    expect(named('data/rain (1).csv')).toEqual(['data/rain (1).csv']);
    expect(named('models/upper [old]/control.txt')).toEqual(['models/upper [old]/control.txt']);
  });

  it('starts from the manifest’s folder, whatever signs its name holds, and may climb inside the repository', () => {
    const below = (pattern: string) => pathFinder(paths, 'models/upper [old]')(pattern)?.paths;
    expect(below('*.txt')).toEqual(['models/upper [old]/control.txt']);
    expect(below('../../data/rain/*.csv')).toEqual(['data/rain/a.csv', 'data/rain/b.csv']);
    expect(below('../upper')).toEqual(['models/upper/control.txt', 'models/upper/stoplog.yaml']);
  });

  it.each([
    '../x.csv',
    '..',
    'data/../../x.csv',
    '/etc/passwd',
    'C:/data.csv',
    'c:\\data.csv',
    '\\\\server\\x',
  ])('says that %s leads out of the repository', (pattern) => {
    expect(find(pattern)).toBeNull();
  });

  it('finds a starred name in the middle of a long path at once', () => {
    const long = `${'a'.repeat(200)}c`;
    expect(pathFinder([long], '')(`${'*a'.repeat(30)}*b`)?.paths).toEqual([]);
    expect(pathFinder([long], '')(`${'*a'.repeat(30)}*c`)?.paths).toEqual([long]);
  });

  it('agrees with picomatch’s own matching', () => {
    const word = fc.stringMatching(/^[ab]{1,3}$/);
    const path = fc.array(word, { minLength: 1, maxLength: 4 }).map((words) => `${words.join('/')}/f`);
    const part = fc.oneof(word, fc.constantFrom('*', '**', 'a*', '*b', '?', '{a,b}', '[ab]*'));
    const pattern = fc.array(part, { minLength: 1, maxLength: 4 }).map((parts) => parts.join('/'));
    fc.assert(
      fc.property(fc.uniqueArray(path, { maxLength: 12 }), pattern, (some, glob) => {
        fc.pre(picomatch.scan(glob).isGlob && !some.includes(glob));
        const matches = picomatch(glob, { posix: true });
        expect(pathFinder(some, '')(glob)?.paths).toEqual([...some].sort().filter((one) => matches(one)));
      }),
    );
  });
});
