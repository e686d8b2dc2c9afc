import { createHash } from 'node:crypto';
import type { DossierContent, DossierFile } from '../../content.ts';
import { payloadPath } from '../../layout.ts';
import type { Payload } from '../../payload.ts';
import { recordedFiles } from '../files-of.ts';
import { idOf } from '../identifier.ts';
import { mediaTypeOf } from '../media-type.ts';
import { type Entity, idOfAddress, idOfPath } from './entity.ts';

/** The files of a crate. Those in `parts` lie in it or download from their address; the others are described only. */
export interface FileEntities {
  /** By path from the top of the repository. */
  readonly byPath: ReadonlyMap<string, Entity>;
  readonly parts: readonly Entity[];
  readonly described: readonly Entity[];
}

export function fileEntities(
  content: DossierContent,
  payload: Payload,
  documents: readonly DossierFile[],
): FileEntities {
  const uses = usesOf(content);
  const byPath = new Map<string, Entity>();
  const parts = documents.map(documentEntity);
  const described: Entity[] = [];
  for (const { path, sha256, bytes } of payload.files) {
    const entity = fileEntity(idOfPath(payloadPath(path)), path, {
      sha256,
      bytes,
      description: uses.get(path),
    });
    byPath.set(path, entity);
    parts.push(entity);
  }
  // Several paths may be fetched from one address: one entity stands for them.
  const addresses = new Map<string, Entity>();
  for (const { path, sha256, bytes, url } of payload.fetched) {
    const told = { sha256, bytes, description: uses.get(path), url, localPath: payloadPath(path) };
    const sdDatePublished = content.committedAt;
    const entity = addresses.get(url) ?? fileEntity(idOfAddress(url), path, { ...told, sdDatePublished });
    addresses.set(url, entity);
    byPath.set(path, entity);
  }
  parts.push(...addresses.values());
  for (const { path, sha256, bytes, why, location } of payload.absent) {
    const kept = location === null ? '' : ` It is kept at: ${location}.`;
    const description = [uses.get(path), `Not in this package: ${why}.${kept}`].filter(Boolean).join('. ');
    const entity = fileEntity(`#file-${idOf('file', path)}`, path, { sha256, bytes, description });
    byPath.set(path, entity);
    described.push(entity);
  }
  return { byPath, parts, described };
}

function documentEntity({ path, content }: DossierFile): Entity {
  const bytes = typeof content === 'string' ? new TextEncoder().encode(content) : content;
  return fileEntity(idOfPath(path), path, {
    sha256: createHash('sha256').update(bytes).digest('hex'),
    bytes: bytes.length,
    description: 'Written by Stoplog from the records.',
  });
}

interface Told {
  readonly sha256: string | null;
  readonly bytes: number | null;
  readonly description: string | undefined;
  readonly url?: string;
  readonly localPath?: string;
  readonly sdDatePublished?: string;
}

function fileEntity(id: string, path: string, { sha256, bytes, ...told }: Told): Entity {
  return {
    '@id': id,
    '@type': isSource(path) ? ['File', 'SoftwareSourceCode'] : 'File',
    name: path,
    ...told,
    encodingFormat: mediaTypeOf(path),
    contentSize: bytes === null ? undefined : String(bytes),
    sha256: sha256 ?? undefined,
  };
}

function isSource(path: string): boolean {
  return /\.(c|cpp|f|f90|jl|js|m|mjs|py|r|sh|ts)$/i.test(path);
}

/** What records have to do with a file, for people; by path. */
function usesOf(content: DossierContent): ReadonlyMap<string, string> {
  const said = new Map(
    recordedFiles(content).map(({ path, ownOf, readBy }) => [
      path,
      [
        ...(ownOf.length === 0 ? [] : [`File of ${ownOf.join(', ')}`]),
        ...(readBy.length === 0 ? [] : [`read by ${readBy.join(', ')}`]),
      ].join('; '),
    ]),
  );
  for (const { facts } of content.studies) {
    said.set(facts.manifest.path, 'What is stated about the model');
    said.set(facts.sealsFile.path, 'What was reviewed, by whom and when');
    for (const { id, elsewhere } of facts.records.nodes.values())
      for (const { path } of elsewhere)
        if (!said.has(path)) said.set(path, `File of ${id}, kept outside git`);
  }
  return said;
}
