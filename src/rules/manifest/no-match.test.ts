import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { manifestNoMatch } from './no-match.ts';

ruleCases(manifestNoMatch, {
  fires: [
    {
      name: 'a path',
      set: { 'inputs.rainfall.files': ['data/rian.csv'] },
      phase: 'setup',
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.files[0]',
        stated: 'data/rian.csv',
        level: 'block',
      },
    },
    {
      name: 'a pattern',
      set: { 'inputs.rainfall.files': ['data/rain/*.csv'] },
      finds: { subject: 'data/rain/*.csv' },
    },
    {
      name: 'a file that only lies on disk',
      set: { 'inputs.rainfall.files': ['data/new.csv'] },
      untracked: ['data/new.csv'],
      finds: { message: 'data/new.csv on disk, which git does not track', clear: 'git add :/data/new.csv' },
    },
    {
      name: 'outputs before the first run',
      files: { 'runs/dry/daily.csv': null },
      set: { 'scenarios.cases.dry.drivers': {} },
      phase: 'setup',
      finds: { record: 'runs.dry', field: 'runs.dry.gives[0]', level: 'note' },
    },
  ],
  silent: [
    {
      name: 'kept elsewhere',
      set: { 'inputs.rainfall.files': [{ path: 'data/radar.nc', sha256: 'a'.repeat(64) }] },
    },
    {
      name: 'a reading’s file, of which reading.not-found tells',
      files: { 'runs/calibrated/run.log': null },
      set: { 'runs.calibrated.gives': ['runs/calibrated/*.csv'] },
    },
  ],
});
