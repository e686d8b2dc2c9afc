import { execFileSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { isObjectId, objectId } from './object-id.ts';

describe('objectId', () => {
  // Ids of the empty blob and tree that git's own documentation and test suite state
  // (git, t/oid-info/hash-info: empty_blob, empty_tree).
  it.each([
    ['blob', 'sha1', 'e69de29bb2d1d6434b8b29ae775ad8c2e48c5391'],
    ['tree', 'sha1', '4b825dc642cb6eb9a060e54bf8d69288fbee4904'],
    ['blob', 'sha256', '473a0f4c3be8a93681a267e3b1e9a7dcda1185436fe141f7749120a303721813'],
    ['tree', 'sha256', '6ef19b41225c5369f1c104d45d8d85efa9b057b53b14b4b9b939dd74decc5321'],
  ] as const)('of the empty %s in %s', (type, format, id) => {
    expect(objectId(type, '', format)).toBe(id);
  });

  it('is what git hash-object gives', () => {
    const content = Buffer.from([0, 255, 10, 13, 104, 105]);
    const asked = execFileSync('git', ['hash-object', '--stdin'], { input: content, encoding: 'utf8' });
    expect(objectId('blob', content, 'sha1')).toBe(asked.trim());
  });
});

it.each([
  ['e69de29bb2d1d6434b8b29ae775ad8c2e48c5391', true],
  ['e69de29', false],
  ['HEAD', false],
  ['e69de29bb2d1d6434b8b29ae775ad8c2e48c5391\nHEAD', false],
  ['E69DE29BB2D1D6434B8B29AE775AD8C2E48C5391', false],
  ['473a0f4c3be8a93681a267e3b1e9a7dcda1185436fe141f7749120a303721813', false],
])('isObjectId(%j) in sha1 is %s', (text, answer) => {
  expect(isObjectId(text, 'sha1')).toBe(answer);
});
