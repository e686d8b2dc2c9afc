import { figuresToWrite } from '../facts/figures.ts';
import type { Contradiction } from '../reports/seal.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { rules } from '../rules/index.ts';
import { runRules } from '../rules/run.ts';
import { judgeManifest, passes } from '../verdict/judge.ts';
import { factsOf } from './figures.ts';
import type { Study } from './studies.ts';

const contradicting = new Set(rules.filter(({ means }) => means === 'contradicted').map(({ id }) => id));

/**
 * What these records state and the files do not bear out, first one of each record: a seal is a person's review, which may stand
 * beside it, but the person is to know. Warnings are left out: a doubt, or content that is not here, contradicts nothing.
 */
export async function contradictionsIn(
  ids: readonly string[],
  study: Study,
  snapshot: Snapshot,
  today: string,
): Promise<readonly Contradiction[]> {
  if (ids.length === 0) return [];
  const phase = study.manifest.data.study?.phase ?? 'setup';
  const facts = await factsOf(study, snapshot, today, phase);
  const { findings } = judgeManifest(runRules(rules, facts), facts, phase);
  const writable = new Set(
    figuresToWrite(facts).flatMap(({ record, stated }) => (stated === null ? [] : record)),
  );
  return ids.flatMap((record) => {
    const [first, ...others] = findings.filter(
      (one) =>
        one.record === record && one.level !== 'warn' && contradicting.has(one.rule) && passes(one) === null,
    );
    if (first === undefined) return [];
    return { record, message: first.message, others: others.length, writable: writable.has(record) };
  });
}
