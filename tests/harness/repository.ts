import { chmod, mkdir, mkdtemp, realpath, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { simpleGit } from 'simple-git';

/** A real git repository in a temporary folder, with an identity of its own and no configuration of this machine. */
export interface TemporaryRepository {
  /** Absolute, links resolved. */
  readonly folder: string;
  /** For children of a test (our own git questions, the command line): no `GIT_*` of the surroundings. */
  readonly environment: NodeJS.ProcessEnv;
  /** Runs git in the folder and answers its standard output; rejects with git's words when its status is not 0 (a merge conflict, too). */
  git(...args: string[]): Promise<string>;
  /** Writes a file below the folder, with its folders. */
  write(path: string, content: string | Uint8Array): Promise<void>;
  /** Makes `sh` run this text as a hook; `name` as git knows it, such as `pre-commit`. */
  hook(name: string, script: string): Promise<void>;
  remove(): Promise<void>;
}

/**
 * The invented identity and a clean configuration, set over whatever the surroundings have.
 * Names that simple-git must be told to let through.
 */
const fixed = {
  GIT_CONFIG_GLOBAL: '/dev/null',
  GIT_CONFIG_NOSYSTEM: '1',
  GIT_AUTHOR_NAME: 'Test Modeller',
  GIT_AUTHOR_EMAIL: 'modeller@northmere.example',
  GIT_COMMITTER_NAME: 'Test Modeller',
  GIT_COMMITTER_EMAIL: 'modeller@northmere.example',
  GIT_TERMINAL_PROMPT: '0',
};

export function cleanEnvironment(more: NodeJS.ProcessEnv = {}): NodeJS.ProcessEnv {
  const inherited = Object.entries(process.env).filter(
    ([name]) =>
      !name.startsWith('GIT_') && !['EDITOR', 'VISUAL', 'PAGER', 'PREFIX', 'SSH_ASKPASS'].includes(name),
  );
  return { ...Object.fromEntries(inherited), ...fixed, ...more };
}

/** Runs git in any folder as `TemporaryRepository.git` does, with further variables. */
export function gitIn(folder: string, more: NodeJS.ProcessEnv = {}): (...args: string[]) => Promise<string> {
  const environment = cleanEnvironment(more);
  const git = simpleGit({
    baseDir: folder,
    // simple-git takes a failure without words on standard error, such as a merge conflict, for success.
    errors: (error, { exitCode, stdOut, stdErr }) =>
      error ?? (exitCode === 0 ? undefined : Buffer.concat([...stdOut, ...stdErr])),
    allowEnvironment: Object.keys(environment).filter((name) => name.startsWith('GIT_')),
    unsafe: {
      allowUnsafeConfigPaths: true,
      allowUnsafeConfigEnvCount: true,
      allowUnsafeHooksPath: true,
      allowUnsafeProtocolOverride: true,
      allowUnsafeFilter: true,
      allowUnsafeFsMonitor: true,
    },
  }).env(environment);
  return async (...args) => git.raw(args);
}

/**
 * Makes a repository on branch `main`; where there are files, they are its first commit.
 * `init` holds further options of `git init`, such as `--object-format=sha256`.
 */
export async function temporaryRepository(
  files: Record<string, string | Uint8Array> = {},
  init: readonly string[] = [],
): Promise<TemporaryRepository> {
  const folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
  const git = gitIn(folder);
  const write = async (path: string, content: string | Uint8Array) => {
    const file = join(folder, path);
    await mkdir(dirname(file), { recursive: true });
    await writeFile(file, content);
  };
  await git('init', '--quiet', '--initial-branch=main', ...init);
  await git('config', 'gc.auto', '0');
  for (const [path, content] of Object.entries(files)) await write(path, content);
  if (Object.keys(files).length > 0) {
    await git('add', '--all');
    await git('commit', '--quiet', '--message', 'First state');
  }
  return {
    folder,
    environment: cleanEnvironment(),
    git,
    write,
    async hook(name, script) {
      const path = join('.git', 'hooks', name);
      await write(path, `#!/bin/sh\n${script}\n`);
      await chmod(join(folder, path), 0o755);
    },
    remove: () => rm(folder, { recursive: true, force: true }),
  };
}
