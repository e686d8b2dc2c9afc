import { chmod, cp, mkdtemp, readdir, readFile, rename, rm, symlink } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Snapshot } from '../../src/repository/snapshot.ts';
import { gitIn, type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';
import { asTree, inSnapshot, textOf } from './in-snapshot.ts';

const workTree = { kind: 'worktree' } as const;
const names = { alsoUntracked: ['stoplog.yaml', 'stoplog.seals.json'] };

let repository: TemporaryRepository;
beforeEach(async () => {
  repository = await temporaryRepository({
    'a.csv': 'a1\n',
    'b.csv': 'b1\n',
    'sub/c.csv': 'c1\n',
    'empty.txt': '',
  });
});
afterEach(() => repository.remove());

const open = <Answer>(use: (snapshot: Snapshot) => Answer | Promise<Answer>) =>
  inSnapshot({ cwd: repository.folder, environment: repository.environment }, workTree, use, names);

/** The tree that `git add --update` gives in a copy of the repository. */
async function asGitAddStores(): Promise<string> {
  const copy = await mkdtemp(join(tmpdir(), 'stoplog-test-'));
  await cp(repository.folder, copy, { recursive: true, verbatimSymlinks: true, preserveTimestamps: true });
  const git = gitIn(copy);
  await git('add', '--update');
  const tree = await git('ls-tree', '-r', (await git('write-tree')).trim());
  await rm(copy, { recursive: true });
  return tree;
}

/** Every file below the git directory with its bytes. */
async function gitDirectoryContent(): Promise<Map<string, string>> {
  const folder = join(repository.folder, '.git');
  const found = await readdir(folder, { recursive: true, withFileTypes: true });
  const files = found.filter((entry) => entry.isFile()).map((entry) => join(entry.parentPath, entry.name));
  return new Map(await Promise.all(files.map(async (file) => [file, await readFile(file, 'hex')] as const)));
}

describe('the work tree as git add would store it', () => {
  it('is the commit where nothing was edited', async () => {
    expect(await open(asTree)).toBe(await repository.git('ls-tree', '-r', 'HEAD'));
  });

  it('has edits, deletions, new modes, links and folders in the place of files', async () => {
    await repository.write('a.csv', 'a2\n');
    await rm(join(repository.folder, 'sub/c.csv'));
    await chmod(join(repository.folder, 'b.csv'), 0o755);
    await rm(join(repository.folder, 'empty.txt'));
    await symlink('a.csv', join(repository.folder, 'empty.txt'));
    const tree = await open(asTree);
    expect(tree).toBe(await asGitAddStores());
    expect(tree).toMatch(/100755 blob \w+\tb\.csv\n120000 blob \w+\tempty\.txt\n$/);
  });

  it('never reads through a folder that became a link', async () => {
    await rename(join(repository.folder, 'sub'), join(repository.folder, 'moved'));
    await symlink('/tmp', join(repository.folder, 'sub'));
    expect(await open((snapshot) => [...snapshot.entries.keys()])).toEqual(['a.csv', 'b.csv', 'empty.txt']);
  });

  it('has the content that filters would store', async () => {
    await repository.write(
      '.gitattributes',
      '*.csv text eol=crlf\n*.txt ident\n*.u16 working-tree-encoding=UTF-16LE\n*.low filter=low\n',
    );
    await repository.git('config', 'filter.low.clean', 'tr A-Z a-z');
    await repository.write('ident.txt', 'x\n');
    await repository.write('wide.u16', Buffer.from('x\n', 'utf16le'));
    await repository.write('loud.low', 'x\n');
    await repository.git('add', '.');
    await repository.git('commit', '--quiet', '-m', 'filters');
    await repository.write('a.csv', 'a2\r\nb2\r\n');
    await repository.write('ident.txt', '$Id: 0123456789 $\n');
    await repository.write('wide.u16', Buffer.from('é\n', 'utf16le'));
    await repository.write('loud.low', 'LOUD\n');
    const texts = await open(async (snapshot) => ({
      tree: asTree(snapshot),
      csv: await textOf(snapshot, 'a.csv'),
      ident: await textOf(snapshot, 'ident.txt'),
      wide: await textOf(snapshot, 'wide.u16'),
      loud: await textOf(snapshot, 'loud.low'),
    }));
    expect(texts).toEqual({
      tree: await asGitAddStores(),
      csv: 'a2\nb2\n',
      ident: '$Id$\n',
      wide: 'é\n',
      loud: 'loud\n',
    });
  });

  it('sees an edit of the same size made just after git add', async () => {
    // The index is written within the same tick of the clock as the file; git must not trust times alone.
    for (let round = 0; round < 5; round += 1) {
      await repository.write('a.csv', `x${round}\n`);
      await repository.git('add', 'a.csv');
      await repository.write('a.csv', `y${round}\n`);
      expect(await open((snapshot) => textOf(snapshot, 'a.csv'))).toBe(`y${round}\n`);
    }
  });

  it('has the content on disk of files added with intent only', async () => {
    await repository.write('new.csv', 'new\n');
    await repository.git('add', '--intent-to-add', 'new.csv');
    const state = await open(async ({ intentToAdd, entries, ...rest }) => ({
      intentToAdd,
      entry: entries.has('new.csv'),
      text: await textOf({ intentToAdd, entries, ...rest }, 'new.csv'),
    }));
    expect(state).toEqual({ intentToAdd: [], entry: true, text: 'new\n' });
  });

  it('has the content on disk of files in conflict', async () => {
    await repository.git('checkout', '--quiet', '-b', 'other');
    await repository.write('a.csv', 'theirs\n');
    await repository.git('commit', '--quiet', '-a', '-m', 'theirs');
    await repository.git('checkout', '--quiet', 'main');
    await repository.write('a.csv', 'ours\n');
    await repository.git('commit', '--quiet', '-a', '-m', 'ours');
    await expect(repository.git('merge', 'other')).rejects.toThrow();
    expect(await open((snapshot) => textOf(snapshot, 'a.csv'))).toMatch(
      /^<<<<<<< HEAD\nours\n=======\ntheirs\n/,
    );
    expect(await open((snapshot) => snapshot.unmerged)).toEqual([]);
    expect(await repository.git('ls-files', '--unmerged')).not.toBe('');
  });

  it.each([
    ['set', '--no-cone', '/*', '!/sub/'],
    ['set', '--cone', '--sparse-index', 'elsewhere'],
  ])('keeps what sparse checkout left out (sparse-checkout %s %s)', async (...args) => {
    await repository.git('sparse-checkout', ...args);
    expect(await readdir(repository.folder)).not.toContain('sub');
    expect(await open((snapshot) => textOf(snapshot, 'sub/c.csv'))).toBe('c1\n');
  });

  it('passes over edits that git was told to overlook, as git add does', async () => {
    await repository.git('update-index', '--assume-unchanged', 'a.csv');
    await repository.write('a.csv', 'a2 is longer\n');
    expect(await open(asTree)).toBe(await asGitAddStores());
    expect(await open((snapshot) => textOf(snapshot, 'a.csv'))).toBe('a1\n');
  });

  it('reads a split index', async () => {
    await repository.git('config', 'core.splitIndex', 'true');
    await repository.git('update-index', '--split-index');
    await repository.write('a.csv', 'a2\n');
    const before = await gitDirectoryContent();
    expect(await open((snapshot) => textOf(snapshot, 'a.csv'))).toBe('a2\n');
    expect(await gitDirectoryContent()).toEqual(before);
  });
});

describe('untracked files', () => {
  it('are named, and content only where the caller asked for their name', async () => {
    await repository.write('.gitignore', 'ignored/\n');
    await repository.write('new.csv', 'new\n');
    await repository.write('ignored/stoplog.yaml', 'stoplog: 1\n');
    await repository.write('stoplog.yaml', 'stoplog: 1\n');
    await repository.write('models/odd name/stoplog.yaml', 'stoplog: 1\n');
    await repository.write('models/my-stoplog.yaml', 'stoplog: 1\n');
    await repository.git('init', '--quiet', 'inside/stoplog.yaml');
    await repository.write('inside/stoplog.yaml/x.csv', '1\n');
    const state = await open(async (snapshot) => ({
      untracked: snapshot.untracked,
      added: [...snapshot.entries.keys()].filter((path) => path.endsWith('stoplog.yaml')),
      text: await textOf(snapshot, 'stoplog.yaml'),
      other: await textOf(snapshot, 'new.csv'),
    }));
    expect(state).toEqual({
      untracked: ['.gitignore', 'models/my-stoplog.yaml', 'new.csv'],
      added: ['models/odd name/stoplog.yaml', 'stoplog.yaml'],
      text: 'stoplog: 1\n',
      other: 'absent',
    });
    expect(await repository.git('diff', '--cached')).toBe('');
  });

  it('may be all there is', async () => {
    const fresh = await temporaryRepository();
    await fresh.write('stoplog.yaml', 'stoplog: 1\n');
    await fresh.write('a.csv', '1\n');
    const state = await inSnapshot(
      { cwd: fresh.folder, environment: fresh.environment },
      workTree,
      ({ entries, untracked, commit }) => ({ entries: [...entries.keys()], untracked, commit }),
      names,
    );
    expect(state).toEqual({ entries: ['stoplog.yaml'], untracked: ['a.csv'], commit: null });
    await fresh.remove();
  });
});

describe('what is written', () => {
  it('is nothing but the memory of digests, and no hook of the user runs', async () => {
    await repository.write('a.csv', 'a2\n');
    await repository.write('b.csv', 'b2\n');
    await repository.git('add', 'b.csv');
    await repository.write('stoplog.yaml', 'stoplog: 1\n');
    const told = join(repository.folder, '.git/told');
    await repository.hook('post-index-change', `echo changed >> '${told}'`);
    const before = await gitDirectoryContent();
    for (const at of [
      workTree,
      { kind: 'index' } as const,
      { kind: 'revision', revision: 'HEAD' } as const,
    ]) {
      await inSnapshot(
        { cwd: repository.folder, environment: repository.environment },
        at,
        (snapshot) => snapshot.identify(snapshot.entries.keys()),
        names,
      );
    }
    const after = await gitDirectoryContent();
    after.delete(join(repository.folder, '.git/stoplog/digests'));
    expect(after).toEqual(before);
    expect(await repository.git('status', '--short')).toBe(' M a.csv\nM  b.csv\n?? stoplog.yaml\n');
  });

  it('leaves no temporary file, also where the work tree cannot be stored', async () => {
    const temporary = await mkdtemp(join(tmpdir(), 'stoplog-test-'));
    vi.stubEnv('TMPDIR', temporary);
    await repository.write('a.csv', 'a2\n');
    await open((snapshot) => snapshot.identify(['a.csv']));
    await repository.write('.gitattributes', 'b.csv filter=gone\n');
    await repository.git('config', 'filter.gone.clean', 'no-such-program');
    await repository.git('config', 'filter.gone.required', 'true');
    await repository.write('b.csv', 'b2\n');
    await expect(open(asTree)).rejects.toMatchObject({
      code: 'git-failed',
      message: expect.stringContaining('no-such-program'),
      next: expect.stringContaining("'gone'"),
    });
    vi.unstubAllEnvs();
    expect(await readdir(temporary)).toEqual([]);
    await rm(temporary, { recursive: true });
  });
});
