import { afterEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
afterEach(() => project.remove());

const stale = 'seal.stale inputs.rainfall';

describe('which content is checked', () => {
  it('tells what is staged from what lies in the work tree', async () => {
    project = await soundRepository();
    const sound = await project.read('data/rain.csv');
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    expect((await check(project.folder, '--at', 'worktree')).blocking).toContain(stale);
    expect((await check(project.folder, '--at', 'index')).blocking).not.toContain(stale);

    await project.git('add', 'data/rain.csv');
    await project.write('data/rain.csv', sound);
    expect((await check(project.folder, '--at', 'worktree')).blocking).not.toContain(stale);
    expect((await check(project.folder, '--at', 'index')).blocking).toContain(stale);
    expect((await check(project.folder, '--at', 'HEAD')).blocking).not.toContain(stale);
  });

  it('seals the work tree as `git add` would store it, and stages nothing', async () => {
    project = await soundRepository();
    await project.write('.gitattributes', '*.csv text eol=crlf\n');
    await project.git('add', '.gitattributes');
    await project.edit('data/rain.csv', (text) => text.replaceAll('\n', '\r\n'));
    const staged = await project.git('diff', '--cached', '--raw');
    expect((await check(project.folder)).blocking).not.toContain(stale);
    await stoplog(project.folder, ['seal', '--all']);
    expect(await project.git('diff', '--cached', '--raw')).toBe(staged);
  });

  it('says of a claimed file that git does not track it, and never matches it', async () => {
    project = await soundRepository();
    await project.git('rm', '--quiet', '--cached', 'data/rain.csv');
    const checked = await check(project.folder, '--at', 'index');
    const finding = checked.finding('manifest.no-match', 'inputs.rainfall');
    expect(finding.message).toContain('data/rain.csv');
    expect(finding.clear).toContain('git add');
    const refused = await stoplog(project.folder, ['seal', 'inputs.rainfall']);
    expect(refused.status).toBe(1);
    expect(refused.text).toContain('git add :/data/rain.csv');
  });

  it('says of a claimed file that git is told to ignore it', async () => {
    project = await soundRepository();
    await project.git('rm', '--quiet', '--cached', 'runs/dry/daily.csv');
    await project.write('.gitignore', 'runs/dry/\n');
    const finding = (await check(project.folder)).finding('manifest.no-match', 'runs.dry');
    expect(finding.message).toContain('runs/dry/daily.csv on disk, which git is told to ignore');
    expect(finding.clear).toContain('.gitignore');
  });
});
