import { readFileSync } from 'node:fs';
import { parseDocument } from 'yaml';
import { buildFacts } from '../../src/facts/build.ts';
import { evidenceFor } from '../../src/facts/evidence.ts';
import type { Facts } from '../../src/facts/facts.ts';
import type { Manifest } from '../../src/manifest/manifest.ts';
import { readManifest } from '../../src/manifest/read.ts';
import { buildRecords } from '../../src/records/build.ts';
import { makeSeals } from '../../src/records/make-seals.ts';
import type { Records } from '../../src/records/record.ts';
import { newest, type Schemes, schemes } from '../../src/records/schemes.ts';
import type { Seal } from '../../src/records/seal.ts';
import { withChecksum } from '../../src/records/seal-entry.ts';
import { readSealsFile, writeSealsFile } from '../../src/records/seals-file.ts';
import { judgeStandings } from '../../src/records/standing.ts';
import { type FilesInMemory, snapshotFromMemory } from '../../src/repository/memory.ts';
import type { DiskFile, Snapshot } from '../../src/repository/snapshot.ts';
import { forgetfulValues } from '../../src/repository/value-memory.ts';
import { knownRules } from '../../src/rules/index.ts';
import type { Phase } from '../../src/rules/rule.ts';
import { soundFiles } from './sound-files.ts';

/** What is done to the sound study of sound.yaml. Fields are written with dots, places in lists too: `parameters.values.0.value`. */
export interface Edits {
  readonly set?: Readonly<Record<string, unknown>>;
  readonly remove?: readonly string[];
  /** New content of a file, how it comes from the old, or where a symbolic link leads; null takes the file away. */
  readonly files?: Readonly<
    Record<string, string | { readonly link: string } | null | ((old: string) => string)>
  >;
}

/** A study made from the sound one, and the circumstances under which it is checked. */
export interface StudyEdits extends Edits {
  /** The whole manifest, in place of `set` and `remove`. */
  readonly text?: string;
  /** `now` (unless said): every record is sealed as it stands. `sound`: as it stood before these edits. `none`: nothing is sealed. */
  readonly seals?: 'now' | 'sound' | 'none';
  /** Fields of single seals, by record; the checksum is made to fit. */
  readonly sealed?: Readonly<Record<string, Partial<Seal>>>;
  /** Judge the seals as a later Stoplog, which has one more scheme. */
  readonly upgraded?: true;
  /** What is done to the text of the seals file by hand. */
  readonly byHand?: (seals: string) => string;
  /** The manifest of the commit before, made from the sound one; null (unless said): there was none. */
  readonly before?: Edits | null;
  /** Fields of single seals as they were in the commit before, where all else was sealed as it is now. */
  readonly sealedBefore?: NonNullable<StudyEdits['sealed']>;
  /** Unless said: 2021-03-01, a month after all was sealed. */
  readonly today?: string;
  /** Unless said, the manifest's. */
  readonly phase?: Phase;
  /** Files on disk that git does not track. */
  readonly untracked?: readonly string[];
  /** Files on disk that are kept outside git. */
  readonly beside?: Readonly<Record<string, DiskFile>>;
  /** Files that other manifests of the repository have as their own. */
  readonly claimedElsewhere?: Readonly<Record<string, { manifest: string; record: string }>>;
}

const path = 'stoplog.yaml';
const sealsPath = 'stoplog.seals.json';
const soundText = readFileSync(new URL('sound.yaml', import.meta.url), 'utf8');
const soundDocument = parseDocument(soundText);
const filesOfSound = soundFiles();

