import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { recordsFromData, sealing, sealsFileOf } from '../../tests/records/in-memory.ts';
import type { ManifestData } from '../manifest/data.generated.ts';
import { healSeals } from './heal.ts';
import type { Seal } from './seal.ts';
import { withChecksum } from './seal-entry.ts';
import { writeSealsFile } from './seals-file.ts';
import { judgeStandings } from './standing.ts';

/** Runs that take outputs of earlier runs: for each run, which of those before it. */
const studies = fc
  .array(fc.array(fc.nat(), { maxLength: 3 }), { minLength: 1, maxLength: 12 })
  .map((runs) =>
    runs.map((takes, index) =>
      [...new Set(takes.map((one) => one % Math.max(1, index)))].filter((one) => one < index),
    ),
  );

type Study = readonly (readonly number[])[];

const fileOf = (run: number): string => `runs/${run}.csv`;
const dataOf = (study: Study): ManifestData => ({
  stoplog: 1,
  runs: Object.fromEntries(
    study.map((takes, index) => [
      `r${index}`,
      { gives: [fileOf(index)], takes: takes.map((run) => `runs.r${run}`) },
    ]),
  ),
});
const filesOf = (study: Study, changed: readonly number[] = []): Record<string, string> =>
  Object.fromEntries(
    study.map((_, index) => [fileOf(index), changed.includes(index) ? 'changed' : `run ${index}`]),
  );

/** All runs that rest on one of these, and these: worked out the plain way. */
function above(study: Study, roots: readonly number[]): string[] {
  const reached = new Set(roots);
  for (const [index, takes] of study.entries()) if (takes.some((run) => reached.has(run))) reached.add(index);
  return [...reached].map((index) => `runs.r${index}`).sort();
}

describe('for any records', () => {
  it('stale is exactly what changed and what rests on it, and every trail ends there', async () => {
    await fc.assert(
      fc.asyncProperty(studies, fc.array(fc.nat(), { maxLength: 3 }), async (study, picks) => {
        const changed = [...new Set(picks.map((pick) => pick % study.length))];
        const { seals } = sealing(await recordsFromData(dataOf(study), filesOf(study)));
        const now = await recordsFromData(dataOf(study), filesOf(study, changed));
        const standings = judgeStandings(now, sealsFileOf(seals));
        const stale = [...standings.values()].filter(({ state }) => state === 'stale');
        expect(stale.map(({ record }) => record).sort()).toEqual(above(study, changed));
        for (const { record, trails } of stale) {
          const roots = trails.map(({ steps }) => steps.at(-1));
          expect(new Set(roots).size).toBe(roots.length);
          expect(roots.sort()).toEqual(
            changed
              .filter((run) => above(study, [run]).includes(record))
              .map((run) => `runs.r${run}`)
              .sort(),
          );
          for (const { steps, path } of trails) {
            expect(steps[0]).toBe(record);
            expect(path).toBe(`runs/${steps.at(-1)?.slice('runs.r'.length)}.csv`);
            for (const [place, id] of steps.slice(1).entries()) {
              expect(now.nodes.get(steps[place] ?? '')?.restsOn).toContain(id);
            }
          }
        }
      }),
    );
  });

  it('all are sealed once all were sealed, whoever did it and when, with the same digests', async () => {
    await fc.assert(
      fc.asyncProperty(studies, fc.string(), fc.string(), async (study, person, because) => {
        const records = await recordsFromData(dataOf(study), filesOf(study));
        const { seals } = sealing(records, new Map(), { person, because, today: '1999-12-31' });
        expect(
          [...judgeStandings(records, sealsFileOf(seals)).values()].every(({ state }) => state === 'sealed'),
        ).toBe(true);
        for (const [id, seal] of sealing(records).seals) expect(seals.get(id)?.digest).toBe(seal.digest);
      }),
    );
  });

  it('sealing some seals them and what they rest on, and nothing else', async () => {
    await fc.assert(
      fc.asyncProperty(studies, fc.nat(), async (study, pick) => {
        const wanted = pick % study.length;
        const records = await recordsFromData(dataOf(study), filesOf(study));
        const { seals } = sealing(records, new Map(), { wanted: [`runs.r${wanted}`] });
        const below = study.flatMap((_, run) =>
          above(study, [run]).includes(`runs.r${wanted}`) ? [`runs.r${run}`] : [],
        );
        expect([...seals.keys()].sort()).toEqual(below.sort());
      }),
    );
  });

  it('healing comes to the same from either side', async () => {
    const grades = fc.constantFrom<Seal['grade']>('sealed', 'recomputed', 'rerun');
    const side = fc.record({
      changed: fc.array(fc.nat(), { maxLength: 2 }),
      grade: grades,
      today: fc.constantFrom('2026-01-01', '2026-02-01'),
    });
    await fc.assert(
      fc.asyncProperty(studies, side, side, fc.boolean(), async (study, left, right, hasBase) => {
        const base = sealing(await recordsFromData(dataOf(study), filesOf(study))).seals;
        const sealed = async ({ changed, grade, today }: typeof left) => {
          const picks = changed.map((pick) => pick % study.length);
          const records = await recordsFromData(dataOf(study), filesOf(study, picks));
          const { seals } = sealing(records, base, { because: 'for the test', today });
          const regraded = [...seals].map(
            ([id, { checksum: _, ...seal }]) => [id, withChecksum({ ...seal, grade })] as const,
          );
          return { records, text: writeSealsFile(new Map(regraded)) };
        };
        const [ours, theirs] = [await sealed(left), await sealed(right)];
        const from = hasBase ? writeSealsFile(base) : null;
        const there = healSeals({ base: from, ours: ours.text, theirs: theirs.text }, ours.records);
        const back = healSeals({ base: from, ours: theirs.text, theirs: ours.text }, ours.records);
        expect(writeSealsFile(back.seals)).toBe(writeSealsFile(there.seals));
        const standings = judgeStandings(ours.records, sealsFileOf(there.seals));
        expect([...standings.values()].every(({ state }) => state === 'sealed')).toBe(true);
      }),
    );
  });
});
