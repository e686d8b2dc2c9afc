import { type ChildProcessWithoutNullStreams, spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { Failure } from '../failure.ts';
import { gitFailure } from './git-failure.ts';

/** Where git runs, and with which variables; `gitEnvironment` makes them. */
export interface Place {
  readonly cwd: string;
  readonly environment: NodeJS.ProcessEnv;
}

/** One question to git: arguments, and a pure reading of its answer. */
export interface Question<Answer> {
  readonly args: readonly string[];
  /** For git's standard input. */
  readonly input?: Uint8Array;
  /** Exit statuses, beside 0, that are an answer and no failure. */
  readonly statuses?: readonly number[];
  parse(output: Buffer, status: number): Answer;
}

// Names are paths, never patterns, and come unquoted; no helper of the user's watches the files.
const fixedArguments = ['-c', 'core.quotePath=false', '-c', 'core.fsmonitor=false', '--literal-pathspecs'];

/**
 * The variables for git children: those that git set for a hook pass through (which index, which object
 * folder); answers are in one language; replaced objects, fetching, asking and optional writing are off.
 */
export function gitEnvironment(inherited: NodeJS.ProcessEnv): NodeJS.ProcessEnv {
  const environment = {
    ...inherited,
    GIT_NO_REPLACE_OBJECTS: '1',
    GIT_NO_LAZY_FETCH: '1',
    GIT_OPTIONAL_LOCKS: '0',
    GIT_TERMINAL_PROMPT: '0',
    LC_ALL: 'C',
  };
  // git refuses these together with --literal-pathspecs.
  for (const name of ['GIT_GLOB_PATHSPECS', 'GIT_NOGLOB_PATHSPECS', 'GIT_ICASE_PATHSPECS']) {
    Reflect.deleteProperty(environment, name);
  }
  return environment;
}

/** Starts git for a longer talk; the caller reads, writes and ends it. */
export function startGit(place: Place, args: readonly string[]): ChildProcessWithoutNullStreams {
  return spawn('git', [...fixedArguments, ...args], { cwd: place.cwd, env: place.environment });
}

/**
 * Asks git one question in a process of its own.
 * Failures: 'no-git', 'no-repository', 'unreadable-file' (a work-tree file that git could not read), 'git-failed'.
 */
export async function ask<Answer>(place: Place, question: Question<Answer>): Promise<Answer> {
  const child = startGit(place, question.args);
  const { output, errors, status } = await finished(place, child, question.input);
  if (status !== 0 && !question.statuses?.includes(status)) {
    throw gitFailure(question.args, status, errors.toString());
  }
  return question.parse(output, status);
}

interface Finished {
  readonly output: Buffer;
  readonly errors: Buffer;
  /** -1 where a signal ended it. */
  readonly status: number;
}

function finished(
  place: Place,
  child: ChildProcessWithoutNullStreams,
  input: Uint8Array | undefined,
): Promise<Finished> {
  return new Promise((resolve, reject) => {
    const output: Buffer[] = [];
    const errors: Buffer[] = [];
    child.stdout.on('data', (chunk: Buffer) => output.push(chunk));
    child.stderr.on('data', (chunk: Buffer) => errors.push(chunk));
    child.on('error', (cause) => reject(startFailure(place, cause)));
    child.on('close', (status) =>
      resolve({ output: Buffer.concat(output), errors: Buffer.concat(errors), status: status ?? -1 }),
    );
    // A git that ends before it read everything says why by its status.
    child.stdin.on('error', () => {});
    child.stdin.end(input);
  });
}

/** Why git could not be started at all. */
export function startFailure(place: Place, cause: Error): Failure {
  if (!existsSync(place.cwd)) {
    return new Failure(
      'no-repository',
      `There is no folder ${place.cwd}.`,
      'Name a folder that exists.',
      cause,
    );
  }
  return new Failure(
    'no-git',
    `git could not be started: ${cause.message}.`,
    'Install git (2.31 or newer) and see that `git --version` answers in this terminal.',
    cause,
  );
}
