import { chmod, lstat, mkdir, readdir, readFile, readlink, rm, symlink, writeFile } from 'node:fs/promises';
import { join, relative } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { addHooks } from '../../src/commands/hook/add.ts';
import { withBlock } from '../../src/commands/hook/block.ts';
import { removeHooks } from '../../src/commands/hook/remove.ts';
import { listHooks } from '../../src/commands/hook/report.ts';
import { openRepository } from '../../src/repository/repository.ts';
import { cleanEnvironment, type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';

let repository: TemporaryRepository;
beforeEach(async () => {
  repository = await temporaryRepository({ 'rain.csv': '1\n' });
});
afterEach(() => repository.remove());

const at = (path: string) => join(repository.folder, path);
const open = (folder = repository.folder, more: NodeJS.ProcessEnv = {}) =>
  openRepository(folder, cleanEnvironment(more));
const read = (path: string) => readFile(at(path), 'utf8');
const doneOf = (report: Awaited<ReturnType<typeof listHooks>>) => report.hooks.map((hook) => hook.done);
const foundOf = (report: Awaited<ReturnType<typeof listHooks>>) => report.hooks.map((hook) => hook.found);

/** Every file, link and folder below a folder: bytes and mode. */
async function photograph(folder: string): Promise<Record<string, string>> {
  const seen: Record<string, string> = {};
  for (const entry of await readdir(folder, { recursive: true, withFileTypes: true })) {
    const path = join(entry.parentPath, entry.name);
    const mode = ((await lstat(path)).mode & 0o7777).toString(8);
    const content = entry.isSymbolicLink()
      ? await readlink(path)
      : entry.isFile()
        ? await readFile(path, 'latin1')
        : 'folder';
    seen[relative(folder, path)] = `${mode} ${content}`;
  }
  return seen;
}

const executable = async (path: string, content: string, mode = 0o755) => {
  await repository.write(path, Buffer.from(content, 'latin1'));
  await chmod(at(path), mode);
};
const husky = async () => {
  await repository.write('.husky/_/h', '');
  await repository.git('config', 'core.hooksPath', '.husky/_');
};

/** Each prepares a repository and answers the folder from which hooks are added. */
const situations: Record<string, () => Promise<string | undefined>> = {
  'no hook': async () => undefined,
  'no hooks folder': async () => {
    await rm(at('.git/hooks'), { recursive: true });
    return undefined;
  },
  'a hook': async () => {
    await executable('.git/hooks/pre-commit', '#!/usr/bin/env python3\nprint("\xff")', 0o775);
    return undefined;
  },
  'a hook that is not executable': async () => {
    await executable('.git/hooks/pre-push', 'echo\r\n', 0o640);
    return undefined;
  },
  'hooks that are links': async () => {
    await executable('tools/hook.sh', '#!/bin/sh\n');
    await symlink('../../tools/hook.sh', at('.git/hooks/pre-commit'));
    await symlink('../../nowhere', at('.git/hooks/pre-push'));
    return undefined;
  },
  'an empty hook': async () => {
    await executable('.git/hooks/pre-commit', '');
    return undefined;
  },
  'a hook and somebody’s pre-commit.local': async () => {
    await executable('.git/hooks/pre-commit', '#!/bin/sh\necho first\n');
    await executable('.git/hooks/pre-commit.local', '#!/bin/sh\necho second\n', 0o700);
    return undefined;
  },
  'a core.hooksPath whose folders are missing': async () => {
    await repository.git('config', 'core.hooksPath', 'tools/git/hooks');
    await mkdir(at('tools'));
    return undefined;
  },
  'a core.hooksPath that git tracks': async () => {
    await executable('hooks/pre-commit', '#!/bin/sh\n');
    await repository.git('add', 'hooks');
    await repository.git('config', 'core.hooksPath', 'hooks');
    return undefined;
  },
  'an absolute core.hooksPath': async () => {
    await repository.git('config', 'core.hooksPath', at('.git/other hooks'));
    return undefined;
  },
  'husky without scripts': async () => {
    await husky();
    return undefined;
  },
  'husky with scripts': async () => {
    await husky();
    await executable('.husky/pre-commit', 'npm test', 0o664);
    await executable('.husky/pre-merge-commit', '');
    await executable('.husky/pre-push', '#!/bin/sh\r\n\xff\r\nexit 0\n', 0o775);
    return undefined;
  },
  'husky with a script of one unfinished line': async () => {
    await husky();
    await executable('.husky/pre-commit', '#!/bin/sh');
    return undefined;
  },
  'a linked work tree': async () => {
    await executable('.git/hooks/pre-commit', '#!/bin/sh\n');
    await repository.git('worktree', 'add', '-q', at('linked'));
    return at('linked');
  },
  'a submodule': async () => {
    await repository.git(
      ...['-c', 'protocol.file.allow=always', 'submodule', 'add', '-q', repository.folder, 'inner'],
    );
    return at('inner');
  },
};

describe.each(Object.entries(situations))('with %s', (_, prepare) => {
  it('remove leaves every byte and mode as it was before add; add twice is add once', async () => {
    const folder = await prepare();
    const before = await photograph(repository.folder);
    expect(doneOf(await addHooks(await open(folder)))).toEqual(['written', 'written', 'written']);
    const added = await photograph(repository.folder);
    expect(added).not.toEqual(before);
    const again = await addHooks(await open(folder));
    expect(doneOf(again)).toEqual(['none', 'none', 'none']);
    expect(foundOf(again)).toEqual(['ours', 'ours', 'ours']);
    expect(await photograph(repository.folder)).toEqual(added);
    await removeHooks(await open(folder));
    expect(await photograph(repository.folder)).toEqual(before);
    await removeHooks(await open(folder));
    expect(await photograph(repository.folder)).toEqual(before);
  });
});

describe('a hook of ours', () => {
  it('stays with somebody’s change, and the earlier hook beside it', async () => {
    await executable('.git/hooks/pre-commit', '#!/bin/sh\necho earlier\n');
    await addHooks(await open());
    await writeFile(at('.git/hooks/pre-commit'), `${await read('.git/hooks/pre-commit')}echo more\n`);
    const push = (await read('.git/hooks/pre-push')).replace('--at "$commit"', '--at "$commit" --strict');
    await writeFile(at('.git/hooks/pre-push'), push);
    const before = await photograph(at('.git/hooks'));
    const added = await addHooks(await open());
    expect(doneOf(added)).toEqual(['left', 'none', 'left']);
    expect(foundOf(added)).toEqual(['changed', 'ours', 'changed']);
    expect(added.hooks[0]?.earlier?.file).toBe(at('.git/hooks/pre-commit.local'));
    expect(await photograph(at('.git/hooks'))).toEqual(before);
    expect(doneOf(await removeHooks(await open()))).toEqual(['left', 'removed', 'left']);
    const { 'pre-merge-commit': taken, ...rest } = before;
    expect(taken).toBeDefined();
    expect(await photograph(at('.git/hooks'))).toEqual(rest);
  });

  it('that was replaced by another is no more ours; the new one is kept in turn', async () => {
    await executable('.git/hooks/pre-commit', '#!/bin/sh\necho first\n');
    await addHooks(await open());
    await executable('.git/hooks/pre-commit', '#!/bin/sh\necho second\n');
    await removeHooks(await open());
    expect(await read('.git/hooks/pre-commit')).toBe('#!/bin/sh\necho second\n');
    await addHooks(await open());
    expect(await read('.git/hooks/pre-commit.local-2')).toBe('#!/bin/sh\necho second\n');
    await removeHooks(await open());
    expect(await read('.git/hooks/pre-commit')).toBe('#!/bin/sh\necho second\n');
    expect(await read('.git/hooks/pre-commit.local')).toBe('#!/bin/sh\necho first\n');
  });

  it('puts the earlier hook back as it is now, when somebody changed that one', async () => {
    await executable('.git/hooks/pre-commit', '#!/bin/sh\n');
    await addHooks(await open());
    await executable('.git/hooks/pre-commit.local', '#!/bin/sh\necho more\n', 0o700);
    await removeHooks(await open());
    expect((await photograph(at('.git/hooks')))['pre-commit']).toBe('700 #!/bin/sh\necho more\n');
  });

  it('goes also when the earlier one was taken away', async () => {
    await executable('.git/hooks/pre-commit', '#!/bin/sh\n');
    await addHooks(await open());
    await rm(at('.git/hooks/pre-commit.local'));
    expect((await listHooks(await open())).hooks[0]?.earlier).toMatchObject({ exists: false });
    expect(doneOf(await removeHooks(await open()))[0]).toBe('removed');
  });

  it('leaves the lines that others wrote below it in a script of husky’s', async () => {
    await husky();
    await addHooks(await open());
    await writeFile(at('.husky/pre-commit'), `${await read('.husky/pre-commit')}npm test\n`);
    await removeHooks(await open());
    expect(await read('.husky/pre-commit')).toBe('npm test\n');
  });

  it('of another version is renewed with what it remembers, or taken away', async () => {
    await executable('.git/hooks/pre-commit', '#!/bin/sh\necho earlier\n');
    await addHooks(await open());
    const current = await photograph(at('.git/hooks'));
    const older = withBlock('#!/bin/sh\n', 'stoplog check\n', {
      was: 'the hook pre-commit.local',
      foldersMade: 0,
    });
    await writeFile(at('.git/hooks/pre-commit'), older);
    expect(doneOf(await addHooks(await open()))).toEqual(['renewed', 'none', 'none']);
    expect(await photograph(at('.git/hooks'))).toEqual(current);
    await writeFile(at('.git/hooks/pre-commit'), older);
    await removeHooks(await open());
    expect(await read('.git/hooks/pre-commit')).toBe('#!/bin/sh\necho earlier\n');
  });

  it('that lost its executable bit is seen and mended', async () => {
    await addHooks(await open());
    await chmod(at('.git/hooks/pre-commit'), 0o644);
    expect((await listHooks(await open())).hooks[0]).toMatchObject({ found: 'ours', executable: false });
    expect(doneOf(await addHooks(await open()))[0]).toBe('renewed');
    expect((await photograph(at('.git/hooks')))['pre-commit']).toMatch(/^755 /);
  });

  it('is found and taken away where git looked before husky came', async () => {
    const before = await photograph(at('.git/hooks'));
    await addHooks(await open());
    await husky();
    const { home, hooks } = await listHooks(await open());
    expect(home.folder).toBe(at('.husky'));
    expect(hooks.slice(3)).toMatchObject(
      ['pre-commit', 'pre-merge-commit', 'pre-push'].map((hook) => ({
        ...{ hook, file: at(`.git/hooks/${hook}`), found: 'ours', home: { inForce: false } },
      })),
    );
    await removeHooks(await open());
    expect(await photograph(at('.git/hooks'))).toEqual(before);
  });

  it('may be written alone', async () => {
    const report = await addHooks(await open(), { hooks: ['pre-push'] });
    expect(foundOf(report)).toEqual(['nothing', 'nothing', 'ours']);
  });
});

describe('a repository where hooks would not run, or would run elsewhere too', () => {
  const refusal = async (opened: ReturnType<typeof open>, actions = [addHooks]) => {
    const messages = new Set<string>();
    for (const action of actions) {
      const failure = await action(await opened).catch((thrown: unknown) => thrown);
      expect(failure).toMatchObject({ code: 'usage' });
      if (failure instanceof Error) messages.add(failure.message);
    }
    return [...messages].join();
  };
  const all = [addHooks, removeHooks, listHooks];

  it('is refused for work when bare, and for pushes when people work in it', async () => {
    const bare = await temporaryRepository({}, ['--bare']);
    const before = await photograph(bare.folder);
    expect(await refusal(open(bare.folder))).toMatch(/is a bare repository: .* nobody commits in it/);
    expect(await photograph(bare.folder)).toEqual(before);
    await expect(addHooks(await open(), { hooks: ['pre-receive'] })).rejects.toThrow(/has a work tree/);
    await bare.remove();
  });

  it('has one hook for pushes when bare, and is as before when it is taken away', async () => {
    const bare = await temporaryRepository({}, ['--bare']);
    const earlier = join(bare.folder, 'hooks/pre-receive');
    await mkdir(join(bare.folder, 'hooks'), { recursive: true });
    await writeFile(earlier, '#!/bin/sh\nexit 0\n', { mode: 0o755 });
    const before = await photograph(bare.folder);
    const added = await addHooks(await open(bare.folder), { hooks: ['pre-receive'] });
    expect(added.hooks).toMatchObject([{ hook: 'pre-receive', found: 'ours', done: 'written' }]);
    expect(foundOf(await listHooks(await open(bare.folder)))).toEqual(['ours']);
    expect(doneOf(await removeHooks(await open(bare.folder)))).toEqual(['restored']);
    expect(await photograph(bare.folder)).toEqual(before);
    await bare.remove();
  });

  it('is refused inside the git directory', async () => {
    expect(await refusal(open(at('.git')), all)).toMatch(/inside git’s own folder/);
  });

  it.each([
    ['/dev/null', '/dev/null, which is no folder'],
    // git then looks for /pre-commit, and can't answer where it looks.
    ['', 'set to an empty text'],
  ])('is refused when hooks are switched off by core.hooksPath "%s"', async (value, words) => {
    await repository.git('config', 'core.hooksPath', value);
    expect(await refusal(open())).toBe(`core.hooksPath is ${words}, so git runs no hooks here.`);
    await repository.git('config', 'core.hooksPath', at('.git/hooks'));
    expect(doneOf(await addHooks(await open()))).toEqual(['written', 'written', 'written']);
  });

  it('is refused when the folder is everybody’s, until it has hooks of its own', async () => {
    await repository.write('.git/global', `[core]\n\thooksPath = ${at('../shared hooks')}\n`);
    const more = { GIT_CONFIG_GLOBAL: at('.git/global') };
    expect(await refusal(open(repository.folder, more))).toMatch(
      /in your global git settings: all your repositories share that folder/,
    );
    await repository.git('config', 'core.hooksPath', at('.git/hooks'));
    expect((await addHooks(await open(repository.folder, more))).home.folder).toBe(at('.git/hooks'));
  });

  it.each(['/dev/null', ''])(
    'is still told what is there, and rid of hooks from before, with "%s"',
    async (value) => {
      const before = await photograph(at('.git/hooks'));
      await addHooks(await open());
      await repository.git('config', 'core.hooksPath', value);
      const listed = await listHooks(await open());
      expect(listed.home.refusal?.message).toMatch(/git runs no hooks here/);
      expect(foundOf(listed)).toEqual(['nothing', 'nothing', 'nothing', 'ours', 'ours', 'ours']);
      await removeHooks(await open());
      expect(await photograph(at('.git/hooks'))).toEqual(before);
    },
  );

  it('is served when everybody’s setting leads to a folder of each work tree', async () => {
    await repository.write('.git/global', '[core]\n\thooksPath = .hooks\n');
    const { home } = await addHooks(await open(repository.folder, { GIT_CONFIG_GLOBAL: at('.git/global') }));
    expect(home.folder).toBe(at('.hooks'));
  });
});

describe('what is said of a folder', () => {
  const notes = async (folder?: string) => (await listHooks(await open(folder))).home.notes.join(' ');

  it('nothing special of git’s own', async () => {
    expect(await notes()).toBe('');
  });

  it('that hooks in a linked work tree serve all', async () => {
    await repository.git('worktree', 'add', '-q', at('linked'));
    expect(await notes(at('linked'))).toBe('These hooks serve every work tree of this repository.');
  });

  it('that git tracks it', async () => {
    await repository.git('config', 'core.hooksPath', 'tools/hooks');
    expect(await notes()).toMatch(/core\.hooksPath is tools\/hooks, .* git does not track that folder/);
    await repository.write('tools/hooks/README', '');
    await repository.git('add', 'tools');
    expect(await notes()).toMatch(/^git tracks tools\/hooks: what changes there reaches others/);
  });
});
