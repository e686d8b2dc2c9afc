import { buildFacts } from '../facts/build.ts';
import type { Facts } from '../facts/facts.ts';
import { figuresToWrite } from '../facts/figures.ts';
import { unscorable } from '../facts/score-figures.ts';
import { Failure } from '../failure.ts';
import { replaceScalars } from '../manifest/edit.ts';
import { fieldName } from '../manifest/manifest.ts';
import { readManifest } from '../manifest/read.ts';
import { buildRecords } from '../records/build.ts';
import { judgeStandings } from '../records/standing.ts';
import type { WrittenFigure } from '../reports/seal.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { knownRules } from '../rules/index.ts';
import type { Phase } from '../rules/rule.ts';
import type { Study } from './studies.ts';

export interface WithFigures {
  /** The study as it reads with the new figures. */
  readonly study: Study;
  readonly written: readonly WrittenFigure[];
  /** Asked records that state no score, and why none can be computed: by record id. */
  readonly unscored: ReadonlyMap<string, string>;
}

/** The facts of one study on its own. */
export function factsOf(study: Study, snapshot: Snapshot, today: string, phase: Phase): Promise<Facts> {
  const alone = { before: null, claimedElsewhere: new Map() };
  return buildFacts({ ...study, ...alone, snapshot, today, phase, known: knownRules() });
}

/** Replaces stated figures of the asked records by recomputed ones, in the manifest's text only; nothing is written yet. */
export async function withFigures(
  study: Study,
  asked: (record: string) => boolean,
  snapshot: Snapshot,
  today: string,
): Promise<WithFigures> {
  const facts = await factsOf(study, snapshot, today, 'archive');
  const figures = figuresToWrite(facts).filter(({ record }) => asked(record));
  const unscored = new Map([...unscorable(facts)].filter(([record]) => asked(record)));
  if (figures.length === 0) return { study, written: [], unscored };
  const text = replaceScalars(
    study.manifest,
    figures.map(({ field, found, decimals }) => ({
      field,
      value: decimals === undefined ? found : { value: found, decimals },
    })),
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
    unscored,
  };
}
