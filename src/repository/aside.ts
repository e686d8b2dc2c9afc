import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { delimiter, join } from 'node:path';
import type { Place } from './git.ts';
import type { ObjectFormat } from './object-id.ts';

/** A temporary folder beside the repository, for what must not be written into it. */
export interface Aside {
  readonly folder: string;
  remove(): Promise<void>;
}

export async function openAside(): Promise<Aside> {
  const folder = await mkdtemp(join(tmpdir(), 'stoplog-'));
  return { folder, remove: () => rm(folder, { recursive: true, force: true, maxRetries: 3 }) };
}

interface Objects extends Place {
  readonly objectsFolder: string;
  readonly objectFormat: ObjectFormat;
}

/**
 * A place where git only sees the objects: an empty git directory whose object folder is the repository's.
 * There no remote is known, so a blob that a partial clone left behind is missing and neither fetched nor
 * fatal (in the clone itself the first such blob ends `git cat-file`), and no replacement is known either.
 */
export async function objectsOnly(aside: Aside, objects: Objects): Promise<Place> {
  const gitDirectory = join(aside.folder, 'objects-only');
  await mkdir(join(gitDirectory, 'refs'), { recursive: true });
  await writeFile(join(gitDirectory, 'HEAD'), 'ref: refs/heads/none\n');
  await writeFile(
    join(gitDirectory, 'config'),
    `[core]\n\trepositoryformatversion = 1\n\tbare = true\n[extensions]\n\tobjectformat = ${objects.objectFormat}\n`,
  );
  const { GIT_WORK_TREE, GIT_COMMON_DIR, GIT_INDEX_FILE, ...environment } = objects.environment;
  return {
    cwd: gitDirectory,
    environment: { ...environment, GIT_DIR: gitDirectory, GIT_OBJECT_DIRECTORY: objects.objectsFolder },
  };
}

/** The environment in which git writes objects into a folder of ours and still reads the repository's. */
export async function writingAside(aside: Aside, objects: Objects): Promise<Objects> {
  const objectsFolder = join(aside.folder, 'objects');
  await mkdir(objectsFolder, { recursive: true });
  const before = objects.environment.GIT_ALTERNATE_OBJECT_DIRECTORIES;
  const alternates = [quoted(objects.objectsFolder), ...(before ? [before] : [])].join(delimiter);
  const environment = {
    ...objects.environment,
    GIT_OBJECT_DIRECTORY: objectsFolder,
    GIT_ALTERNATE_OBJECT_DIRECTORIES: alternates,
  };
  return { cwd: objects.cwd, objectFormat: objects.objectFormat, environment, objectsFolder };
}

/** As git(1) has it for GIT_ALTERNATE_OBJECT_DIRECTORIES: quoted, a path may hold the separator. */
function quoted(path: string): string {
  return `"${path.replace(/["\\]/g, '\\$&')}"`;
}
