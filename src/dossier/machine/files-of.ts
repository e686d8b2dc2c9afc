import { fromTop } from '../../records/paths.ts';
import type { Elsewhere, RecordNode } from '../../records/record.ts';
import type { FileIdentity } from '../../repository/snapshot.ts';
import type { DossierContent, DossierStudy } from '../content.ts';

/** A file that records depend on; digest and size are null where its content could not be verified. */
export interface RecordedFile {
  /** From the top of the repository. */
  readonly path: string;
  readonly sha256: string | null;
  readonly bytes: number | null;
  /** Whether its content can be had from the repository. */
  readonly isHere: boolean;
  /** Records whose own file it is, and records that only read it. */
  readonly ownOf: readonly string[];
  readonly readBy: readonly string[];
}

/** Every file in git that a record of these studies depends on, in code-unit order of path. */
export function recordedFiles({ studies }: Pick<DossierContent, 'studies'>): readonly RecordedFile[] {
  const found = new Map<string, { identity: FileIdentity; ownOf: string[]; readBy: string[] }>();
  for (const { facts } of studies) {
    for (const { id, claims } of facts.records.nodes.values()) {
      for (const { path, own, identity } of claims.values()) {
        const file = found.get(path) ?? { identity, ownOf: [], readBy: [] };
        (own ? file.ownOf : file.readBy).push(id);
        found.set(path, file);
      }
    }
  }
  return [...found]
    .sort(([one], [other]) => (one < other ? -1 : 1))
    .map(([path, { identity, ownOf, readBy }]) => ({ path, ...contentOf(identity), ownOf, readBy }));
}

/** What is known of a file's content. */
export function contentOf(identity: FileIdentity): Pick<RecordedFile, 'sha256' | 'bytes' | 'isHere'> {
  if (identity.kind === 'unavailable') return { sha256: null, bytes: null, isHere: false };
  const { sha256, bytes } = identity;
  return { sha256, bytes, isHere: identity.kind === 'file' || identity.present };
}

/** Files that are kept outside git, by path from the top of the repository; the first record that names one speaks for it. */
export function filesElsewhere({ studies }: Pick<DossierContent, 'studies'>): ReadonlyMap<string, Elsewhere> {
  const found = new Map<string, Elsewhere>();
  for (const { facts } of studies) {
    for (const file of [...facts.records.nodes.values()].flatMap(({ elsewhere }) => elsewhere))
      if (!found.has(file.path)) found.set(file.path, file);
  }
  return found;
}

/** What went into a run and what came out of it: paths from the top of the repository, in git or kept elsewhere. */
export interface RunFiles {
  readonly takes: readonly string[];
  readonly gives: readonly string[];
}

/** A run takes the files that it reads and those of the inputs that it rests on; what it gives itself is not among them. */
export function filesOfRun(run: RecordNode, { facts }: DossierStudy): RunFiles {
  const gives = new Set([...ownPaths(run)]);
  const inputs = run.restsOn.flatMap((id) => {
    const node = facts.record(id);
    return node?.area === 'inputs' ? ownPaths(node) : [];
  });
  const reads = [...run.claims.values()].flatMap(({ path, own }) => (own ? [] : [path]));
  return { takes: [...new Set([...reads, ...inputs])].filter((path) => !gives.has(path)), gives: [...gives] };
}

function ownPaths({ claims, elsewhere }: RecordNode): readonly string[] {
  return [
    ...[...claims.values()].flatMap(({ path, own }) => (own ? [path] : [])),
    ...elsewhere.map(({ path }) => path),
  ];
}

/** The runs of a study, in the order of its records. */
export function runsOf({ facts }: DossierStudy): readonly RecordNode<'runs'>[] {
  return [...facts.records.nodes.values()].filter((node): node is RecordNode<'runs'> => node.area === 'runs');
}

/** A path in a seal is from the manifest's folder; here it is from the top of the repository. */
export function sealedPath(study: DossierStudy, path: string): string {
  return fromTop(study.facts.manifest.folder, path);
}
