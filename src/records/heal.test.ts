import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { recordsOf, sealing, sealsFileOf } from '../../tests/records/in-memory.ts';
import { smallFiles, smallStudy } from '../../tests/records/small-study.ts';
import { takeVersions, type Versions } from './conflict.ts';
import { followMoves } from './follow-moves.ts';
import { healSeals, recoverSeals } from './heal.ts';
import type { Seal } from './seal.ts';
import { withChecksum } from './seal-entry.ts';
import { writeSealsFile } from './seals-file.ts';
import { judgeStandings } from './standing.ts';

const text = smallStudy.replace(/ {4}accepts: .*\n/, '');
const base = sealing(await recordsOf(text, smallFiles)).seals;
const because = 'The data were only sorted.';
const edited = async (
  files: Record<string, string>,
  person: string,
  today = '2026-04-01',
  manifest = text,
) => {
  const records = await recordsOf(manifest, { ...smallFiles, ...files });
  return { records, seals: sealing(records, base, { because, person, today }).seals };
};
const ada = await edited({ 'data/rain/high.csv': 'rain 5' }, 'Ada Weir <ada@northmere.example>');
const ben = await edited({ 'data/check.csv': 'check 2' }, 'Ben Leat <ben@northmere.example>', '2026-04-02');
const merged = await recordsOf(text, {
  ...smallFiles,
  'data/rain/high.csv': 'rain 5',
  'data/check.csv': 'check 2',
});

const versions = (
  ours: ReadonlyMap<string, Seal>,
  theirs: ReadonlyMap<string, Seal>,
  from: ReadonlyMap<string, Seal> | null = base,
): Versions => ({
  base: from && writeSealsFile(from),
  ours: writeSealsFile(ours),
  theirs: writeSealsFile(theirs),
});
const kept = (healed: ReturnType<typeof healSeals>) =>
  Object.fromEntries(
    healed.records.map(({ record, kept: side, fits }) => [record, `${side}${fits ? '' : ' (stale)'}`]),
  );

describe('healing seals after a merge', () => {
  it('keeps for each record the side that fits the merged content, else the base’s', () => {
    const healed = healSeals(versions(ada.seals, ben.seals), merged);
    // Ada's change reached the runs and all above; Ben's reached interventions (the season), which hers reached too.
    expect(kept(healed)).toEqual({
      'inputs.rainfall': 'ours',
      'inputs.check': 'theirs',
      parameters: 'ours',
      'runs.calibrated': 'ours',
      'runs.dry': 'ours',
      'evaluation.outlet': 'ours',
      'balance.catchment': 'ours',
      uncertainty: 'ours',
      'scenarios.dry': 'ours',
      interventions: 'base (stale)',
    });
    expect(healed.seals.get('interventions')).toEqual(base.get('interventions'));
    const standings = judgeStandings(merged, sealsFileOf(healed.seals));
    expect(
      [...standings.values()].filter(({ state }) => state !== 'sealed').map(({ record }) => record),
    ).toEqual(['interventions']);
  });

  it.each([
    ['a file', 'data/rain/high.csv', 'data/rain/upper.csv', text],
    [
      'a record',
      '',
      '',
      text.replace('  future: {', '  storyline: {').replaceAll(/\bfuture\b(?!\.csv)/g, 'storyline'),
    ],
  ])('keeps what one side sealed while the other renamed %s', async (_, from, to, renamed) => {
    const files = (rain: string) => {
      const { [from]: moved, ...others } = { ...smallFiles, 'data/rain/high.csv': rain } as Record<
        string,
        string
      >;
      return moved === undefined ? others : { ...others, [to]: moved };
    };
    const there = await recordsOf(renamed, files(smallFiles['data/rain/high.csv'] ?? ''));
    const followed = followMoves(there, { seals: base }).seals;
    const both = await recordsOf(renamed, files('rain 5'));
    const healed = healSeals(versions(ada.seals, followed), both);
    const standings = judgeStandings(both, sealsFileOf(healed.seals));
    expect([...standings.values()].filter(({ state }) => state !== 'sealed')).toEqual([]);
    expect(healed.seals.get('inputs.rainfall')?.sealed_by).toBe('Ada Weir <ada@northmere.example>');
    expect([...healed.seals.keys()].sort()).toEqual([...there.nodes.keys()].sort());
  });

  it('comes to the same from either side', () => {
    const there = healSeals(versions(ada.seals, ben.seals), merged).seals;
    const back = healSeals(versions(ben.seals, ada.seals), merged).seals;
    expect(writeSealsFile(back)).toBe(writeSealsFile(there));
  });

  it('takes the better grade, then the later day, where both sides fit', async () => {
    const twice = await edited(
      { 'data/rain/high.csv': 'rain 5' },
      'Ben Leat <ben@northmere.example>',
      '2026-04-02',
    );
    const healed = healSeals(versions(ada.seals, twice.seals), ada.records);
    expect(healed.seals.get('inputs.rainfall')?.sealed_on).toBe('2026-04-02');
    const { checksum: _, ...seal } = ada.seals.get('runs.dry') as Seal;
    const rerun = new Map(ada.seals).set('runs.dry', withChecksum({ ...seal, grade: 'rerun' }));
    expect(healSeals(versions(rerun, twice.seals), ada.records).seals.get('runs.dry')?.grade).toBe('rerun');
    expect(healSeals(versions(twice.seals, rerun), ada.records).seals.get('runs.dry')?.grade).toBe('rerun');
  });

  it('loses no record that is sealed on one side only', async () => {
    const more = text.replace(
      '  radar: {',
      '  snow: {role: precipitation, files: [data/check.csv]}\n  radar: {',
    );
    const records = await recordsOf(more, smallFiles);
    const added = sealing(records, base).seals;
    const healed = healSeals(versions(added, base), records);
    expect(healed.records).toEqual([
      {
        record: 'inputs.snow',
        kept: 'ours',
        seal: added.get('inputs.snow'),
        fits: true,
        rerunDropped: false,
      },
    ]);
    expect(healSeals({ base: null, ours: null, theirs: writeSealsFile(added) }, records).seals).toEqual(
      added,
    );
  });

  it('drops a rerun that was not of the merged content, also where both sides have it', () => {
    const { checksum: _, ...seal } = base.get('runs.calibrated') as Seal;
    const rerun = new Map(base).set('runs.calibrated', withChecksum({ ...seal, grade: 'rerun' }));
    const healed = healSeals(versions(rerun, rerun, rerun), merged);
    expect(healed.records).toMatchObject([
      { record: 'runs.calibrated', kept: 'both', fits: false, rerunDropped: true },
    ]);
    expect(healed.seals.get('runs.calibrated')).toEqual(base.get('runs.calibrated'));
  });

  it('keeps the better side where none fits and there is no base', () => {
    const healed = healSeals(versions(ada.seals, ben.seals, null), merged);
    expect(healed.records.find(({ record }) => record === 'interventions')).toMatchObject({
      kept: 'theirs',
      fits: false,
    });
  });

  it('says what it could not read of a side', () => {
    const { faults, seals } = healSeals({ ...versions(ada.seals, ben.seals), theirs: '{' }, merged);
    expect(faults).toMatchObject([
      { kind: 'not-json', message: expect.stringMatching(/^On the other side of the merge/) },
    ]);
    expect(seals).toEqual(ada.seals);
  });
});

