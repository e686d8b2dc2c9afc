import { sha256Of } from '../../records/record.ts';
import type { DossierContent, DossierStudy } from '../content.ts';
import { figuresOf } from './figures-of.ts';
import { contentOf } from './files-of.ts';

/** `facts.json` (schemas/facts.schema.json): what is recorded, sealed and computed, for programs to read. */
export function factsDocument({ madeBy, commit, committedAt, draft, studies }: DossierContent): object {
  return {
    format: 'stoplog-facts/1',
    made_by: madeBy,
    commit,
    committed_at: committedAt,
    draft,
    studies: studies.map((study) => ({
      manifest: study.facts.manifest.path,
      ...statedOf(study),
      records: recordsOf(study),
      ...figuresOf(study.facts),
    })),
  };
}

function statedOf({ facts, verdict }: DossierStudy): object {
  const { study = {}, catchment = {}, periods = {} } = facts.manifest.data;
  return {
    id: study.id ?? null,
    title: study.title ?? null,
    purpose: study.purpose ?? null,
    decision: study.decision ?? null,
    phase: verdict.phase,
    licence: study.licence ?? null,
    catchment: catchment.name ?? null,
    periods,
  };
}

function recordsOf({ facts, verdict }: DossierStudy): readonly object[] {
  return verdict.records.map(({ id, state, grade }) => {
    const node = facts.record(id);
    const seal = facts.standings.get(id)?.seal ?? null;
    return {
      id,
      state,
      grade,
      digest: node === undefined || node.digest === '' ? null : node.digest,
      rests_on: node?.restsOn ?? [],
      seal:
        seal === null
          ? null
          : {
              digest: seal.digest,
              scheme: seal.scheme,
              sealed_by: seal.sealed_by,
              sealed_on: seal.sealed_on,
              grade: seal.grade,
              because: seal.because,
              checksum: seal.checksum,
            },
      files: [...(node?.claims.values() ?? [])].map(({ path, own, identity }) => ({
        path,
        own,
        sha256: sha256Of(identity),
        bytes: contentOf(identity).bytes,
        in_repository: contentOf(identity).isHere,
      })),
      elsewhere: (node?.elsewhere ?? []).map(({ path, sha256, bytes, location }) => ({
        path,
        sha256: sha256 ?? null,
        bytes: bytes ?? null,
        location: location ?? null,
      })),
    };
  });
}
