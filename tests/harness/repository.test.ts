import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { gitIn, type TemporaryRepository, temporaryRepository } from './repository.ts';

describe('temporary repository', () => {
  let repository: TemporaryRepository;
  beforeAll(async () => {
    repository = await temporaryRepository({ 'data/rain.csv': 'date,rain_mm\n' });
  });
  afterAll(() => repository.remove());

  it('holds the files as its first commit, by the invented person', async () => {
    expect(await repository.git('ls-files')).toBe('data/rain.csv\n');
    expect(await repository.git('log', '--format=%an <%ae> %s')).toBe(
      'Test Modeller <modeller@northmere.example> First state\n',
    );
  });

  it('rejects with the words of git', async () => {
    await expect(repository.git('rev-parse', '--verify', 'nowhere')).rejects.toThrow(
      /Needed a single revision/,
    );
  });

  it('rejects a failure without words, too', async () => {
    await expect(repository.git('config', '--get', 'no.such')).rejects.toThrow();
  });

  it('runs hooks', async () => {
    await repository.hook('pre-commit', 'echo held back >&2; exit 1');
    await expect(repository.git('commit', '--allow-empty', '-m', 'no')).rejects.toThrow(/held back/);
  });

  it('runs git with more variables', async () => {
    const git = gitIn(repository.folder, { GIT_AUTHOR_NAME: 'Other Person' });
    expect(await git('var', 'GIT_AUTHOR_IDENT')).toMatch(/^Other Person </);
  });
});
