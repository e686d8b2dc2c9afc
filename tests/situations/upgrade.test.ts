import { afterEach, describe, expect, it } from 'vitest';
import { readStudies, type Study } from '../../src/commands/studies.ts';
import { makeSeals } from '../../src/records/make-seals.ts';
import { restsOnFirst } from '../../src/records/rests-on.ts';
import { type Schemes, schemes } from '../../src/records/schemes.ts';
import { readSealsFile, writeSealsFile } from '../../src/records/seals-file.ts';
import { judgeStandings } from '../../src/records/standing.ts';
import { openSnapshot } from '../../src/repository/open-snapshot.ts';
import { openRepository } from '../../src/repository/repository.ts';
import { cleanEnvironment } from '../harness/repository.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
afterEach(() => project.remove());

/** What a later Stoplog might add: the setup rests on the catchment. */
const later: Schemes = [
  ...schemes,
  {
    number: 2,
    restsOn: (statement, stated) => [
      ...restsOnFirst(statement, stated),
      ...(statement.id === 'setup' ? [{ to: 'catchment', written: 'catchment', field: ['setup'] }] : []),
    ],
  },
];

async function study(): Promise<Study> {
  const repository = await openRepository(project.folder, cleanEnvironment());
  const snapshot = await openSnapshot(repository, { kind: 'worktree' });
  try {
    const [read] = await readStudies(snapshot);
    if (read === undefined || 'problems' in read) throw new Error('the sound study can be read');
    return read;
  } finally {
    await snapshot.close();
  }
}

describe('Stoplog is upgraded, and its new scheme knows one dependence more', () => {
  it('judges old seals by the scheme they were made with: nothing is stale overnight', async () => {
    project = await soundRepository();
    const { records, sealsFile } = await study();
    const standings = [...judgeStandings(records, sealsFile, later).values()];
    expect(standings.filter(({ state }) => state !== 'sealed')).toEqual([]);
    expect(standings.every(({ oldScheme }) => oldScheme)).toBe(true);
  });

  it('still sees a change that the old scheme sees', async () => {
    project = await soundRepository();
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    const { records, sealsFile } = await study();
    const standings = judgeStandings(records, sealsFile, later);
    expect(standings.get('inputs.rainfall')?.state).toBe('stale');
    expect(standings.get('evaluation.outlet-flow')?.state).toBe('stale');
    expect(standings.get('setup')?.state).toBe('sealed');
  });

  it('seals anew by the new scheme, which this version then refuses to judge', async () => {
    project = await soundRepository();
    const read = await study();
    const { seals } = makeSeals(
      {
        ...read,
        standings: judgeStandings(read.records, read.sealsFile, later),
        wanted: ['setup'],
        because: null,
        person: 'Test Modeller <modeller@northmere.example>',
        today: '2022-01-01',
        evidence: new Map(),
      },
      later,
    );
    expect(seals.get('setup')?.scheme).toBe(2);
    expect(seals.get('setup')?.rests_on).toHaveProperty('catchment');
    expect(seals.get('runs.calibrated')?.scheme).toBe(1);
    const { faults } = readSealsFile('stoplog.seals.json', writeSealsFile(seals));
    expect(faults.map(({ kind, record }) => `${kind} ${record}`)).toEqual(['newer-scheme setup']);
  });
});
