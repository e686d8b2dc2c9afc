import { Failure } from '../failure.ts';
import { discoverManifests, manifestName } from '../manifest/discover.ts';
import type { Manifest, Problem } from '../manifest/manifest.ts';
import { rememberedManifest } from '../manifest/remembered-manifest.ts';
import { buildRecords } from '../records/build.ts';
import { gitPath } from '../records/paths.ts';
import type { Records } from '../records/record.ts';
import type { SealsFile, Standing } from '../records/seal.ts';
import { readSealsFile } from '../records/seals-file.ts';
import { sealsName, sealsPathOf } from '../records/seals-path.ts';
import { judgeStandings } from '../records/standing.ts';
import type { Snapshot } from '../repository/snapshot.ts';

/** Files that belong to a work tree's state even before their first `git add`. */
export const stoplogFiles: readonly string[] = [manifestName, sealsName];

/** One manifest with everything that stands beside it in a snapshot. */
export interface Study {
  readonly manifest: Manifest;
  readonly records: Records;
  readonly sealsFile: SealsFile;
  readonly standings: ReadonlyMap<string, Standing>;
}

/** A manifest that could not be read. */
export interface Unread {
  readonly path: string;
  readonly problems: readonly Problem[];
}

/** Every manifest of a snapshot with its records, seals and standings. Throws Failure 'no-manifest' where there is none. */
export async function readStudies(snapshot: Snapshot): Promise<readonly (Study | Unread)[]> {
  const manifests = discoverManifests(snapshot.entries.keys());
  if (manifests.length === 0) throw noManifest(snapshot);
  const studies: (Study | Unread)[] = [];
  for (const { path } of manifests) studies.push(await readStudy(snapshot, path));
  return studies;
}

/** For `catch`, where a state without any manifest is no failure: of a base nothing is known then. */
export function withoutManifest(error: unknown): readonly never[] {
  if (error instanceof Failure && error.code === 'no-manifest') return [];
  throw error;
}

async function readStudy(snapshot: Snapshot, path: string): Promise<Study | Unread> {
  const text = await readText(snapshot, path);
  if (text === null) {
    const found = 'content that is not in this repository (not fetched, or a link that leads outside)';
    const expected = 'the text of the manifest';
    const message = 'The manifest can’t be read, so nothing about this study can be checked.';
    return { path, problems: [{ line: 1, column: 1, field: '', message, expected, found }] };
  }
  const { manifest, problems } = await rememberedManifest(path, text, snapshot);
  if (manifest === null) return { path, problems };
  const records = await buildRecords(manifest, snapshot);
  const sealsPath = sealsPathOf(manifest);
  const sealsFile = readSealsFile(
    sealsPath,
    snapshot.entries.has(sealsPath) ? await readText(snapshot, sealsPath) : null,
  );
  return { manifest, records, sealsFile, standings: judgeStandings(records, sealsFile) };
}

async function readText(snapshot: Snapshot, path: string): Promise<string | null> {
  const bytes = await snapshot.read(path);
  return bytes === null ? null : new TextDecoder().decode(bytes);
}

function noManifest(snapshot: Snapshot): Failure {
  const untracked = snapshot.untracked.filter((path) => path.split('/').at(-1) === manifestName);
  return untracked.length > 0
    ? new Failure(
        'no-manifest',
        `${untracked.join(', ')} is not tracked by git, so what is ${snapshot.label} holds no ${manifestName}.`,
        `Stage it first: git add ${untracked.map(gitPath).join(' ')}`,
      )
    : new Failure(
        'no-manifest',
        `There is no ${manifestName} in ${snapshot.at.kind === 'revision' ? '' : 'the '}${snapshot.label}: no catchment model is recorded here yet.`,
        `To begin, write a ${manifestName} beside the model with \`stoplog: 1\`, a \`study\` (purpose, decision, phase) and a ` +
          '`model` (name, version, release); then run `stoplog check` and answer what it asks.',
      );
}
