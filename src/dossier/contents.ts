import { jsonText } from '../reports/json.ts';
import type { State } from '../verdict/finding.ts';
import type { DossierContent, DossierFile } from './content.ts';
import { contentsName, documentPath, payloadPath } from './layout.ts';
import { outsideFiles, type Payload } from './payload.ts';

/** `contents.json`: what the package is about, and what of the study lies in it and what does not. */
export interface Contents {
  readonly format: 'stoplog-contents/1';
  readonly made_by: string;
  readonly commit: string;
  readonly committed_at: string;
  readonly draft: boolean;
  readonly verdict: 'pass' | 'blocked';
  readonly records: readonly ContentsRecord[];
  readonly files: readonly ContentsFile[];
}

export interface ContentsRecord {
  readonly manifest: string;
  readonly id: string;
  readonly state: State;
  /** SHA-256 of what it states, its files and what it rests on; null for a record that is missing. */
  readonly digest: string | null;
}

export interface ContentsFile {
  /** From the top of the repository. */
  readonly path: string;
  readonly sha256: string | null;
  readonly bytes: number | null;
  /** Where it lies in the package, filled or to be filled; null where it does not. */
  readonly lies: string | null;
  /** Empty for a file that is in the package. */
  readonly note: string;
}

/** `bagged` tells whether the study's files come with the documents. */
export function contentsDocument(content: DossierContent, payload: Payload, bagged: boolean): DossierFile {
  const outside = 'in the repository; `stoplog dossier --bag` packs it';
  const awaited = new Set(bagged ? payload.fetched.map(({ path }) => path) : []);
  const files: ContentsFile[] = [
    ...payload.files.map(({ path, sha256, bytes }) => ({
      ...{ path, sha256, bytes },
      ...(bagged ? { lies: payloadPath(path), note: '' } : { lies: null, note: outside }),
    })),
    ...outsideFiles(payload).map((file) => ({
      ...file,
      lies: awaited.has(file.path) ? payloadPath(file.path) : null,
    })),
  ];
  const contents: Contents = {
    format: 'stoplog-contents/1',
    made_by: `Stoplog ${content.madeBy}`,
    commit: content.commit,
    committed_at: content.committedAt,
    draft: content.draft,
    verdict: content.verdict.verdict,
    records: content.studies.flatMap(({ facts, verdict }) =>
      verdict.records.map(({ id, state }) => ({
        ...{ manifest: verdict.path, id, state },
        digest: facts.records.nodes.get(id)?.digest || null,
      })),
    ),
    files: files.sort((a, b) => (a.path < b.path ? -1 : 1)),
  };
  return { path: documentPath(contentsName), content: jsonText(contents) };
}
