import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { outside } from '../../tests/harness/outside.ts';
import { parsePointer } from './pointer.ts';

// The example of the Git LFS specification (git-lfs, docs/spec.md, "The Pointer").
const oid = '4d7a214614ab2935c943f9e0ff69d22eadbb8f32b1258daaa5e2ca24d17e2393';
const version = 'version https://git-lfs.github.com/spec/v1';
const good = `${version}\noid sha256:${oid}\nsize 12345\n`;

const readable: Record<string, string> = {
  'the example of the specification': good,
  'no line end at the end': good.slice(0, -1),
  'Windows line ends': good.replaceAll('\n', '\r\n'),
  'blank lines around': `\n\n${good}\n\n`,
  'blank line inside': good.replace('\noid', '\n\noid'),
  'the first version line': good.replace('git-lfs.github.com', 'hawser.github.com'),
  'the alpha version line': good.replace('https://git-lfs.github.com/spec/v1', 'http://git-media.io/v/2'),
  'an extension': good.replace('\noid', `\next-0-pack sha256:${oid}\noid`),
  'extensions in no order': good.replace(
    '\noid',
    `\next-1-pack sha256:${oid}\next-0-sort sha256:${oid}\noid`,
  ),
  'size 0': good.replace('12345', '0'),
  'a leading zero': good.replace('12345', '0012345'),
};

const other: Record<string, string> = {
  'keys in another order': `${version}\nsize 12345\noid sha256:${oid}\n`,
  'an unknown key': good.replace('\noid', '\nnote x\noid'),
  'a key at the end': `${good}z y\n`,
  'an upper-case digest': good.replace(oid, oid.toUpperCase()),
  'a short digest': good.replace(oid, oid.slice(1)),
  'another digest': good.replace('sha256:', 'sha512:'),
  'a negative size': good.replace('12345', '-1'),
  'a size beyond 64 bits': good.replace('12345', '99999999999999999999'),
  'no size': `${version}\noid sha256:${oid}\n`,
  'two blanks': good.replace('oid ', 'oid  '),
  'blanks at line ends': good.replaceAll('\n', ' \n'),
  'a later version': good.replace('spec/v1', 'spec/v2'),
  'an extension twice': good.replace('\noid', `\next-0-a sha256:${oid}\next-0-b sha256:${oid}\noid`),
  'an extension of two digits': good.replace('\noid', `\next-10-a sha256:${oid}\noid`),
  '1 024 bytes and more': good.replace('\noid', `\next-0-${'a'.repeat(900)} sha256:${oid}\noid`),
  'a table': 'date,rain_mm\n2001-10-01,0.4\n',
};

describe('parsePointer', () => {
  it.each(Object.keys(readable))('reads %s', (name) => {
    const bytes = name === 'size 0' ? 0 : 12345;
    expect(parsePointer(Buffer.from(readable[name] ?? ''))).toEqual({
      sha256: oid,
      bytes,
      extended: name.startsWith('an extension') || name.startsWith('extensions'),
    });
  });

  it.each(Object.keys(other))('takes %s for content', (name) => {
    expect(parsePointer(Buffer.from(other[name] ?? ''))).toBeNull();
  });

  it('takes an empty file for content', () => {
    expect(parsePointer(new Uint8Array())).toBeNull();
  });
});

const lfs = outside('git-lfs', ['version']);
it.skipIf(!lfs.available)(`agrees with git lfs pointer --check on all of these ${lfs.reason}`, () => {
  const accepted = (text: string) =>
    spawnSync('git', ['lfs', 'pointer', '--check', '--stdin'], { input: text }).status === 0;
  expect(Object.keys(readable).filter((name) => !accepted(readable[name] ?? ''))).toEqual([]);
  expect(Object.keys(other).filter((name) => accepted(other[name] ?? ''))).toEqual([]);
});
