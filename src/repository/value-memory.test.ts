import { mkdtemp, readdir, readFile, rm, stat, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { OfAnotherPart } from './part.ts';
import { forgetfulValues, openValueMemory } from './value-memory.ts';

const one = '1'.repeat(64);
const two = '2'.repeat(64);

const at = (folder: string) => ({ own: join(folder, 'stoplog'), others: [] });

describe('values kept between runs', () => {
  let folder: string;
  let file: string;
  beforeEach(async () => {
    folder = await mkdtemp(join(tmpdir(), 'stoplog-test-'));
    file = join(folder, 'stoplog', 'values');
  });
  afterEach(() => rm(folder, { recursive: true }));

  /** What a run answers, and whether it had to compute. */
  async function ask(key: string, value: unknown) {
    const memory = openValueMemory(at(folder));
    let computed = 0;
    const answer = await memory.remember(key, async () => {
      computed++;
      return value;
    });
    await memory.save();
    return { answer, computed };
  }

  it('are computed once', async () => {
    const value = { rows: 5113, name: 'Fußweg\nand more', share: 0.1 + 0.2, gone: null };
    expect(await ask(one, value)).toEqual({ answer: value, computed: 1 });
    expect(await ask(one, 'another')).toEqual({ answer: value, computed: 0 });
    expect(await readdir(join(folder, 'stoplog'))).toEqual(['values']);
  });

  it('are the same the first time as ever after', async () => {
    const { answer } = await ask(one, { mean: Number.NaN, unsaid: undefined });
    expect(answer).toStrictEqual({ mean: null });
    expect((await ask(one, null)).answer).toStrictEqual(answer);
  });

  it('are computed once for all who ask at the same time', async () => {
    const { remember } = forgetfulValues();
    let computed = 0;
    const compute = async () => ++computed;
    expect(await Promise.all([remember(one, compute), remember(one, compute)])).toEqual([1, 1]);
  });

  it('of two runs at once are all kept', async () => {
    const runs = [one, two].map((key) => ({ key, memory: openValueMemory(at(folder)) }));
    for (const { key, memory } of runs) await memory.remember(key, async () => key);
    for (const { memory } of runs) await memory.save();
    expect([(await ask(one, '')).computed, (await ask(two, '')).computed]).toEqual([0, 0]);
  });

  it('leave a whole file when runs save in the same moment', async () => {
    const runs = Array.from({ length: 8 }, () => openValueMemory(at(folder)));
    for (const [place, { remember }] of runs.entries())
      await remember(`${place}`.repeat(64), async () => place);
    await Promise.all(runs.map((run) => run.save()));
    expect(await readdir(join(folder, 'stoplog'))).toEqual(['values']);
    const lines = (await readFile(file, 'utf8')).trimEnd().split('\n');
    expect(lines.length).toBeGreaterThanOrEqual(3);
  });

  it('are computed anew when the file was altered', async () => {
    await ask(one, 'rain');
    await writeFile(file, (await readFile(file, 'utf8')).replace('rain', 'drought'));
    expect(await ask(one, 'rain')).toEqual({ answer: 'rain', computed: 1 });
    expect((await ask(one, '')).computed).toBe(0);
  });

  it('are given all the same where the folder cannot be made', async () => {
    await writeFile(join(folder, 'stoplog'), '');
    expect(await ask(one, 'rain')).toEqual({ answer: 'rain', computed: 1 });
  });

  it('let those go that were not asked for longest', async () => {
    const large = 'x'.repeat(6 * 2 ** 20);
    await ask(one, large);
    await ask(two, large);
    const memory = openValueMemory(at(folder));
    await memory.remember(one, async () => 'not asked');
    await memory.remember('3'.repeat(64), async () => large);
    await memory.save();
    expect((await stat(file)).size).toBeLessThan(16 * 2 ** 20);
    expect((await ask(one, '')).computed).toBe(0);
    expect((await ask(two, '')).computed).toBe(1);
  });

  it('of other folders are taken over, once asked for', async () => {
    await ask(one, 'rain');
    const mine = { own: join(folder, 'mine'), others: [join(folder, 'none'), join(folder, 'stoplog')] };
    const memory = openValueMemory(mine);
    expect(await memory.remember(one, async () => 'computed')).toBe('rain');
    await memory.save();
    const again = openValueMemory({ ...mine, others: [] });
    expect(await again.remember(one, async () => 'computed')).toBe('rain');
  });

  it('of a part are its own, and those that were kept before', async () => {
    await ask(one, 'rain');
    const parts = [1, 2].map((number) =>
      openValueMemory(
        { own: join(folder, `${number}`), others: [join(folder, 'stoplog')] },
        { part: { number, of: 2 } },
      ),
    );
    for (const { remember } of parts) expect(await remember(one, async () => 'computed')).toBe('rain');
    const answers = await Promise.allSettled(parts.map(({ remember }) => remember(two, async () => 'flow')));
    expect(answers.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    expect(answers).toContainEqual({ status: 'rejected', reason: expect.any(OfAnotherPart) });
  });

  it('that could not be computed are no value', async () => {
    const memory = openValueMemory(at(folder));
    const failed = memory.remember(one, async () => {
      throw new Error('unreadable');
    });
    await expect(failed).rejects.toThrow('unreadable');
    await memory.save();
    expect((await ask(one, 'rain')).computed).toBe(1);
  });
});
