import { appendFile } from 'node:fs/promises';
import { Failure } from '../failure.ts';
import { githubOutputs } from '../reports/github.ts';
import { markdownReport, summaryBytes } from '../reports/markdown.ts';
import type { Verdict } from '../verdict/finding.ts';
import type { Context } from './command.ts';

/** Adds the job's summary and the step's outputs to the files that GitHub Actions names for them, where it does. */
export async function tellGithub({ environment }: Context, verdict: Verdict): Promise<void> {
  await append(environment.GITHUB_STEP_SUMMARY, () => markdownReport(verdict, summaryBytes));
  await append(environment.GITHUB_OUTPUT, () => githubOutputs(verdict));
}

async function append(path: string | undefined, text: () => string): Promise<void> {
  if (path === undefined || path === '') return;
  try {
    await appendFile(path, text());
  } catch (error) {
    throw new Failure(
      'unwritable-file',
      `${path}, which GitHub Actions names for a step’s summary or outputs, could not be written.`,
      'Check the runner, or leave out `--report github`.',
      error,
    );
  }
}