describe('an entry that can’t be read, in a merge', () => {
  const spoilt = (seals: ReadonlyMap<string, Seal>): string =>
    writeSealsFile(new Map([...seals].filter(([id]) => id !== 'model')), new Map([['model', 'by hand']]));

  it('gives way to the seal that the other side has', () => {
    const healed = healSeals({ ...versions(ada.seals, ben.seals), theirs: spoilt(ben.seals) }, merged);
    expect(healed.seals.get('model')).toEqual(base.get('model'));
    expect([...healed.unreadable]).toEqual([]);
  });

  it('stays as it is where neither side has a seal', () => {
    const healed = healSeals({ base: null, ours: spoilt(ada.seals), theirs: spoilt(ben.seals) }, merged);
    expect([...healed.unreadable]).toEqual([['model', 'by hand']]);
    expect(healed.seals.has('model')).toBe(false);
  });
});

describe('seals of a side that was not taken', () => {
  it('are found again where they fit, and only for records whose own seal does not', () => {
    const sides = [
      ['ours', { seals: ada.seals }],
      ['theirs', { seals: ben.seals }],
    ] as const;
    const found = recoverSeals(sides, { seals: ada.seals }, merged);
    expect(found.map(({ record, kept, seal }) => [record, kept, seal.sealed_by])).toEqual([
      ['inputs.check', 'theirs', 'Ben Leat <ben@northmere.example>'],
    ]);
    const whole = healSeals(versions(ada.seals, ben.seals), merged).seals;
    expect(recoverSeals(sides, { seals: whole }, merged)).toEqual([]);
  });
});

describe('healing from conflict markers', () => {
  /** The merge that git itself makes of the three files. */
  function merge(style: '' | '--diff3' | '--zdiff3'): string {
    const folder = mkdtempSync(join(tmpdir(), 'stoplog-test-'));
    for (const [name, seals] of Object.entries({ ours: ada.seals, base, theirs: ben.seals })) {
      writeFileSync(join(folder, name), writeSealsFile(seals));
    }
    const args = ['merge-file', '-p', ...(style === '' ? [] : [style]), 'ours', 'base', 'theirs'];
    const { stdout } = spawnSync('git', args, { cwd: folder, encoding: 'utf8' });
    rmSync(folder, { recursive: true });
    return stdout;
  }
  const whole = healSeals(versions(ada.seals, ben.seals), merged);

  it('comes to what the whole versions give where the markers show the base', () => {
    const taken = takeVersions(merge('--diff3'));
    expect(taken?.base).not.toBeNull();
    expect(healSeals(taken as Versions, merged).seals).toEqual(whole.seals);
  });

  it.each(['', '--zdiff3'] as const)(
    'keeps all that fits where they show no base, or a torn one (%s)',
    (style) => {
      const taken = takeVersions(merge(style)) as Versions;
      const healed = healSeals(taken, merged);
      expect(healed.faults).toEqual([]);
      expect([...healed.seals.keys()]).toEqual([...whole.seals.keys()]);
      for (const { record, fits } of whole.records) {
        if (fits) expect(healed.seals.get(record)).toEqual(whole.seals.get(record));
      }
    },
  );
});
