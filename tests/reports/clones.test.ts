import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { Verdict } from '../../src/verdict/finding.ts';
import { stoplog } from '../harness/command.ts';
import { gitIn } from '../harness/repository.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';
import { type Machine, machine, scripts, workflow } from './play.ts';
import { obeyedIn } from './runner.ts';

let author: SoundRepository;
let host: Machine;
let server: string;
beforeEach(async () => {
  author = await soundRepository();
  host = await machine();
  server = join(host.home, 'server.git');
  await author.git('clone', '--quiet', '--bare', author.folder, server);
  await author.git('remote', 'add', 'origin', server);
});
afterEach(async () => {
  await author.remove();
  await host.remove();
});

const commitOf = async (revision: string) => (await author.git('rev-parse', revision)).trim();

/** Lays a clone as GitHub's and GitLab's runners do: an empty repository, what they fetch, one commit checked out with no branch. */
async function clone(ref: string, ...fetched: readonly string[]): Promise<string> {
  const folder = join(host.home, 'work');
  const git = gitIn(host.home);
  await git('init', '--quiet', folder);
  const inside = gitIn(folder);
  await inside('remote', 'add', 'origin', `file://${server}`);
  await inside(
    'fetch',
    '--quiet',
    '--no-tags',
    ...fetched,
    'origin',
    '+refs/heads/*:refs/remotes/origin/*',
    `+${ref}:refs/remotes/checked`,
  );
  await inside('checkout', '--quiet', '--detach', 'refs/remotes/checked');
  return folder;
}

/** A change of the branch `work`, and what the server makes of it: the merge with what `main` is then. */
async function pullRequest(change: () => Promise<void>, meanwhile: () => Promise<void>): Promise<void> {
  await author.git('checkout', '--quiet', '-b', 'work');
  await change();
  await author.commit('Change');
  await author.git('checkout', '--quiet', 'main');
  await meanwhile();
  await author.commit('Meanwhile');
  await author.git('push', '--quiet', 'origin', 'main', 'work');
  await author.git('merge', '--quiet', '--no-ff', '--no-edit', 'work');
  await author.git('push', '--quiet', 'origin', 'main:refs/pull/1/merge');
}

const readme = () => author.write('README.md', 'Read me.\n');
const wetter = () => author.edit('data/rain.csv', moreRain('2005-01-01'));

const verdictIn = async (folder: string): Promise<Verdict> =>
  JSON.parse(await readFile(join(folder, 'stoplog-reports/findings.json'), 'utf8'));

/** What a verdict holds against the change, by record. */
const blamedIn = ({ manifests }: Verdict) =>
  manifests.flatMap(({ findings }) =>
    findings.filter(({ standing, level }) => !standing && level === 'block').map(({ record }) => record),
  );
const hasStanding = ({ totals }: Verdict) => totals.standing > 0;

/** What a runner tells the scripts, beside the base. */
const github = () => ({
  GITHUB_ACTIONS: 'true',
  GITHUB_STEP_SUMMARY: join(host.home, 'summary'),
  GITHUB_OUTPUT: join(host.home, 'outputs'),
});
const checkOnGithub = (folder: string, BASE: string) =>
  host.play(folder, scripts.github[0] ?? '', { ...github(), BASE });
const outputs = () => readFile(join(host.home, 'outputs'), 'utf8');
const zeros = '0'.repeat(40);

describe('a pull request on GitHub, checked out as its merge with the target branch', {
  timeout: 120_000,
}, () => {
  it('is compared with the target branch, by name, as the whole history holds it', () => {
    const check = workflow.jobs.records?.steps.find(({ id }) => id === 'check');
    expect(check?.env).toEqual({
      BASE: "\u0024{{ github.base_ref && format('origin/{0}', github.base_ref) || github.event.before }}",
    });
  });

  it('does not answer for what the target branch gained meanwhile', async () => {
    await pullRequest(readme, wetter);
    const folder = await clone('refs/pull/1/merge');
    expect(await checkOnGithub(folder, 'origin/main')).toMatchObject({ status: 0, stderr: '' });
    const verdict = await verdictIn(folder);
    expect(blamedIn(verdict)).toEqual([]);
    expect(hasStanding(verdict)).toBe(true);
    expect(await outputs()).toMatch(/^verdict=pass\n/);
  });

  it('is blocked by a fault of its own, and the draft of its dossier verifies', async () => {
    await pullRequest(wetter, readme);
    const folder = await clone('refs/pull/1/merge');
    expect(await checkOnGithub(folder, 'origin/main')).toMatchObject({ status: 1, stderr: '' });
    expect(blamedIn(await verdictIn(folder))).toContain('inputs.rainfall');
    expect(await outputs()).toMatch(/^verdict=blocked\n/);

    const [, dossier = ''] = scripts.github;
    expect(await host.play(folder, dossier, github())).toMatchObject({ status: 0, stderr: '' });
    const verified = await stoplog(folder, ['dossier', '--verify', 'stoplog-reports/dossier-draft.zip']);
    expect(verified).toMatchObject({ status: 0, text: expect.stringContaining('is valid') });
    // Reports lie beside the clone's files and change nothing of what is checked.
    expect(await checkOnGithub(folder, 'origin/main')).toMatchObject({ status: 1 });
  });

  it('of which only the newest commit was fetched, is checked whole and says so', async () => {
    await pullRequest(readme, wetter);
    const folder = await clone('refs/pull/1/merge', '--depth=1');
    const ran = await checkOnGithub(folder, 'origin/main');
    expect(ran).toMatchObject({ status: 1, stderr: '' });
    const [warning] = obeyedIn(ran.stdout).filter(({ command }) => command === 'warning');
    expect(warning?.data).toMatch(/^Not compared with origin\/main: .*fetch depth 0/);
    expect(blamedIn(await verdictIn(folder))).toContain('inputs.rainfall');
  });
});

