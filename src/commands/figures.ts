import { buildFacts } from '../facts/build.ts';
import { figuresToWrite } from '../facts/figures.ts';
import { Failure } from '../failure.ts';
import { replaceScalars } from '../manifest/edit.ts';
import { fieldName } from '../manifest/manifest.ts';
import { readManifest } from '../manifest/read.ts';
import { buildRecords } from '../records/build.ts';
import { judgeStandings } from '../records/standing.ts';
import type { WrittenFigure } from '../reports/seal.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { knownRules } from '../rules/index.ts';
import type { Study } from './studies.ts';

export interface WithFigures {
  /** The study as it reads with the new figures. */
  readonly study: Study;
  readonly written: readonly WrittenFigure[];
}

/** Replaces stated figures of the asked records by recomputed ones, in the manifest's text only; nothing is written yet. */
export async function withFigures(
  study: Study,
  asked: (record: string) => boolean,
  snapshot: Snapshot,
  today: string,
): Promise<WithFigures> {
  const facts = await buildFacts({
    ...study,
    snapshot,
    today,
    phase: 'archive',
    known: knownRules(),
    before: null,
    claimedElsewhere: new Map(),
  });
  const figures = figuresToWrite(facts).filter(({ record }) => asked(record));
  if (figures.length === 0) return { study, written: [] };
  const text = replaceScalars(
    study.manifest,
    figures.map(({ field, found }) => ({ field, value: found })),
  );
  const { manifest, problems } = readManifest(study.manifest.path, text);
  if (manifest === null) {
    throw new Failure(
      'internal',
      `${study.manifest.path} would no longer be readable with the recomputed figures (${problems[0]?.message}).`,
      'Nothing was changed. Please report this with the manifest.',
    );
  }
  const records = await buildRecords(manifest, snapshot);
  return {
    study: { ...study, manifest, records, standings: judgeStandings(records, study.sealsFile) },
    written: figures.map(({ field }) => ({
      field: fieldName(field),
      before: study.manifest.source(field) ?? 'nothing',
      after: manifest.source(field) ?? '',
    })),
  };
}
