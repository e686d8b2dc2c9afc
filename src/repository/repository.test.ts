import { chown, mkdtemp, realpath, rm, symlink } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { gitIn, type TemporaryRepository, temporaryRepository } from '../../tests/harness/repository.ts';
import { layout, openRepository } from './repository.ts';

let repository: TemporaryRepository;
let folder: string;
beforeEach(async () => {
  repository = await temporaryRepository({ 'a.csv': '1\n', 'sub/b.csv': '2\n' });
  folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
});
afterEach(async () => {
  await repository.remove();
  await rm(folder, { recursive: true });
});

const open = (cwd: string, more: NodeJS.ProcessEnv = {}) =>
  openRepository(cwd, { ...repository.environment, ...more });

describe('openRepository', () => {
  it('finds the top and the git directory from any folder below', async () => {
    const git = join(repository.folder, '.git');
    for (const here of ['', 'sub']) {
      expect(await open(join(repository.folder, here))).toMatchObject({
        here,
        ...{
          cwd: repository.folder,
          top: repository.folder,
          bare: false,
          shallow: false,
          objectFormat: 'sha1',
        },
        ...{ gitDirectory: git, commonDirectory: git },
        ...{ objectsFolder: join(git, 'objects'), indexFile: join(git, 'index') },
      });
    }
  });

  it('finds the top through a link into the repository', async () => {
    await symlink(join(repository.folder, 'sub'), join(folder, 'link'));
    expect(await open(join(folder, 'link'))).toMatchObject({ top: repository.folder, here: 'sub' });
  });

  it('makes paths absolute that git gave relative to a hook', async () => {
    const { environment, indexFile } = await open(repository.folder, {
      GIT_INDEX_FILE: '.git/index.lock',
      GIT_DIR: '.git',
    });
    expect(indexFile).toBe(join(repository.folder, '.git/index.lock'));
    expect(environment).toMatchObject({
      GIT_INDEX_FILE: indexFile,
      GIT_DIR: join(repository.folder, '.git'),
    });
  });

  it('knows a linked work tree by its own git directory and the common one', async () => {
    const tree = join(folder, 'tree');
    await repository.git('worktree', 'add', '--quiet', '--detach', tree);
    const git = join(repository.folder, '.git');
    expect(await open(tree)).toMatchObject({
      ...{ top: tree, gitDirectory: join(git, 'worktrees/tree'), commonDirectory: git },
      indexFile: join(git, 'worktrees/tree/index'),
    });
  });

  it('knows a submodule as a repository of its own', async () => {
    await repository.git(
      '-c',
      'protocol.file.allow=always',
      'submodule',
      '--quiet',
      'add',
      repository.folder,
      'inner',
    );
    const git = join(repository.folder, '.git/modules/inner');
    expect(await open(join(repository.folder, 'inner/sub'))).toMatchObject({
      ...{ top: join(repository.folder, 'inner'), gitDirectory: git, commonDirectory: git },
    });
  });

  it('has no top in a bare repository or in the git directory', async () => {
    await gitIn(folder)('clone', '--quiet', '--bare', repository.folder, 'bare.git');
    const bare = join(folder, 'bare.git');
    expect(await open(bare)).toMatchObject({
      top: null,
      here: '',
      bare: true,
      cwd: bare,
    });
    const inside = join(repository.folder, '.git');
    expect(await open(inside)).toMatchObject({ top: null, bare: false, cwd: inside });
  });

  it('knows the object format', async () => {
    const other = await temporaryRepository({}, ['--object-format=sha256']);
    expect((await open(other.folder)).objectFormat).toBe('sha256');
    await other.remove();
  });

  it('says that a folder is in no repository', async () => {
    await expect(open(folder)).rejects.toMatchObject({
      code: 'no-repository',
      next: expect.stringContaining('git init'),
    });
  });

  it.skipIf(process.getuid?.() !== 0)(
    'says what to do where another user owns it (only root can give it away)',
    async () => {
      await chown(repository.folder, 65534, 65534);
      await expect(open(repository.folder)).rejects.toMatchObject({
        code: 'git-failed',
        next: expect.stringContaining(`safe.directory '${repository.folder}'`),
      });
      const trusted = { GIT_CONFIG_COUNT: '1', GIT_CONFIG_KEY_0: 'safe.directory', GIT_CONFIG_VALUE_0: '*' };
      expect((await open(repository.folder, { ...trusted, GIT_CONFIG_GLOBAL: '/dev/null' })).top).toBe(
        repository.folder,
      );
    },
  );

  it('refuses a description of the repository that it cannot tell apart', () => {
    const lines = ['false', 'false', 'sha1', '/a\n/b/.git', '/a\n/b/.git', '/x', '/y', ''];
    expect(() => layout.parse(Buffer.from(`${lines.join('\n')}\n`), 0)).toThrow(/could not be read/);
    // git 2.30 hands back an option that it does not know.
    expect(() =>
      layout.parse(Buffer.from('--path-format=absolute\nfalse\nfalse\nsha1\n.git\n.git\n'), 0),
    ).toThrow();
  });
});

describe('identity', () => {
  it('is the committer', async () => {
    const { identity } = await open(repository.folder);
    expect(await identity()).toBe('Test Modeller <modeller@northmere.example>');
  });

  it('may come from the configuration', async () => {
    const { GIT_COMMITTER_NAME, GIT_COMMITTER_EMAIL, ...environment } = repository.environment;
    await repository.git('config', 'user.name', 'Flüß Keeper 7');
    await repository.git('config', 'user.email', 'keeper@northmere.example');
    const { identity } = await openRepository(repository.folder, environment);
    expect(await identity()).toBe('Flüß Keeper 7 <keeper@northmere.example>');
  });

  it('is never made up from the name of the machine', async () => {
    const { GIT_COMMITTER_NAME, GIT_COMMITTER_EMAIL, ...environment } = repository.environment;
    const { identity } = await openRepository(repository.folder, environment);
    await expect(identity()).rejects.toMatchObject({
      code: 'no-identity',
      next: expect.stringContaining('user.email'),
    });
  });
});

describe('resolve', () => {
  it('gives the commit of a branch, an abbreviated id and a tag', async () => {
    const commit = (await repository.git('rev-parse', 'HEAD')).trim();
    await repository.git('tag', '--annotate', '--message', 'x', 'v1');
    const { resolve } = await open(repository.folder);
    expect(await Promise.all(['HEAD', 'main', 'v1', commit.slice(0, 8), commit].map(resolve))).toEqual(
      Array(5).fill(commit),
    );
  });

  it.each(['nowhere', '', '--all', 'HEAD:a.csv', 'HEAD~7', 'main..main', '0'.repeat(40)])(
    'says that %j names no commit',
    async (revision) => {
      const { resolve } = await open(repository.folder);
      await expect(resolve(revision)).rejects.toMatchObject({
        code: 'unknown-revision',
        message: expect.stringContaining(JSON.stringify(revision)),
      });
    },
  );
});
