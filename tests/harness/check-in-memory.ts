import { examine } from '../../src/commands/examine.ts';
import { readStudies, type Study } from '../../src/commands/studies.ts';
import { evidenceFor } from '../../src/facts/evidence.ts';
import { makeSeals } from '../../src/records/make-seals.ts';
import { writeSealsFile } from '../../src/records/seals-file.ts';
import { snapshotFromMemory } from '../../src/repository/memory.ts';
import type { Snapshot } from '../../src/repository/snapshot.ts';
import { forgetfulValues } from '../../src/repository/value-memory.ts';
import type { Finding } from '../../src/verdict/finding.ts';
import { passes } from '../../src/verdict/judge.ts';

/** Texts by path from the top. */
export type Files = Readonly<Record<string, string>>;

/** The whole check of work trees that are on no disk; all follow one commit. */
export class CheckInMemory {
  private readonly committed: Snapshot;
  private readonly today: string;
  /** What is computed from the same content is the same in every work tree. */
  private readonly remember = forgetfulValues().remember;

  constructor(committed: Files, today: string) {
    this.committed = snapshotFromMemory(committed);
    this.today = today;
  }

  /** All that is found, also what passes by an acceptance or a waiver. */
  async findingsIn(files: Files): Promise<readonly Finding[]> {
    const { manifests } = await examine(this.snapshotOf(files), { today: this.today });
    return manifests.flatMap(({ findings }) => findings);
  }

  /** The one study in the files; null where its manifest can't be read. */
  async studyIn(files: Files): Promise<Study | null> {
    return studyOf(this.snapshotOf(files));
  }

  /** The files with a seal of every record as it stands, by an invented reviewer; as they are where nothing can be sealed. */
  async sealedAnew(files: Files): Promise<Files> {
    const snapshot = this.snapshotOf(files);
    const study = await studyOf(snapshot);
    if (study === null) return files;
    const { seals } = makeSeals({
      ...study,
      wanted: 'all',
      because: 'sealed by a test',
      person: 'Test Reviewer <reviewer@eastmoor.example>',
      today: this.today,
      evidence: await evidenceFor(study, snapshot),
    });
    return { ...files, 'stoplog.seals.json': writeSealsFile(seals) };
  }

  private snapshotOf(files: Files): Snapshot {
    const snapshot = snapshotFromMemory(files);
    const { committed, remember } = this;
    return {
      ...snapshot,
      remember,
      readBlob: async (id, limit) =>
        (await snapshot.readBlob(id, limit)) ?? (await committed.readBlob(id, limit)),
      readBefore: (path) => committed.read(path),
    };
  }
}

async function studyOf(snapshot: Snapshot): Promise<Study | null> {
  const [study] = await readStudies(snapshot);
  return study === undefined || 'problems' in study ? null : study;
}

/** Whether a finding holds the commit back. */
export function blocks(finding: Finding): boolean {
  return finding.level === 'block' && passes(finding) === null;
}

/** Findings a line each. */
export function told(found: readonly Finding[]): readonly string[] {
  return found.map(({ level, rule, record, message }) => `${level} ${rule} ${record}: ${message}`);
}
