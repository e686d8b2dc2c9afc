import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { manifestClaimedTwice } from './claimed-twice.ts';

ruleCases(manifestClaimedTwice, {
  fires: [
    {
      name: 'by two records',
      set: { 'inputs.check-gauge.files': ['data/rain.csv', 'data/check.csv'] },
      finds: {
        record: 'inputs.check-gauge',
        field: 'inputs.check-gauge.files[0]',
        subject: 'data/rain.csv',
        found: 'inputs.rainfall',
        level: 'warn',
      },
    },
    {
      name: 'by two manifests',
      claimedElsewhere: { 'data/rain.csv': { manifest: 'upper/stoplog.yaml', record: 'inputs.gauge' } },
      finds: { record: 'inputs.rainfall', found: 'inputs.gauge of upper/stoplog.yaml' },
    },
  ],
  silent: [
    { name: 'read by a run, at home with an input', set: { 'runs.dry.takes.2': 'data/rain.csv' } },
    { name: 'named twice in one record', set: { 'inputs.rainfall.files': ['data/rain.csv', 'data/r*.csv'] } },
  ],
});
