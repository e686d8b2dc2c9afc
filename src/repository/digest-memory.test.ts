import { chmod, mkdir, mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { type BlobDigest, digestsFromText, digestsToText, openDigestMemory } from './digest-memory.ts';

const digest: BlobDigest = { sha256: 'a'.repeat(64), bytes: 12, kind: 'content' };
const pointer: BlobDigest = { sha256: 'b'.repeat(64), bytes: 48_213_004, kind: 'pointer' };
const one = '1'.repeat(40);
const two = '2'.repeat(64);

describe('the text of a memory', () => {
  const digests = new Map([
    [one, digest],
    [two, pointer],
  ]);

  it('is read as it was written', () => {
    expect(digestsFromText(digestsToText(digests))).toEqual(digests);
    expect(digestsFromText(digestsToText(new Map()))).toEqual(new Map());
  });

  it('is worth nothing once a character differs, is lost or is added', () => {
    const text = digestsToText(digests);
    for (let place = 0; place < text.length; place += 1) {
      const altered = `${text.slice(0, place)}${text[place] === 'c' ? 'd' : 'c'}${text.slice(place + 1)}`;
      expect(digestsFromText(altered).size).toBe(0);
      expect(digestsFromText(text.slice(0, place)).size).toBe(0);
    }
    expect(digestsFromText(`${text}x`).size).toBe(0);
  });

  it('says nothing of a blob by a line of another form', () => {
    const forged = [
      { ...digest, sha256: `../../../${'a'.repeat(55)}` },
      { ...digest, bytes: -1 },
      { ...digest, kind: 'link' as 'content' },
    ];
    for (const wrong of forged)
      expect(
        digestsFromText(
          digestsToText(
            new Map([
              [one, wrong],
              [two, pointer],
            ]),
          ),
        ),
      ).toEqual(new Map([[two, pointer]]));
  });

  it('lets the oldest go above 200 000 entries', () => {
    const many = new Map(
      Array.from({ length: 200_001 }, (_, place) => [place.toString(16).padStart(40, '0'), digest]),
    );
    const kept = digestsFromText(digestsToText(many));
    expect(kept.size).toBe(200_000);
    expect(kept.has('0'.repeat(40))).toBe(false);
  });
});

const at = (folder: string) => ({ own: join(folder, 'stoplog'), others: [] });

describe('openDigestMemory', () => {
  let folder: string;
  beforeEach(async () => {
    folder = await mkdtemp(join(tmpdir(), 'stoplog-test-'));
  });
  afterEach(async () => {
    await chmod(folder, 0o755);
    await rm(folder, { recursive: true });
  });

  it('keeps what it was given, in one file', async () => {
    const memory = await openDigestMemory(at(folder));
    memory.set(one, digest);
    await memory.save();
    expect((await openDigestMemory(at(folder))).get(one)).toEqual(digest);
    expect(await readdir(join(folder, 'stoplog'))).toEqual(['digests']);
  });

  it('writes nothing when nothing is new', async () => {
    await (await openDigestMemory(at(folder))).save();
    expect(await readdir(folder)).toEqual([]);
  });

  it('keeps what two runs found at once', async () => {
    const runs = await Promise.all(Array.from({ length: 8 }, () => openDigestMemory(at(folder))));
    for (const [place, run] of runs.entries()) {
      run.set(`${place}`.repeat(40), digest);
      await run.save();
    }
    const after = await openDigestMemory(at(folder));
    expect(runs.map((_, place) => after.get(`${place}`.repeat(40)))).toEqual(runs.map(() => digest));
  });

  it('leaves a whole file when runs save in the same moment', async () => {
    const runs = await Promise.all(Array.from({ length: 8 }, () => openDigestMemory(at(folder))));
    await Promise.all(
      runs.map((run, place) => {
        run.set(`${place}`.repeat(40), digest);
        return run.save();
      }),
    );
    expect(await readdir(join(folder, 'stoplog'))).toEqual(['digests']);
    const kept = digestsFromText(await readFile(join(folder, 'stoplog', 'digests'), 'latin1'));
    expect(kept.size).toBeGreaterThanOrEqual(1);
  });

  it('keeps in its own folder what it found in others, once asked for', async () => {
    const other = { own: join(folder, 'other'), others: [] };
    const before = await openDigestMemory(other);
    before.set(one, digest);
    before.set(two, pointer);
    await before.save();
    const memory = await openDigestMemory({ ...at(folder), others: [join(folder, 'none'), other.own] });
    expect(memory.get(two)).toEqual(pointer);
    expect(memory.get('3'.repeat(40))).toBeUndefined();
    await memory.save();
    const after = await openDigestMemory(at(folder));
    expect([after.get(one), after.get(two)]).toEqual([undefined, pointer]);
  });

  it('begins anew from a broken file', async () => {
    await mkdir(join(folder, 'stoplog'));
    await writeFile(join(folder, 'stoplog', 'digests'), 'stoplog digests 1\nrubbish');
    const memory = await openDigestMemory(at(folder));
    expect(memory.get(one)).toBeUndefined();
    memory.set(one, digest);
    await memory.save();
    expect((await openDigestMemory(at(folder))).get(one)).toEqual(digest);
  });

  it('does without where the folder cannot be made', async () => {
    // A file in its place refuses everybody, the administrator too.
    await writeFile(join(folder, 'stoplog'), '');
    const memory = await openDigestMemory(at(folder));
    memory.set(one, digest);
    await memory.save();
    expect(memory.get(one)).toEqual(digest);
    expect(await readdir(folder)).toEqual(['stoplog']);
  });
});
