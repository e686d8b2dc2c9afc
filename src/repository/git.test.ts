import { describe, expect, it } from 'vitest';
import { temporaryRepository } from '../../tests/harness/repository.ts';
import { ask, gitEnvironment } from './git.ts';

describe('gitEnvironment', () => {
  it('passes on what git tells a hook and fixes what an answer depends on', () => {
    const environment = gitEnvironment({
      GIT_INDEX_FILE: '.git/index.lock',
      GIT_NO_LAZY_FETCH: '0',
      LC_ALL: 'de',
    });
    expect(environment).toEqual({
      GIT_INDEX_FILE: '.git/index.lock',
      GIT_NO_REPLACE_OBJECTS: '1',
      GIT_NO_LAZY_FETCH: '1',
      GIT_OPTIONAL_LOCKS: '0',
      GIT_TERMINAL_PROMPT: '0',
      LC_ALL: 'C',
    });
  });

  it('leaves out what git would refuse beside literal paths', async () => {
    const repository = await temporaryRepository({ 'a.csv': '1\n' });
    const environment = gitEnvironment({ ...repository.environment, GIT_ICASE_PATHSPECS: '1' });
    const names = { args: ['ls-files', '-z'], parse: String };
    expect(await ask({ cwd: repository.folder, environment }, names)).toBe('a.csv\0');
    await repository.remove();
  });
});

describe('ask', () => {
  const version = { args: ['version'], parse: String };

  it('says that git is not there', async () => {
    const place = { cwd: '/', environment: { PATH: '/nowhere' } };
    await expect(ask(place, version)).rejects.toMatchObject({
      code: 'no-git',
      next: expect.stringContaining('Install git'),
    });
  });

  it('says that the folder is not there', async () => {
    const place = { cwd: '/nowhere/at/all', environment: process.env };
    await expect(ask(place, version)).rejects.toMatchObject({
      code: 'no-repository',
      message: expect.stringContaining('/nowhere/at/all'),
    });
  });

  it('hands input to git and takes a stated status for an answer', async () => {
    const place = { cwd: '/', environment: gitEnvironment(process.env) };
    const hashed = { args: ['hash-object', '--stdin'], input: Buffer.from('hello\n'), parse: String };
    // Pro Git, 2nd edition, section 10.2 hashes "test content"; this one is sha1("blob 6\0hello\n").
    expect(await ask(place, hashed)).toBe('ce013625030ba8dba906f756967f9e9ca394464a\n');
    const status = {
      args: ['hash-object', '/nowhere'],
      statuses: [128],
      parse: (_: Buffer, end: number) => end,
    };
    expect(await ask(place, status)).toBe(128);
  });
});