/** The facts of an edited study, through the real rooms. Throws when the edited manifest can't be read. */
export async function studyFacts(edits: StudyEdits = {}): Promise<Facts> {
  const text = edits.text ?? (edits.set || edits.remove ? manifestText(edits) : soundText);
  const manifest = readable(text);
  const files = { ...editedFiles(edits), [path]: text };
  const snapshot = snapshotOf(files, edits);
  const records = await buildRecords(manifest, snapshot);
  const isSound = edits.seals === 'sound';
  const [sealedState, sealedSnapshot] = isSound
    ? [await soundRecords(), soundSnapshot()]
    : [records, snapshot];
  const sealedAs = (changed: StudyEdits['sealed']) => sealsOf(sealedState, sealedSnapshot, changed ?? {});
  const seals = edits.seals === 'none' ? new Map() : await sealedAs(edits.sealed);
  const written = seals.size === 0 ? null : (edits.byHand ?? String)(writeSealsFile(seals));
  const sealsFile = readSealsFile(sealsPath, written);
  return buildFacts({
    manifest,
    records,
    sealsFile,
    standings: judgeStandings(records, sealsFile, edits.upgraded ? laterSchemes : schemes),
    snapshot: {
      ...snapshotOf(written === null ? files : { ...files, [sealsPath]: written }, edits),
      readBefore: async (asked) =>
        edits.sealedBefore === undefined || asked !== sealsPath
          ? null
          : new TextEncoder().encode(writeSealsFile(await sealedAs(edits.sealedBefore))),
    },
    today: edits.today ?? '2021-03-01',
    phase: edits.phase ?? manifest.data.study?.phase ?? 'setup',
    known: knownRules(),
    before: edits.before ? readable(manifestText(edits.before)) : null,
    claimedElsewhere: new Map(Object.entries(edits.claimedElsewhere ?? {})),
  });
}

/** The text of the sound manifest with these edits. */
export function manifestText({ set = {}, remove = [] }: Edits): string {
  const document = soundDocument.clone();
  const keys = (field: string) => field.split('.').map((key) => (/^\d+$/.test(key) ? Number(key) : key));
  for (const field of remove) {
    if (!document.deleteIn(keys(field))) throw new Error(`sound.yaml has no ${field} to remove`);
  }
  for (const [field, value] of Object.entries(set)) document.setIn(keys(field), document.createNode(value));
  return document.toString({ lineWidth: 0 });
}

function readable(text: string): Manifest {
  const { manifest, problems } = readManifest(path, text);
  if (manifest === null)
    throw new Error(problems.map(({ line, message }) => `line ${line}: ${message}`).join('\n'));
  return manifest;
}

function editedFiles({ files = {} }: Edits): FilesInMemory {
  const edited = new Map<string, string | { readonly link: string }>(Object.entries(filesOfSound));
  for (const [name, change] of Object.entries(files)) {
    if (change === null) edited.delete(name);
    else edited.set(name, typeof change === 'function' ? change(filesOfSound[name] ?? '') : change);
  }
  return Object.fromEntries(edited);
}

/** What is computed from the same content is the same in every study. */
const { remember } = forgetfulValues();

/** Files in memory; the blobs of the sound study can be read too, as git keeps them. */
function snapshotOf(files: FilesInMemory, { untracked = [], beside = {} }: StudyEdits): Snapshot {
  const snapshot = snapshotFromMemory(files);
  const readBlob: Snapshot['readBlob'] = async (id, limit) =>
    (await snapshot.readBlob(id, limit)) ?? (await soundSnapshot().readBlob(id, limit));
  return { ...snapshot, untracked, readBlob, remember, fileBeside: async (file) => beside[file] ?? null };
}

const laterSchemes: Schemes = [...schemes, { ...newest(schemes), number: newest(schemes).number + 1 }];

const soundSnapshot = once(() => ({
  ...snapshotFromMemory({ ...filesOfSound, [path]: soundText }),
  remember,
}));
const soundRecords = once(() => buildRecords(readable(soundText), soundSnapshot()));

function once<Result>(make: () => Result): () => Result {
  let made: { readonly result: Result } | undefined;
  return () => {
    made ??= { result: make() };
    return made.result;
  };
}

/** A seal of every record that can be sealed as it stands, by an invented reviewer. */
async function sealsOf(
  records: Records,
  snapshot: Snapshot,
  changed: NonNullable<StudyEdits['sealed']>,
): Promise<ReadonlyMap<string, Seal>> {
  const sealsFile = readSealsFile(sealsPath, null);
  const standings = judgeStandings(records, sealsFile);
  const { seals } = makeSeals({
    records,
    sealsFile,
    standings,
    wanted: 'all',
    because: null,
    person: 'Test Reviewer <reviewer@eastmoor.example>',
    today: '2021-02-01',
    evidence: await evidenceFor({ records, standings, manifest: records.manifest }, snapshot),
  });
  return new Map([...seals].map(([id, seal]) => [id, withChecksum({ ...seal, ...changed[id] })]));
}
