import { expect, it } from 'vitest';
import { gitFailure } from './git-failure.ts';

// Standard error as git 2.39.5 wrote it.
it('says that there is no repository', () => {
  const words = 'fatal: not a git repository (or any of the parent directories): .git\n';
  const failure = gitFailure(['rev-parse'], 128, words);
  expect(failure.code).toBe('no-repository');
  expect(failure.next).toContain('git init');
});

it('says what to do about a repository of another user', () => {
  const words =
    "fatal: detected dubious ownership in repository at '/srv/models/fennock'\nTo add an exception for this directory, call:\n\n\tgit config --global --add safe.directory /srv/models/fennock\n";
  const failure = gitFailure(['rev-parse'], 128, words);
  expect(failure.code).toBe('git-failed');
  expect(failure.next).toContain("git config --global --add safe.directory '/srv/models/fennock'");
});

it('names a work-tree file that could not be read', () => {
  const words =
    'error: open("data/rain.csv"): Permission denied\nerror: unable to index file \'data/rain.csv\'\nfatal: updating files failed\n';
  const failure = gitFailure(['-c', 'core.hooksPath=/dev/null', 'add', '--update'], 128, words);
  expect(failure.code).toBe('unreadable-file');
  expect(failure.message).toContain('data/rain.csv');
  expect(failure.message).toContain('Permission denied');
});

it('names the filter whose program is not there', () => {
  const words =
    "git-lfs filter-process: 1: git-lfs: not found\nfatal: the remote end hung up unexpectedly\nerror: external filter 'git-lfs clean -- %f' failed 127\nfatal: a.nc: clean filter 'lfs' failed\n";
  expect(gitFailure(['add'], 128, words).next).toContain("'lfs'");
});

it('names the program of a filter that talks to git, where it is not there', () => {
  const words = 'git-lfs filter-process: 1: git-lfs: not found\nfatal: the remote end hung up unexpectedly\n';
  expect(gitFailure(['add'], 128, words).next).toContain('git-lfs, which is not on PATH: install it');
});

it('gives the words of git otherwise, with the command that said them', () => {
  const failure = gitFailure(
    ['-c', 'core.safecrlf=false', 'ls-tree', '-r'],
    128,
    'fatal: not a tree object\n',
  );
  expect(failure.code).toBe('git-failed');
  expect(failure.message).toMatch(/^git ls-tree ended with status 128 and said:\nfatal: not a tree object$/);
});
