import { mkdir, mkdtemp, realpath, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { duringHook, type HookSurroundings } from '../harness/during-hook.ts';
import { gitIn, type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';
import { asTree, inSnapshot, textOf } from './in-snapshot.ts';

const index = { kind: 'index' } as const;

describe('in a pre-commit hook', () => {
  let repository: TemporaryRepository;
  let hook: string;
  beforeEach(async () => {
    repository = await temporaryRepository({ 'a.csv': 'a1\n', 'b.csv': 'b1\n', 'sub/c.csv': 'c1\n' });
    hook = join(repository.folder, '.git/hooks/pre-commit');
  });
  afterEach(() => repository.remove());

  /** The index as the hook sees it, beside the tree of the commit that follows. */
  async function seen(...commit: string[]) {
    const { tree, text } = await duringHook(
      hook,
      () => repository.git('commit', '--quiet', ...commit),
      (surroundings) =>
        inSnapshot(surroundings, index, async (snapshot) => ({
          tree: asTree(snapshot),
          text: await Promise.all(['a.csv', 'b.csv'].map((path) => textOf(snapshot, path))),
        })),
    );
    expect(tree).toBe(await repository.git('ls-tree', '-r', 'HEAD'));
    return text;
  }

  it('sees what is staged and not the work tree', async () => {
    await repository.write('a.csv', 'a2\n');
    await repository.git('add', 'a.csv');
    await repository.write('a.csv', 'a3\n');
    await repository.write('b.csv', 'b3\n');
    expect(await seen('-m', 'staged')).toEqual(['a2\n', 'b1\n']);
  });

  it('sees every edit of a tracked file under commit -a', async () => {
    await repository.write('a.csv', 'a2\n');
    await rm(join(repository.folder, 'sub/c.csv'));
    expect(await seen('-a', '-m', 'all')).toEqual(['a2\n', 'b1\n']);
  });

  it('sees only the named file under commit PATH, whatever else is staged', async () => {
    await repository.write('a.csv', 'a2\n');
    await repository.write('b.csv', 'b2\n');
    await repository.git('add', 'b.csv');
    expect(await seen('-m', 'one', '--', 'a.csv')).toEqual(['a2\n', 'b1\n']);
  });

  it('sees the whole state under an amend that changes nothing', async () => {
    expect(await seen('--amend', '-m', 'reworded')).toEqual(['a1\n', 'b1\n']);
  });

  it('sees the merged state when a conflict was resolved', async () => {
    await repository.git('checkout', '--quiet', '-b', 'other');
    await repository.write('a.csv', 'theirs\n');
    await repository.git('commit', '--quiet', '-a', '-m', 'theirs');
    await repository.git('checkout', '--quiet', 'main');
    await repository.write('a.csv', 'ours\n');
    await repository.git('commit', '--quiet', '-a', '-m', 'ours');
    await expect(repository.git('merge', 'other')).rejects.toThrow(/CONFLICT/);
    await repository.write('a.csv', 'both\n');
    await repository.git('add', 'a.csv');
    expect(await seen('-m', 'merged')).toEqual(['both\n', 'b1\n']);
  });

  it('sees a file removed from the index although it is still on disk', async () => {
    await repository.git('rm', '--quiet', '--cached', 'a.csv');
    expect(await seen('-m', 'untracked')).toEqual(['absent', 'b1\n']);
  });

  it('works in the first commit of all', async () => {
    const fresh = await temporaryRepository();
    await fresh.write('a.csv', 'first\n');
    await fresh.git('add', 'a.csv');
    const state = await duringHook(
      join(fresh.folder, '.git/hooks/pre-commit'),
      () => fresh.git('commit', '--quiet', '-m', 'first'),
      (surroundings) =>
        inSnapshot(surroundings, index, async (snapshot) => ({
          commit: snapshot.commit,
          before: await snapshot.readBefore('a.csv'),
          text: await textOf(snapshot, 'a.csv'),
        })),
    );
    expect(state).toEqual({ commit: null, before: null, text: 'first\n' });
    await fresh.remove();
  });

  it('works from a folder below the top', async () => {
    const git = gitIn(join(repository.folder, 'sub'));
    await repository.write('a.csv', 'a2\n');
    const inSub = ({ cwd, environment }: HookSurroundings) =>
      inSnapshot({ cwd: join(cwd, 'sub'), environment }, index, (snapshot) => textOf(snapshot, 'a.csv'));
    expect(await duringHook(hook, () => git('commit', '--quiet', '-a', '-m', 'x'), inSub)).toBe('a2\n');
  });

  it('takes the state of a linked work tree, not of the main one', async () => {
    const linked = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
    await repository.git('worktree', 'add', '--quiet', '-b', 'side', join(linked, 'tree'));
    const there = { ...repository, folder: join(linked, 'tree'), git: gitIn(join(linked, 'tree')) };
    await repository.write('a.csv', 'main edit\n');
    await repository.git('add', 'a.csv');
    await there.git('mv', 'b.csv', 'd.csv');
    const seenThere = await duringHook(
      hook,
      () => there.git('commit', '--quiet', '-m', 'side'),
      (surroundings) => {
        expect(surroundings.environment.GIT_DIR).toBe(join(repository.folder, '.git/worktrees/tree'));
        return inSnapshot(surroundings, index, asTree);
      },
    );
    expect(seenThere).toBe(await there.git('ls-tree', '-r', 'HEAD'));
    expect(seenThere).toContain('d.csv');
    await rm(linked, { recursive: true });
  });

  it('takes the state of a submodule, not of the repository that holds it', async () => {
    await repository.git(
      '-c',
      'protocol.file.allow=always',
      'submodule',
      '--quiet',
      'add',
      repository.folder,
      'inner',
    );
    const inner = gitIn(join(repository.folder, 'inner'));
    await mkdir(join(repository.folder, '.git/modules/inner/hooks'), { recursive: true });
    await repository.write('inner/a.csv', 'inner edit\n');
    const seenInside = await duringHook(
      join(repository.folder, '.git/modules/inner/hooks/pre-commit'),
      () => inner('commit', '--quiet', '-a', '-m', 'inside'),
      (surroundings) => inSnapshot(surroundings, index, asTree),
    );
    expect(seenInside).toBe(await inner('ls-tree', '-r', 'HEAD'));
  });
});

describe('in hooks of other kinds', () => {
  it('reads a pushed commit while its objects are in quarantine', async () => {
    const server = await temporaryRepository({}, ['--bare']);
    const clone = await temporaryRepository({ 'a.csv': 'pushed\n' });
    const pushed = (await clone.git('rev-parse', 'HEAD')).trim();
    const read = await duringHook(
      join(server.folder, 'hooks/pre-receive'),
      () => clone.git('push', '--quiet', server.folder, 'main'),
      async (surroundings) => {
        expect(surroundings.environment.GIT_QUARANTINE_PATH).toBeDefined();
        const revision = surroundings.input.split(' ')[1] ?? '';
        expect(revision).toBe(pushed);
        return inSnapshot(surroundings, { kind: 'revision', revision }, (snapshot) =>
          textOf(snapshot, 'a.csv'),
        );
      },
    );
    expect(read).toBe('pushed\n');
    await Promise.all([server.remove(), clone.remove()]);
  });

  it('reads what a clean merge will commit', async () => {
    const repository = await temporaryRepository({ 'a.csv': 'a1\n' });
    await repository.git('checkout', '--quiet', '-b', 'other');
    await repository.write('b.csv', 'b1\n');
    await repository.git('add', 'b.csv');
    await repository.git('commit', '--quiet', '-m', 'other');
    await repository.git('checkout', '--quiet', 'main');
    const seen = await duringHook(
      join(repository.folder, '.git/hooks/pre-merge-commit'),
      () => repository.git('merge', '--quiet', '--no-ff', 'other'),
      (surroundings) => inSnapshot(surroundings, index, asTree),
    );
    expect(seen).toBe(await repository.git('ls-tree', '-r', 'HEAD'));
    expect(seen).toContain('b.csv');
    await repository.remove();
  });
});
