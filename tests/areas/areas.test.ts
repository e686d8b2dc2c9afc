import { afterEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';
import type { Edits } from '../harness/study.ts';

let project: SoundRepository;
afterEach(() => project.remove());

/** What a person gets wrong in an area, and the finding that holds the commit back. */
const wrong: readonly {
  readonly area: string;
  readonly edits: Edits;
  readonly finds: string;
  /** Left as it was sealed; else all is sealed again, so that only the area's own rule speaks. */
  readonly unsealed?: true;
}[] = [
  {
    area: 'manifest',
    edits: { set: { 'inputs.rainfall.files': ['data/rian.csv'] } },
    finds: 'manifest.no-match inputs.rainfall',
    unsealed: true,
  },
  {
    area: 'seal',
    edits: { set: { 'catchment.area.value': 51 } },
    finds: 'seal.stale catchment',
    unsealed: true,
  },
  {
    area: 'waiver',
    edits: {
      set: {
        waivers: [
          {
            rule: 'inputs.day-unstated',
            record: 'inputs.rainfall',
            because: 'being asked',
            by: 'A. Writer',
            until: '2021-02-28',
          },
        ],
      },
    },
    finds: 'waiver.expired manifest',
  },
  { area: 'study', edits: { remove: ['study.decision'] }, finds: 'study.purpose-missing study' },
  { area: 'model', edits: { set: { 'model.version': 'latest' } }, finds: 'model.version-vague model' },
  {
    area: 'inputs',
    edits: { remove: ['inputs.streamflow.series.unit'] },
    finds: 'inputs.unit-missing inputs.streamflow',
  },
  {
    area: 'periods',
    edits: { set: { 'periods.validation': ['2007-09-30/2010-09-30'] } },
    finds: 'periods.overlap periods',
  },
  { area: 'setup', edits: { remove: ['setup.choices.3'] }, finds: 'setup.choice-missing setup' },
  {
    area: 'parameters',
    edits: { set: { 'parameters.values.0.range': [200, 400] } },
    finds: 'parameters.out-of-range parameters',
  },
  { area: 'runs', edits: { remove: ['runs.calibrated.start'] }, finds: 'runs.missing runs.calibrated' },
  {
    area: 'evaluation',
    edits: { remove: ['evaluation.outlet-flow.review'] },
    finds: 'evaluation.unseen evaluation.outlet-flow',
  },
  { area: 'balance', edits: { remove: ['balance'] }, finds: 'balance.missing balance.catchment' },
  {
    area: 'interventions',
    edits: { remove: ['interventions.1.because'] },
    finds: 'interventions.unrepresented interventions',
  },
  {
    area: 'uncertainty',
    edits: { remove: ['uncertainty.sources.structure'] },
    finds: 'uncertainty.source-unaddressed uncertainty',
  },
  {
    area: 'scenarios',
    edits: { remove: ['scenarios.conditions.annual_rainfall'] },
    finds: 'scenarios.conditions-missing scenarios.dry',
  },
];

describe('each area in a real repository', () => {
  it('passes as it stands', async () => {
    project = await soundRepository();
    const checked = await check(project.folder, '--at', 'HEAD');
    expect(checked.blocking).toEqual([]);
    expect(checked.status).toBe(0);
    const areas = new Set(checked.verdict.manifests[0]?.records.map(({ id }) => id.split('.')[0]));
    const checkedAreas = wrong
      .map(({ area }) => area)
      .filter((area) => !['manifest', 'seal', 'waiver'].includes(area));
    expect(checkedAreas.filter((area) => !areas.has(area))).toEqual([]);
  });

  it.each(wrong)(
    'holds back a commit wrong in $area, and passes it when put right',
    async ({ edits, finds, unsealed }) => {
      project = await soundRepository();
      const sealAll = () => stoplog(project.folder, ['seal', '--all', '--because', 'a test of another rule']);
      await project.state(edits);
      if (!unsealed) await sealAll();
      await project.commit('Wrong');
      const held = await check(project.folder, '--at', 'HEAD');
      expect(held.status).toBe(1);
      expect(held.blocking).toContain(finds);

      await project.state({});
      await sealAll();
      await project.commit('Right');
      expect((await check(project.folder, '--at', 'HEAD')).blocking).toEqual([]);
    },
  );
});
