import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { manifestOutsideRepository } from './outside-repository.ts';

ruleCases(manifestOutsideRepository, {
  fires: [
    {
      name: 'upwards',
      set: { 'inputs.rainfall.files': ['../rain.csv'] },
      phase: 'setup',
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.files[0]',
        stated: '../rain.csv',
        level: 'block',
      },
    },
    {
      name: 'from the root of a disk',
      set: { 'runs.dry.takes.2': '/srv/control.txt' },
      finds: { record: 'runs.dry' },
    },
    {
      name: 'a drive',
      set: { 'inputs.rainfall.files': ['D:/rain.csv'] },
      finds: { record: 'inputs.rainfall' },
    },
  ],
  silent: [{ name: 'up and down again', set: { 'inputs.rainfall.files': ['model/../data/rain.csv'] } }],
});
