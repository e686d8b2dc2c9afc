import { expect, it } from 'vitest';
import { discoverManifests, governing } from './discover.ts';

const found = discoverManifests([
  'a/b/stoplog.yaml',
  'a/data.csv',
  'stoplog.yaml',
  'a/my-stoplog.yaml',
  'c/stoplog.yaml/x',
  'stoplog.yaml.bak',
]);

it('finds manifests in any folder, and nothing that only looks like one', () => {
  expect(found).toEqual([
    { path: 'a/b/stoplog.yaml', folder: 'a/b' },
    { path: 'stoplog.yaml', folder: '' },
  ]);
});

it.each([
  ['a/b/data/rain.csv', 'a/b'],
  ['a/b/stoplog.yaml', 'a/b'],
  ['a/bc/rain.csv', ''],
  ['rain.csv', ''],
])('%s is governed by the manifest of folder "%s"', (path, folder) => {
  expect(governing(path, found)?.folder).toBe(folder);
});

it('leaves a path outside every governed folder to nobody', () => {
  expect(governing('z/rain.csv', discoverManifests(['a/stoplog.yaml']))).toBeUndefined();
});
