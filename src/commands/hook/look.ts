import { lstat, readFile, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { Failure } from '../../failure.ts';
import { type Block, earlierName, findBlock } from './block.ts';
import type { HookHome } from './home.ts';
import type { HookName } from './script.ts';

/** A hook as it lies on the disk. */
export interface HookState {
  readonly hook: HookName;
  /** Absolute path, whether or not there is a file. */
  readonly file: string;
  readonly home: HookHome;
  /** `changed`: has our marks, but the lines between are not ours any more. */
  readonly found: 'nothing' | 'ours' | 'changed' | 'another';
  readonly executable: boolean;
  /** The revision that ours compares with; null where it checks the whole state. */
  readonly base: string | null;
  /** The hook that ours runs first, where it was moved aside. */
  readonly earlier: { readonly file: string; readonly executable: boolean; readonly exists: boolean } | null;
}

/** The same with what is needed to change it. */
export interface HookContent extends HookState {
  /** A byte a character; null without a file. */
  readonly content: string | null;
  readonly mode: number;
  readonly block: Block | null;
}

/** The line that a hook of ours needs beside our part, so that git can start it. */
export const interpreter = '#!/bin/sh\n';

/** Reads one hook. Throws Failure 'unreadable-file'. */
export async function lookAtHook(home: HookHome, hook: HookName): Promise<HookContent> {
  const file = join(home.folder, hook);
  const content = await readHook(file);
  const mode = await modeOf(file);
  const block = content === null ? null : findBlock(content);
  const name = block === null ? null : earlierName(block);
  const earlier = name === null ? null : join(home.folder, name);
  return {
    ...{ hook, file, home, content, mode, block },
    found:
      content === null ? 'nothing' : block === null ? 'another' : isChanged(home, block) ? 'changed' : 'ours',
    executable: isExecutable(mode),
    base: block?.base ?? null,
    earlier:
      earlier === null
        ? null
        : {
            file: earlier,
            executable: isExecutable(await modeOf(earlier)),
            exists: await isThere(earlier),
          },
  };
}

/** Whether anything has this name, a link that leads nowhere included. */
export async function isThere(path: string): Promise<boolean> {
  return lstat(path).then(
    () => true,
    () => false,
  );
}

/** Lines beside ours are the project's in a hook of husky's, and a change of ours in a hook that we wrote whole. */
function isChanged(home: HookHome, block: Block): boolean {
  return block.changed || (home.starter === 'git' && block.rest !== interpreter);
}

async function readHook(file: string): Promise<string | null> {
  try {
    return await readFile(file, 'latin1');
  } catch (cause) {
    if (cause instanceof Error && 'code' in cause && (cause.code === 'ENOENT' || cause.code === 'ENOTDIR')) {
      return (await isThere(file)) ? '' : null;
    }
    throw new Failure(
      'unreadable-file',
      `The hook ${file} could not be read (${cause instanceof Error ? cause.message : String(cause)}).`,
      'Nothing was changed. Give yourself the right to read it, then try again.',
      cause,
    );
  }
}

async function modeOf(file: string): Promise<number> {
  return stat(file).then(
    (found) => found.mode & 0o7777,
    () => 0,
  );
}

const isExecutable = (mode: number) => (mode & 0o111) !== 0;
