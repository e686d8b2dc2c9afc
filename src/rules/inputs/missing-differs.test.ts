import { withLines, withoutLines, withValues } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsMissingDiffers } from './missing-differs.ts';

/** 3287 days; sound.yaml states 0.0006 for the flow, of which 2 are missing: 2 / 3287 = 0.000608. */
ruleCases(inputsMissingDiffers, {
  fires: [
    {
      name: 'another share',
      set: { 'inputs.streamflow.missing_share': 0.0007 },
      finds: {
        record: 'inputs.streamflow',
        field: 'inputs.streamflow.missing_share',
        stated: 0.0007,
        found: 0.000608,
        message: '2 of 3 287 values are missing, a share of 0.000608; 0.0007 is stated.',
        level: 'block',
      },
    },
    {
      name: 'none is said to be missing',
      set: { 'inputs.streamflow.missing_share': 0 },
      finds: { stated: 0, found: 0.000608 },
    },
    {
      name: 'more decimals than hold',
      set: { 'inputs.streamflow.missing_share': 0.00062 },
      finds: { stated: 0.00062 },
    },
    {
      name: 'a day without a row is missing too',
      files: { 'data/rain.csv': withoutLines(11, 11) },
      finds: {
        record: 'inputs.rainfall',
        stated: 0,
        found: 0.000304,
        message: '1 of 3 287 values are missing',
      },
    },
    {
      name: 'the share of one file',
      set: {
        'inputs.streamflow.files': ['data/flow.csv', 'data/flow-2011.csv'],
        'inputs.streamflow.missing_share': {
          per_file: { 'data/flow.csv': 0.0006, 'data/flow-2011.csv': 0.25 },
        },
      },
      files: { 'data/flow-2011.csv': 'date,flow_m3s\n2010-10-01,1\n2010-10-02,NA\n2010-10-03,1\n' },
      finds: {
        field: 'inputs.streamflow.missing_share.per_file.data/flow-2011.csv',
        subject: 'data/flow-2011.csv',
        stated: 0.25,
        found: 0.333,
      },
    },
    {
      name: 'a file that no share is stated for, and a share for no file',
      set: { 'inputs.streamflow.missing_share': { per_file: { 'flow.csv': 0.0006 } } },
      finds: [
        { subject: 'data/flow.csv', message: 'nothing is stated for it' },
        { subject: 'flow.csv', message: 'no file of this input' },
      ],
    },
  ],
  silent: [
    { name: 'fewer decimals that hold', set: { 'inputs.streamflow.missing_share': 0.001 } },
    { name: 'more decimals that hold', set: { 'inputs.streamflow.missing_share': 0.000608 } },
    { name: 'no share is stated', remove: ['inputs.streamflow.missing_share'] },
    {
      name: 'stated for each file',
      set: { 'inputs.streamflow.missing_share': { per_file: { 'data/flow.csv': 0.00061 } } },
    },
    {
      name: 'rows that can’t be read, so that nobody can count',
      files: { 'data/flow.csv': withLines({ 9: '2001-10-08,x' }) },
    },
    {
      name: 'a zero of many decimals',
      set: { 'inputs.streamflow.missing_share': 0 },
      files: { 'data/flow.csv': withValues((value) => (Number.isNaN(value) ? 1 : value)) },
    },
  ],
});
