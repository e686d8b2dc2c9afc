import { Failure } from '../failure.ts';
import { parsePart } from '../repository/part.ts';
import { version } from '../version.ts';
import type { Context, ExitStatus } from './command.ts';
import { githubJob } from './pipeline/github.ts';
import { gitlabJob } from './pipeline/gitlab.ts';

const jobs = { github: githubJob, gitlab: gitlabJob };
export const hosts = Object.keys(jobs) as (keyof typeof jobs)[];

export interface PipelineOptions {
  readonly parts: string;
}

/** `stoplog pipeline`: prints a job file for a CI host, ready to commit. */
export async function pipelineCommand(
  context: Context,
  host: keyof typeof jobs,
  { parts }: PipelineOptions,
): Promise<ExitStatus> {
  const first = parsePart(`1of${parts}`);
  if (first === null)
    throw new Failure(
      'usage',
      `\`--parts ${parts}\` is no number of machines.`,
      'Write a whole number from 1 to 256: `stoplog pipeline github --parts 8`.',
    );
  context.write(jobs[host](version, first.of));
  return 0;
}
