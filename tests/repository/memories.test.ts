import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { openMemories, type Remembering } from '../../src/repository/memories.ts';
import { openSnapshot } from '../../src/repository/open-snapshot.ts';
import { openRepository } from '../../src/repository/repository.ts';
import { type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';

const files = { 'a.csv': 'a'.repeat(5000), 'b.csv': 'b'.repeat(4000), 'c.csv': 'c'.repeat(3000) };

describe('what one run knows', () => {
  let repository: TemporaryRepository;
  beforeEach(async () => {
    repository = await temporaryRepository(files);
  });
  afterEach(() => repository.remove());

  /** Files digested in each of some states, which one run opens and asks about one after the other. */
  async function digested(states: readonly (readonly string[])[], remembering: Remembering = {}) {
    const opened = await openRepository(repository.folder, repository.environment);
    const memories = await openMemories(opened, remembering);
    const told: string[][] = [];
    const snapshots = await Promise.all(
      states.map((_, place) => {
        told.push([]);
        const progress = (text: string) => told[place]?.push(text);
        return openSnapshot(opened, { kind: 'worktree' }, { memories, progress });
      }),
    );
    for (const [place, paths] of states.entries()) await snapshots[place]?.identify(paths);
    for (const snapshot of snapshots) await snapshot.close();
    return told.map((texts) => texts.length);
  }

  it('of one state, it knows of another', async () => {
    await repository.write('d.csv', 'd'.repeat(4500));
    await repository.git('add', '.');
    const [some, all] = [Object.keys(files), [...Object.keys(files), 'd.csv']];
    expect(await digested([some, all, all], { remember: false })).toEqual([3, 1, 0]);
    expect(await digested([some, all])).toEqual([3, 1]);
    expect(await digested([all])).toEqual([0]);
  });

  it('leaves it agreed between parts who reads a file that only a later state holds', async () => {
    await repository.write('d.csv', 'd'.repeat(4500));
    await repository.git('add', '.');
    const [some, all] = [Object.keys(files), [...Object.keys(files), 'd.csv']];
    const shares: number[][] = [];
    for (const number of [1, 2]) shares.push(await digested([some, all], { sharing: { number, of: 2 } }));
    // By size, largest first, to whoever has less: a | b, c; and of all four: a, c | d, b.
    expect(shares).toEqual([
      [1, 0],
      [2, 1],
    ]);
  });
});

it('asks git nothing more once a state is closed, so that a run that failed ends', async () => {
  const repository = await temporaryRepository(files);
  const opened = await openRepository(repository.folder, repository.environment);
  const snapshot = await openSnapshot(opened, { kind: 'revision', revision: 'HEAD' });
  await snapshot.close();
  await expect(snapshot.read('a.csv')).rejects.toThrow(/closed/);
  await expect(snapshot.identify(['b.csv'])).rejects.toThrow(/closed/);
  await repository.remove();
});
