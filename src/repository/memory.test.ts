import { describe, expect, it } from 'vitest';
import { snapshotFromMemory } from './memory.ts';

const pointerText = `version https://git-lfs.github.com/spec/v1\noid sha256:${'7'.repeat(64)}\nsize 12345\n`;

describe('snapshotFromMemory', () => {
  // FIPS 180-4 examples (NIST, "Descriptions of SHA-256", and the Secure Hash Standard's example file):
  // one block, two blocks, and a million times the letter a; the empty message from NIST's SHA test vectors.
  it.each([
    ['no byte', '', 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855'],
    ['three bytes', 'abc', 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
    [
      'two blocks',
      'abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq',
      '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
    ],
    [
      'a million bytes',
      'a'.repeat(1_000_000),
      'cdc76e5c9914fb9281a1c7e284d73e67f1809a48a497200e046d39ccc7112cd0',
    ],
  ])('gives the SHA-256 of FIPS 180-4 for %s', async (_, content, sha256) => {
    const snapshot = snapshotFromMemory({ 'message.txt': content });
    const identity = (await snapshot.identify(['message.txt'])).get('message.txt');
    expect(identity).toMatchObject({ kind: 'file', sha256, bytes: content.length });
  });

  it('lists entries in code-unit order and gives their content', async () => {
    const snapshot = snapshotFromMemory({ 'b.csv': new Uint8Array([1, 2]), 'a/z.csv': 'x', B: '' });
    expect([...snapshot.entries.keys()]).toEqual(['B', 'a/z.csv', 'b.csv']);
    expect(await snapshot.read('b.csv')).toEqual(new Uint8Array([1, 2]));
    expect(await snapshot.read('c.csv')).toBeNull();
    const chunks: Uint8Array[] = [];
    for await (const chunk of snapshot.stream('a/z.csv')) chunks.push(chunk);
    expect(Buffer.concat(chunks).toString()).toBe('x');
  });

  it('follows links and says where they fail', async () => {
    const snapshot = snapshotFromMemory({
      'data/rain.csv': 'abc',
      'rain.csv': { link: 'data/rain.csv' },
      'out.csv': { link: '../out.csv' },
      'gone.csv': { link: 'data/gone.csv' },
    });
    const identities = await snapshot.identify(['rain.csv', 'out.csv', 'gone.csv', 'none.csv']);
    expect(
      [...identities].map(([path, identity]) => [path, 'why' in identity ? identity.why : identity.kind]),
    ).toEqual([
      ['rain.csv', 'file'],
      ['out.csv', 'link-outside'],
      ['gone.csv', 'link-dangling'],
      ['none.csv', 'absent'],
    ]);
    expect(String(await snapshot.read('rain.csv').then((bytes) => Buffer.from(bytes ?? [])))).toBe('abc');
    await expect(snapshot.stream('out.csv')[Symbol.asyncIterator]().next()).rejects.toMatchObject({
      code: 'unreadable-file',
      message: expect.stringContaining('link-outside'),
    });
  });

  it('takes a Git LFS pointer for the content that it names, which is not there', async () => {
    const snapshot = snapshotFromMemory({ 'radar.nc': pointerText });
    expect((await snapshot.identify(['radar.nc'])).get('radar.nc')).toMatchObject({
      kind: 'pointer',
      sha256: '7'.repeat(64),
      bytes: 12345,
      present: false,
    });
    expect(await snapshot.read('radar.nc')).toBeNull();
  });

  it('refuses to read more than the limit', async () => {
    const snapshot = snapshotFromMemory({ 'rain.csv': '12345' });
    await expect(snapshot.read('rain.csv', 4)).rejects.toMatchObject({ code: 'unreadable-file' });
    expect(await snapshot.read('rain.csv', 5)).toHaveLength(5);
  });

  it('knows what was before', async () => {
    const snapshot = snapshotFromMemory({ 'rain.csv': 'new' }, { 'rain.csv': 'old' });
    expect(String(Buffer.from((await snapshot.readBefore('rain.csv')) ?? []))).toBe('old');
    expect(await snapshot.readBefore('flow.csv')).toBeNull();
  });
});
