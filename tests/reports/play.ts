import { execFile } from 'node:child_process';
import { chmod, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { delimiter, join, resolve } from 'node:path';
import { promisify } from 'node:util';
import { parse } from 'yaml';
import { githubJob } from '../../src/commands/pipeline/github.ts';
import { gitlabJob } from '../../src/commands/pipeline/gitlab.ts';
import { cleanEnvironment } from '../harness/repository.ts';

const run = promisify(execFile);

export interface Step {
  readonly id?: string;
  readonly uses?: string;
  readonly run?: string;
  readonly env?: Readonly<Record<string, string>>;
  readonly with?: Readonly<Record<string, unknown>>;
}

/** The workflow of a version that is invented. */
export const workflow = parse(githubJob('1.2.3')) as {
  readonly permissions: object;
  readonly jobs: Readonly<Record<string, { readonly permissions: object; readonly steps: readonly Step[] }>>;
};

/** The job of GitLab of the same version. */
export const job = (parse(gitlabJob('1.2.3')) as { readonly stoplog: Readonly<Record<string, unknown>> })
  .stoplog;

/** What each host hands to a shell, in order. */
export const scripts = {
  github: workflow.jobs.records?.steps.flatMap((step) => step.run ?? []) ?? [],
  gitlab: {
    main: [...(job.before_script as string[]), ...(job.script as string[])].join('\n'),
    after: (job.after_script as string[]).join('\n'),
  },
};

export interface Ended {
  readonly status: number;
  readonly stdout: string;
  readonly stderr: string;
}

/** How a program ended; a status other than 0 is no error here. */
export async function ended(
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

/** A machine of a CI host, on which `npx` runs the bundle. */
export interface Machine {
  /** What the jobs may write outside their clone. */
  readonly home: string;
  readonly environment: NodeJS.ProcessEnv;
  play(folder: string, script: string, more?: NodeJS.ProcessEnv): Promise<Ended>;
  remove(): Promise<void>;
}

export async function machine(): Promise<Machine> {
  const home = await mkdtemp(join(tmpdir(), 'stoplog-machine-'));
  const npx = `#!/bin/sh\n[ "$1 $2" = '--yes stoplog@1.2.3' ] || exit 9\nshift 2\nexec '${resolve('dist/stoplog.mjs')}' "$@"\n`;
  await writeFile(join(home, 'npx'), npx);
  await chmod(join(home, 'npx'), 0o755);
  const environment = cleanEnvironment({
    PATH: `${home}${delimiter}${process.env.PATH}`,
    HOME: home,
    // What `git config --global` of a script may write.
    GIT_CONFIG_GLOBAL: join(home, 'gitconfig'),
    SOURCE_DATE_EPOCH: String(Date.UTC(2021, 2, 1) / 1000),
  });
  return {
    home,
    environment,
    play: (folder, script, more) =>
      ended('bash', ['-e', '-c', script], folder, { ...environment, CI_PROJECT_DIR: folder, ...more }),
    remove: () => rm(home, { recursive: true }),
  };
}
