import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { examine } from '../../src/commands/examine.ts';
import { readStudies } from '../../src/commands/studies.ts';
import { evidenceFor } from '../../src/facts/evidence.ts';
import { makeSeals } from '../../src/records/make-seals.ts';
import { writeSealsFile } from '../../src/records/seals-file.ts';
import { snapshotFromMemory } from '../../src/repository/memory.ts';
import type { Snapshot } from '../../src/repository/snapshot.ts';
import { forgetfulValues } from '../../src/repository/value-memory.ts';
import type { Finding } from '../../src/verdict/finding.ts';

export type Files = Readonly<Record<string, string>>;

const project = join(import.meta.dirname, '../../example-project');
const today = '2025-04-01';

/** The example project, by path from its folder, without what is kept outside git. */
export const example: Files = Object.fromEntries(
  readdirSync(project, { recursive: true, encoding: 'utf8' })
    .filter((path) => !path.startsWith('radar') && statSync(join(project, path)).isFile())
    .map((path) => [path.replaceAll('\\', '/'), readFileSync(join(project, path), 'utf8')]),
);

/** What is computed from the same content is the same in every copy. */
const { remember } = forgetfulValues();
const committed = snapshotFromMemory(example);

/** A copy of the example, as it stands in a work tree after the example was committed. */
function snapshotOf(files: Files): Snapshot {
  const snapshot = snapshotFromMemory(files);
  return {
    ...snapshot,
    remember,
    readBlob: async (id, limit) =>
      (await snapshot.readBlob(id, limit)) ?? (await committed.readBlob(id, limit)),
    readBefore: (path) => committed.read(path),
  };
}

/** All that the check finds in a copy of the example. */
export async function findingsIn(files: Files): Promise<readonly Finding[]> {
  const { manifests } = await examine(snapshotOf(files), { today });
  return manifests.flatMap(({ findings }) => findings);
}

const [sound] = await readStudies(snapshotOf(example));

/** Records, and all that rest on them, as the sound example has it. */
export function above(records: readonly string[]): Set<string> {
  const all = new Set(records);
  if (sound === undefined || 'problems' in sound) throw new Error('the example can’t be read');
  const nodes = [...sound.records.nodes.values()];
  for (const below of all)
    for (const { id, restsOn } of nodes)
      if (restsOn.some((one) => one === below || one.startsWith(`${below}.`))) all.add(id);
  return all;
}

/** The copy with every record sealed as it stands that can be; as it is where its manifest can't be read. */
export async function sealedAnew(files: Files): Promise<Files> {
  const snapshot = snapshotOf(files);
  const [study] = await readStudies(snapshot);
  if (study === undefined || 'problems' in study) return files;
  const { seals } = makeSeals({
    ...study,
    wanted: 'all',
    because: 'planted',
    person: 'Test Reviewer <reviewer@eastmoor.example>',
    today,
    evidence: await evidenceFor(study, snapshot),
  });
  return { ...files, 'stoplog.seals.json': writeSealsFile(seals) };
}
