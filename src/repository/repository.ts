import { realpathSync } from 'node:fs';
import { relative, resolve, sep } from 'node:path';
import { Failure } from '../failure.ts';
import { ask, gitEnvironment, type Place, type Question, startFailure } from './git.ts';
import type { ObjectFormat } from './object-id.ts';

/** One git repository, as git finds it from a folder. All paths are absolute. */
export interface Repository extends Place {
  /** Top of the work tree; null in a bare repository, or inside the git directory. */
  readonly top: string | null;
  /** The folder that asked, from the top with `/`; empty at the top, and where there is none. */
  readonly here: string;
  readonly bare: boolean;
  /** Cut-off history: `git clone --depth`. */
  readonly shallow: boolean;
  readonly objectFormat: ObjectFormat;
  readonly gitDirectory: string;
  /** The git directory that all linked work trees share. */
  readonly commonDirectory: string;
  /** Where objects are written: in a hook of a receiving repository, the quarantine. */
  readonly objectsFolder: string;
  /** The index in force: a temporary one in the hooks of `git commit -a` and `git commit PATH`. */
  readonly indexFile: string;
  /** Where git children run: the top, else the git directory. */
  readonly cwd: string;
  /** For git children; paths that git gave relative are absolute here. */
  readonly environment: NodeJS.ProcessEnv;
  /** `Name <email>` as git would sign a commit. Failure 'no-identity' where nobody said who they are. */
  identity(): Promise<string>;
  /** The full id of the commit that a revision names. Failure 'unknown-revision'. */
  resolve(revision: string): Promise<string>;
}

interface Layout {
  readonly bare: boolean;
  readonly shallow: boolean;
  readonly objectFormat: ObjectFormat;
  readonly folders: readonly [git: string, common: string, objects: string, index: string];
  /** From the folder that asked up to the top; null without a work tree there. */
  readonly up: string | null;
}

/** How the repository is laid out, in one process. */
export const layout: Question<Layout> = {
  args: [
    ...['rev-parse', '--path-format=absolute'],
    ...['--is-bare-repository', '--is-shallow-repository', '--show-object-format'],
    ...['--absolute-git-dir', '--git-common-dir', '--git-path', 'objects', '--git-path', 'index'],
    '--show-cdup',
  ],
  parse(output) {
    const lines = output.toString('utf8').split('\n');
    const [bare, shallow, format, git, common, objects, index, up] = lines;
    const known = index !== undefined && (format === 'sha1' || format === 'sha256');
    // Without a work tree git prints no last line; the text then ends after the index.
    const lineCount = lines.length - 1;
    if (!known || !git || !common || !objects || lineCount < 7 || lineCount > 8) {
      throw new Failure(
        'git-failed',
        `git described the repository in a way that could not be read: ${JSON.stringify(lines)}.`,
        'See that git is 2.31 or newer, and that no folder above the repository has a line break in its name.',
      );
    }
    return {
      bare: bare === 'true',
      shallow: shallow === 'true',
      objectFormat: format,
      folders: [git, common, objects, index],
      up: lineCount === 8 && up !== undefined ? up : null,
    };
  },
};

/** The commit that a revision names, or null. */
export function commitOf(revision: string): Question<string | null> {
  return {
    args: ['rev-parse', '--verify', '--quiet', '--end-of-options', `${revision}^{commit}`],
    statuses: [1],
    parse: (output, status) => (status === 0 ? output.toString('latin1').trim() : null),
  };
}

// Without useConfigOnly git makes a name up from the machine's, which names no person.
const committer: Question<string | null> = {
  args: ['-c', 'user.useConfigOnly=true', 'var', 'GIT_COMMITTER_IDENT'],
  statuses: [128],
  parse: (output, status) => (status === 0 ? output.toString('utf8').replace(/ \d+ [+-]\d+\n$/, '') : null),
};

/**
 * Finds the repository that `cwd` is in. `environment` is the process's own: what git set for a hook counts.
 * Failures: 'no-git', 'no-repository', 'git-failed'.
 */
export async function openRepository(cwd: string, environment: NodeJS.ProcessEnv): Promise<Repository> {
  const asked = { cwd, environment: gitEnvironment(environment) };
  const { bare, shallow, objectFormat, folders, up } = await ask(asked, layout);
  const [gitDirectory, commonDirectory, objectsFolder, indexFile] = folders;
  const folder = physical(asked);
  const top = up === null ? null : resolve(folder, up);
  const here = top === null ? '' : relative(top, folder).replaceAll(sep, '/');
  const absolute = {
    GIT_DIR: gitDirectory,
    GIT_COMMON_DIR: commonDirectory,
    GIT_INDEX_FILE: indexFile,
    GIT_OBJECT_DIRECTORY: objectsFolder,
    ...(top === null ? {} : { GIT_WORK_TREE: top }),
  };
  const given = Object.entries(absolute).filter(([name]) => environment[name] !== undefined);
  const place = {
    cwd: top ?? gitDirectory,
    environment: { ...asked.environment, ...Object.fromEntries(given) },
  };
  return Object.freeze({
    ...place,
    ...{ top, here, bare, shallow, objectFormat },
    ...{ gitDirectory, commonDirectory, objectsFolder, indexFile },
    async identity() {
      const person = await ask(place, committer);
      if (person !== null) return person;
      throw new Failure(
        'no-identity',
        'git knows no name and email for you, and a seal says who reviewed.',
        'Tell git once: git config --global user.name "Your Name" and git config --global user.email "you@example.org"',
      );
    },
    async resolve(revision: string) {
      const commit = await ask(place, commitOf(revision));
      if (commit !== null) return commit;
      throw new Failure(
        'unknown-revision',
        `${JSON.stringify(revision)} names no commit of this repository.`,
        shallow
          ? 'Only the newest commits were fetched here. Fetch the rest (git fetch --unshallow; in CI, fetch depth 0) and try again.'
          : 'See `git log --oneline --all` for what there is, or `git fetch` first.',
      );
    },
  });
}

/** The folder with links resolved, as git sees it when it counts the steps up to the top. */
function physical(asked: Place): string {
  try {
    return realpathSync(asked.cwd);
  } catch (cause) {
    throw startFailure(asked, cause as Error);
  }
}
