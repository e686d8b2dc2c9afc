import { existsSync, statSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { basename, dirname, isAbsolute, join, relative, resolve } from 'node:path';
import { Failure } from '../../failure.ts';
import { ask, type Question } from '../../repository/git.ts';
import type { Repository } from '../../repository/repository.ts';
import { type HookName, hooksInClone, hooksOnServer } from './script.ts';

/** A folder in which hooks lie. */
export interface HookHome {
  /** Absolute. With husky the project's own scripts, not the ones that husky makes. */
  readonly folder: string;
  readonly starter: 'git' | 'husky';
  /** Whether git comes here now: `core.hooksPath` may have led elsewhere since, or husky is not set up. */
  readonly inForce: boolean;
  /** Why no hook of ours may be written here; null where one may. */
  readonly refusal: Failure | null;
  /** What people should know about hooks in this folder; whole sentences. */
  readonly notes: readonly string[];
}

interface HooksPath {
  readonly scope: string;
  /** As it is written in the settings of git. */
  readonly value: string;
}

const hooksPath: Question<HooksPath | null> = {
  args: ['config', '--null', '--show-scope', '--get', 'core.hooksPath'],
  statuses: [1],
  parse(output, status) {
    const [scope = '', value = ''] = output.toString('utf8').split('\0');
    return status === 0 ? { scope, value } : null;
  },
};

/** Where git looks for hooks, `core.hooksPath` heeded. */
const hooksFolder: Question<string> = {
  args: ['rev-parse', '--path-format=absolute', '--git-path', 'hooks'],
  parse: (output) => output.toString('utf8').replace(/\n$/, ''),
};

const tracksAnythingIn = (folder: string): Question<boolean> => ({
  args: ['ls-files', '-z', '--', folder],
  parse: (output) => output.length > 0,
});

/** Where git looks for this repository's hooks now. Throws Failure 'usage', with the reason, inside git's own folder of a work tree. */
export async function hookHome(repository: Repository): Promise<HookHome> {
  const setting = await ask(repository, hooksPath);
  // git takes an empty text as it stands and looks for /pre-commit, but can't say so.
  const folder = resolve(setting?.value === '' ? '/' : await ask(repository, hooksFolder));
  if (repository.bare) {
    const refusal = setting === null ? null : refusalOf(repository, setting, folder);
    return { folder, starter: 'git', inForce: true, refusal, notes: [] };
  }
  const top = workTree(repository);
  const within = setting !== null && isInside(folder, top);
  if (within && basename(folder) === '_') {
    return huskyHome(dirname(folder), existsSync(join(folder, 'h')), top);
  }
  if (setting === null && (await huskyIsPlanned(top))) return huskyHome(join(top, '.husky'), false, top);

  const notes: string[] = [];
  if (within && (await ask(repository, tracksAnythingIn(folder)))) {
    notes.push(`git tracks ${relative(top, folder)}: what changes there reaches others with a commit.`);
  } else if (within && !isAbsolute(setting.value)) {
    notes.push(
      `core.hooksPath is ${setting.value}, taken from the top of each work tree, and git does not track that folder: ` +
        'in another work tree or clone it is missing, and git then runs no hook and does not say so.',
    );
  } else if (repository.gitDirectory !== repository.commonDirectory) {
    notes.push('These hooks serve every work tree of this repository.');
  }
  const refusal = setting === null || within ? null : refusalOf(repository, setting, folder);
  return { folder, starter: 'git', inForce: true, refusal, notes };
}

/** The hooks that git would run in a repository of this kind. */
export function hooksFor({ bare }: Repository): readonly HookName[] {
  return bare ? hooksOnServer : hooksInClone;
}

/** Other folders where hooks of ours may lie since before `core.hooksPath` was set or husky came or went. */
export function formerHomes(repository: Repository, now: HookHome): readonly HookHome[] {
  const former = { inForce: false, refusal: null, notes: [] };
  const homes: HookHome[] = [
    { ...former, folder: join(repository.commonDirectory, 'hooks'), starter: 'git' },
    ...(repository.top === null
      ? []
      : [{ ...former, folder: join(repository.top, '.husky'), starter: 'husky' as const }]),
  ];
  return homes.filter((home) => home.folder !== now.folder);
}

function huskyHome(folder: string, inForce: boolean, top: string): HookHome {
  const name = relative(top, folder);
  const notes = [`${name} belongs to the project: what changes there reaches others with a commit.`];
  if (!inForce) {
    notes.push(
      `husky is not set up in this work tree, so git runs no hook here and does not say so. Set it up with \`npm install\` (its \`prepare\` script does it) or \`npx husky\` in ${top}.`,
    );
  }
  return { folder, starter: 'husky', inForce, refusal: null, notes };
}

/** A fresh clone of a project with husky: its scripts are there, and `npm install` will set `core.hooksPath`. */
async function huskyIsPlanned(top: string): Promise<boolean> {
  if (!existsSync(join(top, '.husky'))) return false;
  const project = await readFile(join(top, 'package.json'), 'utf8').catch(() => '');
  return project.includes('husky');
}

function workTree({ top, cwd }: Repository): string {
  if (top !== null) return top;
  throw new Failure(
    'usage',
    `${cwd} is inside git’s own folder, which has no work tree.`,
    'Change to the top of the work tree and try again.',
  );
}

/** Why hooks can't be written to a folder outside the work tree: hooks are switched off, or it serves others too. */
function refusalOf(
  { commonDirectory }: Repository,
  { scope, value }: HooksPath,
  folder: string,
): Failure | null {
  const own = `git config core.hooksPath '${join(commonDirectory, 'hooks')}'`;
  if (value === '' || (existsSync(folder) && !statSync(folder).isDirectory())) {
    const what = value === '' ? 'set to an empty text' : `${value}, which is no folder`;
    return new Failure(
      'usage',
      `core.hooksPath is ${what}, so git runs no hooks here.`,
      `Give this repository hooks again: ${own}`,
    );
  }
  if ((scope === 'global' || scope === 'system') && !isInside(folder, commonDirectory)) {
    return new Failure(
      'usage',
      `core.hooksPath is ${value} in your ${scope} git settings: all your repositories share that folder, and a hook there would hold back commits in each of them.`,
      `Give this repository hooks of its own, which then run instead of the shared ones: ${own}`,
    );
  }
  return null;
}

function isInside(path: string, folder: string): boolean {
  const way = relative(folder, path);
  return way !== '' && !isAbsolute(way) && way.split(/[\\/]/)[0] !== '..';
}
