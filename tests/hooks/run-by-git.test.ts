import { chmod, copyFile, mkdir, readFile, symlink, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { addHooks } from '../../src/commands/hook/add.ts';
import { openRepository } from '../../src/repository/repository.ts';
import {
  cleanEnvironment,
  gitIn,
  type TemporaryRepository,
  temporaryRepository,
} from '../harness/repository.ts';
import { type StandIn, standIn } from './stand-in.ts';

let stoplog: StandIn;
let repository: TemporaryRepository;
/** git in the repository, with little on PATH. */
let git: (...words: string[]) => Promise<string>;

beforeAll(async () => {
  stoplog = await standIn();
});
afterAll(() => stoplog.remove());

beforeEach(async () => {
  repository = await temporaryRepository({ 'rain.csv': '1\n', 'flow.csv': '1\n' });
  git = gitIn(repository.folder, stoplog.everyday);
  await stoplog.endWith(0);
  await stoplog.calls();
});
afterEach(() => repository.remove());

const add = async (folder = repository.folder) =>
  addHooks(await openRepository(folder, cleanEnvironment(stoplog.everyday)));
const commitOf = async (revision: string) => (await git('rev-parse', `${revision}^{commit}`)).trim();
const treeOf = async (revision: string) => (await git('rev-parse', `${revision}^{tree}`)).trim();
const index = ['check', '--brief', '--if-touched', '--at', 'index'];

describe('git commit', () => {
  beforeEach(() => add());

  it('checks the index that the commit will have, at the top of the work tree', async () => {
    await repository.write('model/rain.csv', '2\n');
    await git('add', '.');
    await gitIn(join(repository.folder, 'model'), stoplog.everyday)('commit', '-m', 'x');
    const [call, ...more] = await stoplog.calls();
    expect(more).toEqual([]);
    expect(call).toMatchObject({ words: index, cwd: repository.folder, tree: await treeOf('HEAD') });
    expect(call?.environment).toMatchObject({ GIT_INDEX_FILE: '.git/index', GIT_PREFIX: 'model/' });
  });

  it.each([1, 2])('is held back by status %i', async (status) => {
    await stoplog.endWith(status);
    const before = await commitOf('HEAD');
    await expect(git('commit', '--allow-empty', '-m', 'x')).rejects.toThrow(/the stand-in speaks/);
    expect(await commitOf('HEAD')).toBe(before);
  });

  it('-a checks what it is about to stage', async () => {
    await repository.write('rain.csv', '2\n');
    await git('commit', '-a', '-m', 'x');
    const [call] = await stoplog.calls();
    expect(call?.tree).toBe(await treeOf('HEAD'));
    expect(call?.environment.GIT_INDEX_FILE).toMatch(/index\.lock$/);
    expect(await git('show', 'HEAD:rain.csv')).toBe('2\n');
  });

  it('PATH checks that path alone, without what else is staged', async () => {
    await repository.write('rain.csv', '2\n');
    await repository.write('flow.csv', '2\n');
    await git('add', 'flow.csv');
    await git('commit', '-m', 'x', 'rain.csv');
    const [call] = await stoplog.calls();
    expect(call?.tree).toBe(await treeOf('HEAD'));
    expect(await git('show', 'HEAD:flow.csv')).toBe('1\n');
  });

  it('keeps reading certificates off, since no network is used', async () => {
    await gitIn(repository.folder, { ...stoplog.everyday, NODE_EXTRA_CA_CERTS: '/none.pem' })(
      ...['commit', '--allow-empty', '-m', 'x'],
    );
    const [call] = await stoplog.calls();
    expect(call?.environment).not.toHaveProperty('NODE_EXTRA_CA_CERTS');
  });
});

describe('git merge', () => {
  beforeEach(async () => {
    await git('checkout', '-q', '-b', 'other');
    await repository.write('rain.csv', '2\n');
    await git('commit', '-a', '-m', 'other');
    await git('checkout', '-q', 'main');
    await repository.write('flow.csv', '2\n');
    await git('commit', '-a', '-m', 'main');
    await add();
  });

  it('checks a clean merge before it is committed', async () => {
    await git('merge', '-m', 'x', 'other');
    const calls = await stoplog.calls();
    expect(calls).toMatchObject([{ words: index, tree: await treeOf('HEAD') }]);
    expect(calls[0]?.environment.GIT_REFLOG_ACTION).toBe('merge other');
  });

  it('is held back', async () => {
    await stoplog.endWith(1);
    await expect(git('merge', '-m', 'x', 'other')).rejects.toThrow(/the stand-in speaks/);
    expect(await git('log', '-1', '--format=%s')).toBe('main\n');
  });
});

describe('git push', () => {
  let remote: TemporaryRepository;
  let url: string;
  beforeEach(async () => {
    remote = await temporaryRepository({}, ['--bare']);
    url = pathToFileURL(remote.folder).href;
    await add();
  });
  afterEach(() => remote.remove());

  const change = async (content: string) => {
    await repository.write('rain.csv', content);
    await git('commit', '--no-verify', '-a', '-m', content);
  };
  const words = async () => (await stoplog.calls()).map((call) => call.words);
  const at = async (...revisions: string[]) =>
    (await Promise.all(revisions.map(commitOf)))
      .sort()
      .map((commit) => ['check', '--brief', '--if-touched', '--at', commit]);

  it('checks each commit that a reference comes to, once, tags followed', async () => {
    await git('branch', 'same');
    await git('tag', '-a', '-m', 'note', 'v1');
    await git('tag', 'light');
    await change('2');
    await git('push', url, 'main', 'same', 'v1', 'light');
    expect(await words()).toEqual(await at('HEAD', 'HEAD~1'));
    expect(await remote.git('rev-parse', 'main')).toBe(await git('rev-parse', 'HEAD'));
  });

  it('is held back when one of them is, after all were checked', async () => {
    await change('2');
    await stoplog.endWith(1);
    await expect(git('push', url, 'HEAD~1:refs/heads/old', 'main')).rejects.toThrow(/failed to push/);
    expect(await words()).toEqual(await at('HEAD', 'HEAD~1'));
    expect(await remote.git('for-each-ref')).toBe('');
  });

  it('checks nothing for a deletion, or when there is nothing to push', async () => {
    await git('push', '--no-verify', url, 'main', 'main:gone');
    await stoplog.endWith(1);
    await git('push', url, ':gone');
    await git('push', url, 'main');
    expect(await words()).toEqual([]);
    expect(await remote.git('for-each-ref', '--format=%(refname)')).toBe('refs/heads/main\n');
  });

  it('reads a reference that is written with blanks', async () => {
    await change('the dry years');
    await change('3');
    await git('push', url, 'HEAD^{/the dry years}:refs/heads/dry');
    expect(await words()).toEqual(await at('HEAD~1'));
  });

  it('lets a tag pass that names no commit, since it holds no records', async () => {
    await git('tag', 'key', 'HEAD:rain.csv');
    await git('push', url, 'key');
    expect(await words()).toEqual([]);
  });

  it('works in a repository of 64-digit object ids', async () => {
    const long = await temporaryRepository({ 'rain.csv': '1\n' }, ['--object-format=sha256']);
    const longRemote = await temporaryRepository({}, ['--bare', '--object-format=sha256']);
    await add(long.folder);
    const push = gitIn(long.folder, stoplog.everyday);
    await push('push', longRemote.folder, 'main', 'main:gone');
    const id = (await long.git('rev-parse', 'main')).trim();
    expect(id).toHaveLength(64);
    expect(await words()).toEqual([['check', '--brief', '--if-touched', '--at', id]]);
    await push('push', longRemote.folder, ':gone');
    expect(await words()).toEqual([]);
    await Promise.all([long.remove(), longRemote.remove()]);
  });
});

describe('where hooks lie', () => {
  it('serves a linked work tree and the main one with one set of hooks', async () => {
    const linked = join(repository.folder, 'linked tree');
    await git('worktree', 'add', '-q', linked, '-b', 'other');
    const report = await add(linked);
    expect(report.home).toMatchObject({ folder: join(repository.folder, '.git/hooks'), starter: 'git' });
    await writeFile(join(linked, 'rain.csv'), '2\n');
    await gitIn(linked, stoplog.everyday)('commit', '-a', '-m', 'x');
    await git('commit', '--allow-empty', '-m', 'y');
    const [inLinked, inMain] = await stoplog.calls();
    expect(inLinked).toMatchObject({ cwd: linked, tree: await treeOf('other') });
    expect(inLinked?.environment.GIT_DIR).toBe(join(repository.folder, '.git/worktrees/linked-tree'));
    expect(inMain).toMatchObject({ cwd: repository.folder, tree: await treeOf('main') });
  });

  it('serves a submodule by its own hooks', async () => {
    const inner = await temporaryRepository({ 'a.csv': '1\n' });
    await repository.git(
      '-c',
      'protocol.file.allow=always',
      'submodule',
      'add',
      '-q',
      inner.folder,
      'gauges',
    );
    const folder = join(repository.folder, 'gauges');
    const report = await add(folder);
    expect(report.home.folder).toBe(join(repository.folder, '.git/modules/gauges/hooks'));
    await gitIn(folder, stoplog.everyday)('commit', '--allow-empty', '-m', 'x');
    expect(await stoplog.calls()).toMatchObject([{ words: index, cwd: folder }]);
    await git('commit', '-m', 'outer');
    expect(await stoplog.calls()).toEqual([]);
    await inner.remove();
  });

  it('serves a core.hooksPath of the repository, relative or absolute', async () => {
    for (const path of ['tools/hooks', join(repository.folder, '.git', 'my hooks')]) {
      await git('config', 'core.hooksPath', path);
      await add(join(repository.folder));
      await git('commit', '--allow-empty', '-m', 'x');
      expect(await stoplog.calls()).toHaveLength(1);
    }
  });
});

describe('the hook that was there before', () => {
  const note = (more: string) => `echo "$0 $*" >> "$STAND_IN/earlier"; cat >> "$STAND_IN/earlier"; ${more}`;
  const noted = async () => {
    const file = join(stoplog.withNode, '../earlier');
    const text = await readFile(file, 'utf8').catch(() => '');
    await writeFile(file, '');
    return text;
  };
  beforeEach(noted);

  it('runs first, and what it holds back stays held back', async () => {
    await repository.hook('pre-commit', note('echo no >&2; exit 3'));
    await add();
    await expect(git('commit', '--allow-empty', '-m', 'x')).rejects.toThrow(/^no$/m);
    expect(await noted()).toBe('.git/hooks/pre-commit.local \n');
    expect(await stoplog.calls()).toEqual([]);
  });

  it('may stage files, which are then checked', async () => {
    await repository.hook('pre-commit', 'echo 9 > rain.csv; git add rain.csv');
    await add();
    await git('commit', '--allow-empty', '-m', 'x');
    expect(await stoplog.calls()).toMatchObject([{ tree: await treeOf('HEAD') }]);
    expect(await git('show', 'HEAD:rain.csv')).toBe('9\n');
  });

  it('has its words and its input, and so has ours', async () => {
    await repository.hook('pre-push', note(''));
    await add();
    const remote = await temporaryRepository({}, ['--bare']);
    const [id, zeros] = [await commitOf('HEAD'), '0'.repeat(40)];
    await git('push', remote.folder, 'main');
    expect(await noted()).toBe(
      `.git/hooks/pre-push.local ${remote.folder} ${remote.folder}\nrefs/heads/main ${id} refs/heads/main ${zeros}\n`,
    );
    expect(await stoplog.calls()).toHaveLength(1);
    await git('push', remote.folder, 'main');
    expect(await noted()).toBe(`.git/hooks/pre-push.local ${remote.folder} ${remote.folder}\n`);
    await repository.write('.git/hooks/pre-push.local', '#!/bin/sh\nexit 1\n');
    await expect(git('push', remote.folder, ':main')).rejects.toThrow(/failed to push/);
    await remote.remove();
  });

  it('may leave its input unread', async () => {
    await repository.hook('pre-push', 'exit 0');
    await add();
    const remote = await temporaryRepository({}, ['--bare']);
    await git('push', remote.folder, 'main');
    expect(await stoplog.calls()).toHaveLength(1);
    await remote.remove();
  });

  it('is skipped where it is not executable, as git skipped it', async () => {
    await repository.hook('pre-commit', note('echo no >&2; exit 3'));
    await chmod(join(repository.folder, '.git/hooks/pre-commit'), 0o644);
    await add();
    await git('commit', '--allow-empty', '-m', 'x');
    expect(await noted()).toBe('');
    expect(await stoplog.calls()).toHaveLength(1);
  });
});

describe('which Stoplog is started', () => {
  beforeEach(() => add());
  const commitWith = (...folders: string[]) =>
    gitIn(repository.folder, stoplog.path(...folders))('commit', '--allow-empty', '-m', 'x');

  it('is the project’s own, before the one on PATH', async () => {
    await mkdir(join(repository.folder, 'node_modules/stoplog/dist'), { recursive: true });
    const bundle = join(repository.folder, 'node_modules/stoplog/dist/stoplog.mjs');
    await copyFile(stoplog.program, bundle);
    await stoplog.endWith(1);
    await writeFile(bundle, (await readFile(bundle, 'utf8')).replace('the stand-in', 'the project’s own'));
    await expect(commitWith(stoplog.withStoplog, stoplog.withNode, stoplog.withTools)).rejects.toThrow(
      /the project’s own speaks/,
    );
    await expect(commitWith(stoplog.withNode, stoplog.withTools)).rejects.toThrow(/the project’s own speaks/);
  });

  describe('where a stranger’s branch brings one along', () => {
    /** Commits, on a branch of its own, a program that would let everything pass, at this place or behind this link. */
    const strangers = async (folder: string, link?: string) => {
      await git('checkout', '-q', '-b', 'stranger');
      const program = `#!/bin/sh\n':' //; touch "$STAND_IN/stranger"\nprocess.exitCode = 0;\n`;
      for (const name of ['stoplog/dist/stoplog.mjs', '.bin/stoplog']) {
        await repository.write(`${folder}/${name}`, program);
        await chmod(join(repository.folder, folder, name), 0o755);
      }
      if (link !== undefined) await symlink(folder, join(repository.folder, link));
      await git('add', '-f', '.');
      await git('commit', '--no-verify', '-q', '-m', 'Helpful');
    };
    const tracked: [what: string, folder: string, link?: string][] = [
      ['as files', 'node_modules'],
      ['behind a link', 'payload', 'node_modules'],
    ];

    it.each(tracked)(
      '%s, it is not started, neither on that branch nor in a merge of it',
      async (_, ...where) => {
        await strangers(...where);
        await git('checkout', '-q', 'main');
        await git('commit', '--allow-empty', '--no-verify', '-m', 'y');
        await git('merge', '-m', 'x', 'stranger');
        await stoplog.endWith(1);
        const bin = join(repository.folder, 'node_modules/.bin');
        for (const first of [bin, 'node_modules/.bin']) {
          await expect(
            commitWith(first, stoplog.withStoplog, stoplog.withNode, stoplog.withTools),
          ).rejects.toThrow(
            /node_modules\/stoplog is not started, since git tracks[\s\S]*the stand-in speaks/,
          );
          await expect(commitWith(first, stoplog.withNode, stoplog.withTools)).rejects.toThrow(/nor on PATH/);
        }
        expect(await stoplog.calls()).toHaveLength(3);
        await expect(readFile(join(stoplog.withNode, '../stranger'))).rejects.toThrow(/ENOENT/);
        expect((await add()).tool).toMatchObject({
          stoplog: join(stoplog.withStoplog, 'stoplog'),
          leftAside: true,
        });
      },
    );
  });

  it('without one, the commit is held back and the way to install it is said', async () => {
    await expect(commitWith(stoplog.withNode, stoplog.withTools)).rejects.toThrow(
      /commit is held back[\s\S]*neither in .*node_modules nor on PATH[\s\S]*npm install --global stoplog/,
    );
    expect(await stoplog.calls()).toEqual([]);
  });

  it('without Node.js, the commit is held back and that is said', async () => {
    await expect(commitWith(stoplog.withStoplog, stoplog.withTools)).rejects.toThrow(
      /commit is held back[\s\S]*Node\.js was not found on PATH[\s\S]*graphical program/,
    );
  });
});
