import { appendFile, stat } from 'node:fs/promises';
import { Failure } from '../failure.ts';
import { githubOutputs } from '../reports/github.ts';
import { markdownReport, summaryBytes } from '../reports/markdown.ts';
import type { Verdict } from '../verdict/finding.ts';
import type { Context } from './command.ts';

/** Adds the job's summary and the step's outputs to the files that GitHub Actions names for them, where it does. */
export async function tellGithub({ environment }: Context, verdict: Verdict): Promise<void> {
  await append(environment.GITHUB_STEP_SUMMARY, (there) => {
    // A summary that is too long is refused whole, with what other commands of the step wrote.
    const room = Math.max(0, summaryBytes - there);
    const text = markdownReport(verdict, room);
    return Buffer.byteLength(text) <= room ? text : '';
  });
  await append(environment.GITHUB_OUTPUT, () => githubOutputs(verdict));
}

/** `text` is told how many bytes are there already. */
async function append(path: string | undefined, text: (there: number) => string): Promise<void> {
  if (path === undefined || path === '') return;
  try {
    const file = await stat(path).catch(() => null);
    await appendFile(path, text(file?.size ?? 0));
  } catch (error) {
    throw new Failure(
      'unwritable-file',
      `${path}, which GitHub Actions names for a step’s summary or outputs, could not be written.`,
      'Check the runner, or leave out `--report github`.',
      error,
    );
  }
}
