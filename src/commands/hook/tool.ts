import { constants } from 'node:fs';
import { access, stat } from 'node:fs/promises';
import { delimiter, join } from 'node:path';
import { ask, type Question } from '../../repository/git.ts';
import { namesFromOutput } from '../../repository/names.ts';
import type { Repository } from '../../repository/repository.ts';
import { bundleInProject } from './script.ts';

/** What a hook would start, looked for as the hook itself does; null where it would find nothing. */
export interface Tool {
  readonly node: string | null;
  readonly stoplog: string | null;
  /** Whether the project's own is left aside, because git tracks it. */
  readonly leftAside: boolean;
}

const tracksNodeModules: Question<boolean> = {
  args: ['ls-files', '-z'],
  parse: (output) => namesFromOutput(output).some((path) => /^node_modules(\/|$)/i.test(path)),
};

/**
 * `PATH` is the one of this run, which a hook of a graphical program need not share. Folders `node_modules/.bin`
 * in it don't count: npm and npx put them there for their own children only.
 */
export async function findTool(repository: Repository): Promise<Tool> {
  const bundle = join(repository.cwd, bundleInProject);
  const folders = (repository.environment.PATH ?? '')
    .split(delimiter)
    .filter((folder) => folder !== '' && !/node_modules[\\/]\.bin[\\/]?$/.test(folder));
  const onPath = async (name: string): Promise<string | null> => {
    for (const folder of folders) {
      for (const file of [join(folder, name), join(folder, `${name}.exe`)]) {
        if (await isFile(file, constants.X_OK)) return file;
      }
    }
    return null;
  };
  const own = await isFile(bundle, constants.R_OK);
  const leftAside = own && !repository.bare && (await ask(repository, tracksNodeModules));
  return {
    node: await onPath('node'),
    stoplog: own && !leftAside ? bundle : await onPath('stoplog'),
    leftAside,
  };
}

async function isFile(path: string, right: number): Promise<boolean> {
  try {
    await access(path, right);
    return (await stat(path)).isFile();
  } catch {
    return false;
  }
}
