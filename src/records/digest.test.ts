import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { recordsOf } from '../../tests/records/in-memory.ts';
import { digestOf } from './digest.ts';

const sha256 = (text: string): string => createHash('sha256').update(text).digest('hex');

describe('the digest of a record', () => {
  it('is SHA-256 over scheme, substance, files and what it rests on, written out by hand', async () => {
    const text = `stoplog: 1
catchment: {name: Mill, note: prose, rests_on: [inputs.rain]}
inputs: {rain: {files: [rain.csv]}}
`;
    const { nodes } = await recordsOf(text, { 'rain.csv': '1\n' });
    const rain = sha256(
      `{"files":{"rain.csv":"${sha256('1\n')}"},"rests_on":{},"scheme":1,"substance":"${sha256('{"files":["rain.csv"]}')}"}`,
    );
    expect(nodes.get('inputs.rain')?.digest).toBe(rain);
    const stated = sha256('{"name":"Mill","rests_on":["inputs.rain"]}');
    expect(nodes.get('catchment')).toMatchObject({
      substance: stated,
      wording: sha256('{"note":"prose"}'),
      digest: sha256(`{"files":{},"rests_on":{"inputs.rain":"${rain}"},"scheme":1,"substance":"${stated}"}`),
    });
  });

  it('does not depend on the order in which files and records are given', () => {
    const entries = fc.uniqueArray(fc.tuple(fc.string(), fc.string()), { selector: ([key]) => key });
    fc.assert(
      fc.property(entries, entries, (files, below) => {
        const of = (turn: <T>(list: T[]) => T[]) =>
          digestOf({
            scheme: 1,
            substance: 's',
            files: Object.fromEntries(turn([...files])),
            rests_on: Object.fromEntries(turn([...below])),
          });
        expect(of((list) => list.reverse())).toBe(of((list) => list));
      }),
    );
  });

  it('differs by scheme, substance, each file and each record below', () => {
    const parts = { scheme: 1, substance: 's', files: { a: 'x' }, rests_on: { b: 'y' } };
    const others = [
      { ...parts, scheme: 2 },
      { ...parts, substance: 't' },
      { ...parts, files: { a: null } },
      { ...parts, files: { c: 'x' } },
      { ...parts, rests_on: { b: 'x' } },
      { ...parts, files: { a: 'x', b: 'y' }, rests_on: {} },
    ];
    expect(new Set([parts, ...others].map(digestOf)).size).toBe(others.length + 1);
  });
});
