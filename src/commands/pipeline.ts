import type { Context, ExitStatus } from './command.ts';
import { githubJob } from './pipeline/github.ts';
import { gitlabJob } from './pipeline/gitlab.ts';
import { version } from './version.ts';

const jobs = { github: githubJob, gitlab: gitlabJob };
export const hosts = Object.keys(jobs) as (keyof typeof jobs)[];

/** `stoplog pipeline`: prints a job file for a CI host, ready to commit. */
export async function pipelineCommand(context: Context, host: keyof typeof jobs): Promise<ExitStatus> {
  context.write(jobs[host](version));
  return 0;
}