describe('a push on GitHub', { timeout: 120_000 }, () => {
  it('is compared with what the branch held before', async () => {
    const before = await commitOf('main');
    await wetter();
    await author.commit();
    await author.git('push', '--quiet', 'origin', 'main');
    const folder = await clone('refs/heads/main');
    expect(await checkOnGithub(folder, before)).toMatchObject({ status: 1 });
    expect(blamedIn(await verdictIn(folder))).toContain('inputs.rainfall');
  });

  it('by force, over commits that nobody has any more, is checked whole and says so', async () => {
    await readme();
    await author.commit();
    const gone = await commitOf('main');
    await author.git('reset', '--quiet', '--hard', 'HEAD~1');
    await author.git('push', '--quiet', '--force', 'origin', 'main');
    const folder = await clone('refs/heads/main');
    const ran = await checkOnGithub(folder, gone);
    expect(ran).toMatchObject({ status: 0, stderr: '' });
    expect(obeyedIn(ran.stdout)[0]?.data).toMatch(new RegExp(`^Not compared with ${gone}: `));
    expect(await verdictIn(folder)).toMatchObject({ base: null, verdict: 'pass' });
  });

  it.each([zeros, ''])('that is the first, with a base of %j, is checked whole', async (base) => {
    const folder = await clone('refs/heads/main');
    expect(await checkOnGithub(folder, base)).toMatchObject({ status: 0, stderr: '' });
    expect(await verdictIn(folder)).toMatchObject({ base: null, comparison: null, verdict: 'pass' });
  });

  it('of what can’t be checked at all fails, and gives no word to the steps that follow', async () => {
    await author.git('rm', '--quiet', 'stoplog.yaml');
    await author.commit();
    await author.git('push', '--quiet', 'origin', 'main');
    const folder = await clone('refs/heads/main');
    const ran = await checkOnGithub(folder, zeros);
    expect(ran.status).toBe(2);
    expect(ran.stderr).toContain('stoplog could not do this');
    await expect(outputs()).rejects.toThrow();
  });
});

describe('GitLab', { timeout: 120_000 }, () => {
  const check = (folder: string, variables: NodeJS.ProcessEnv) =>
    host.play(folder, scripts.gitlab.main, { GITLAB_CI: 'true', CI_COMMIT_BEFORE_SHA: zeros, ...variables });

  it('compares a merge request with where it left the target branch', async () => {
    await author.git('checkout', '--quiet', '-b', 'work');
    const base = await commitOf('main');
    await wetter();
    await author.commit();
    await author.git('push', '--quiet', 'origin', 'work:refs/merge-requests/1/head');
    const folder = await clone('refs/merge-requests/1/head');
    expect(await check(folder, { CI_MERGE_REQUEST_DIFF_BASE_SHA: base })).toMatchObject({
      status: 1,
      stderr: '',
    });
    expect(blamedIn(await verdictIn(folder))).toContain('inputs.rainfall');
    expect(await host.play(folder, scripts.gitlab.after)).toMatchObject({ status: 0 });
    expect((await readdir(join(folder, 'stoplog-reports'))).sort()).toEqual([
      ...['code-quality.json', 'dossier-draft.zip', 'findings.json', 'findings.md', 'findings.xml'],
    ]);
  });

  it('blames no merge request for what the target branch gained, where it merges before it checks', async () => {
    const base = await commitOf('main');
    await pullRequest(readme, wetter);
    const folder = await clone('refs/pull/1/merge');
    const merged = {
      CI_MERGE_REQUEST_DIFF_BASE_SHA: base,
      CI_MERGE_REQUEST_TARGET_BRANCH_SHA: await commitOf('main^1'),
    };
    expect(await check(folder, merged)).toMatchObject({ status: 0, stderr: '' });
    expect(hasStanding(await verdictIn(folder))).toBe(true);
  });

  it('checks the whole state of a first push', async () => {
    const folder = await clone('refs/heads/main');
    expect(await check(folder, {})).toMatchObject({ status: 0, stderr: '' });
    expect(await verdictIn(folder)).toMatchObject({ base: null, comparison: null });
  });
});
