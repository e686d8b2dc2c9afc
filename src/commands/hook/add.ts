import { mkdir, rename } from 'node:fs/promises';
import { dirname, join, relative } from 'node:path';
import { Failure } from '../../failure.ts';
import type { Repository } from '../../repository/repository.ts';
import { type Before, earlierName, withBlock } from './block.ts';
import { hookHome } from './home.ts';
import { type HookContent, interpreter, isThere, lookAtHook } from './look.ts';
import { type Done, type HookReport, reportHooks } from './report.ts';
import { type HookName, hooksInClone, hooksOnServer, scriptForGit, scriptForHusky } from './script.ts';
import { change, writeHook } from './write.ts';

/**
 * Writes the hooks. One that is there is kept and runs first; one of ours that someone changed is left alone. `base` is the
 * revision that they compare with; without it, the one that a hook of ours has already, or none.
 * Failures: 'usage' (a repository where they would not run, see `hookHome`; a base that is no name of a revision),
 * 'unreadable-file', 'unwritable-file'.
 */
export async function addHooks(
  repository: Repository,
  { hooks = hooksInClone, base }: { readonly hooks?: readonly HookName[]; readonly base?: string } = {},
): Promise<HookReport> {
  refuseElsewhere(repository, hooks);
  if (base !== undefined) refuseBase(base, hooks);
  const home = await hookHome(repository);
  if (home.refusal !== null) throw home.refusal;
  let foldersMade = await makeFolders(home.folder);
  const done = new Map<string, Done>();
  for (const hook of hooks) {
    const there = await lookAtHook(home, hook);
    done.set(there.file, await addHook(there, base, foldersMade));
    foldersMade = 0; // The first hook remembers them for all.
  }
  const isKnown = base === undefined || (await repository.resolve(base).then(Boolean, () => false));
  const notes = isKnown
    ? home.notes
    : [
        ...home.notes,
        `${base} names no commit here yet. Until it does, the whole state is checked; if it is misspelt, run \`stoplog hook add --base\` with the right name.`,
      ];
  return reportHooks(repository, { ...home, notes }, done);
}

/** Hooks that would never run here. */
function refuseElsewhere({ bare, cwd }: Repository, hooks: readonly HookName[]): void {
  const server: readonly HookName[] = hooksOnServer;
  if (bare && hooks.some((hook) => !server.includes(hook))) {
    throw new Failure(
      'usage',
      `${cwd} is a bare repository: it has no work tree, so nobody commits in it and these hooks would never run.`,
      'Run `stoplog hook add` in the clones where people work, or `stoplog hook add --for pre-receive` here, to check what is pushed to it.',
    );
  }
  if (!bare && hooks.some((hook) => server.includes(hook))) {
    throw new Failure(
      'usage',
      `${cwd} has a work tree: people work in it, and do not push to it.`,
      'Run `stoplog hook add --for pre-receive` in the bare repository that they push to; without `--for` the hooks for work are added here.',
    );
  }
}

/** A base stands in quotes in the hook, and is found there again. */
function refuseBase(base: string, hooks: readonly HookName[]): void {
  const server: readonly HookName[] = hooksOnServer;
  if (hooks.some((hook) => server.includes(hook)))
    throw new Failure(
      'usage',
      '`--base` is not for pre-receive: a push is always compared with what its branch held.',
      'Leave it out: `stoplog hook add --for pre-receive`.',
    );
  if (!/^[\w./@][\w./@{}^~+-]*$/.test(base))
    throw new Failure(
      'usage',
      `\`--base ${base}\` is no name of a revision that a hook can hold.`,
      'Name the branch that changes go to, such as `--base origin/main`.',
    );
}

async function addHook(there: HookContent, asked: string | undefined, foldersMade: number): Promise<Done> {
  const base = asked ?? there.block?.base ?? null;
  if (there.found === 'changed') return 'left';
  if (there.block !== null) return renew(there, { ...there.block, base });
  if (there.content === null) {
    const mode = there.home.starter === 'git' ? 0o755 : 0o644;
    await writeHook(there.file, compose(there, { was: 'nothing', foldersMade, base }, ''), mode);
    return 'written';
  }
  if (there.home.starter === 'husky') {
    const content = compose(there, { was: 'the lines below', foldersMade, base }, there.content);
    await writeHook(there.file, content, there.mode);
    return 'written';
  }
  await moveAside(there, async (earlier) => {
    await writeHook(there.file, compose(there, { was: `the hook ${earlier}`, foldersMade, base }, ''), 0o755);
  });
  return 'written';
}

/** Brings a hook of ours to the text of this version, with what it remembers. */
async function renew(there: HookContent, block: Written & { readonly rest: string }): Promise<Done> {
  const content = compose(there, block, block.rest);
  const skipped = there.home.starter === 'git' && !there.executable;
  if (content === there.content && !skipped) return 'none';
  await writeHook(there.file, content, skipped ? 0o755 : there.mode);
  return 'renewed';
}

interface Written extends Before {
  readonly base: string | null;
}

/** The text of a hook of ours: with husky around the project's own lines, else whole. */
function compose({ hook, home }: HookContent, { base, ...before }: Written, rest: string): string {
  return home.starter === 'husky'
    ? withBlock(rest, scriptForHusky(hook, base), before)
    : withBlock(interpreter, scriptForGit(hook, base, earlierName(before)), before);
}

/** Gives the earlier hook a free name beside it, and its own back where ours could not be written. */
async function moveAside(there: HookContent, write: (earlier: string) => Promise<void>): Promise<void> {
  const folder = dirname(there.file);
  let name = `${there.hook}.local`;
  for (let number = 2; await isThere(join(folder, name)); number += 1) name = `${there.hook}.local-${number}`;
  const aside = join(folder, name);
  await change(there.file, () => rename(there.file, aside));
  try {
    await write(name);
  } catch (error) {
    await rename(aside, there.file);
    throw error;
  }
}

/** How many folders had to be made. */
async function makeFolders(folder: string): Promise<number> {
  const outermost = await change(folder, () => mkdir(folder, { recursive: true }));
  return outermost === undefined ? 0 : relative(dirname(outermost), folder).split(/[\\/]/).length;
}
