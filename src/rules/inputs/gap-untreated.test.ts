import { withLines } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsGapUntreated } from './gap-untreated.ts';

ruleCases(inputsGapUntreated, {
  fires: [
    {
      name: 'a share is missing and nothing is said',
      remove: ['inputs.streamflow.gaps_treated'],
      finds: {
        record: 'inputs.streamflow',
        field: 'inputs.streamflow.missing_share',
        stated: 0.0006,
        level: 'block',
      },
    },
    {
      name: 'a share of one file is missing',
      set: { 'inputs.rainfall.missing_share': { per_file: { 'data/rain.csv': 0.02 } } },
      finds: { record: 'inputs.rainfall', stated: 0.02, message: 'one of the files' },
    },
    {
      name: 'what is missing is not stated',
      remove: ['inputs.streamflow.gaps_treated', 'inputs.streamflow.missing_share'],
      finds: { record: 'inputs.streamflow', found: 0.000608 },
    },
    {
      name: 'none is said to be missing, and one is',
      files: { 'data/rain.csv': withLines({ 5: '2001-10-04,' }) },
      finds: { record: 'inputs.rainfall', found: 0.000304 },
    },
    {
      name: 'only noted before the calibration',
      remove: ['inputs.streamflow.gaps_treated'],
      phase: 'setup',
      finds: { level: 'note' },
    },
  ],
  silent: [
    { name: 'nothing is missing', set: { 'inputs.rainfall.missing_share': 0 } },
    { name: 'no share is stated', remove: ['inputs.rainfall.missing_share'] },
    {
      name: 'no file lacks any',
      set: { 'inputs.rainfall.missing_share': { per_file: { 'data/rain.csv': 0 } } },
    },
  ],
});
