import { withValues } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsNegativeAmount } from './negative-amount.ts';

ruleCases(inputsNegativeAmount, {
  fires: [
    {
      name: 'negative rain',
      files: { 'data/rain.csv': withValues((value) => -value, 6, 6) },
      phase: 'setup',
      finds: {
        record: 'inputs.rainfall',
        file: 'data/rain.csv',
        line: 6,
        found: -12,
        unit: 'mm/d',
        message: 'data/rain.csv is below zero once: -12 on 2001-10-05 (line 6).',
        level: 'block',
      },
    },
    ...[-9.9, -99, -9.99].map((code) => ({
      name: `${code} read as a value`,
      files: { 'data/flow.csv': withValues(() => code, 20, 24) },
      finds: {
        record: 'inputs.streamflow',
        line: 20,
        found: code,
        message: `holds ${code} 5 times as a value, first on 2001-10-19 (line 20); it looks like a code`,
        clear: `missing: [${code}]`,
      },
    })),
    ...[-999, -9999].map((code) => ({
      name: `${code}, which is no value anywhere`,
      files: { 'data/rain.csv': withValues(() => code, 20, 59) },
      finds: {
        record: 'inputs.rainfall',
        file: 'data/rain.csv',
        line: 20,
        found: code,
        message: `data/rain.csv holds ${code} in 40 rows, first in line 20`,
      },
    })),
    {
      name: 'a code and a negative flow',
      files: { 'data/flow.csv': withValues((_, row) => (row === 10 ? -0.4 : -9.9), 10, 12) },
      finds: [
        { found: -9.9, message: '2 times' },
        { found: -0.4, message: 'below zero once' },
      ],
    },
    {
      name: 'a code among temperatures, colder than any air',
      files: { 'data/temperature.csv': withValues(() => -99.9, 30, 30) },
      finds: { record: 'inputs.temperature', found: -99.9 },
    },
  ],
  silent: [
    {
      name: 'a declared code',
      set: { 'inputs.rainfall.series.missing': [-9.9] },
      files: { 'data/rain.csv': withValues(() => '-9.90', 20, 24) },
    },
    {
      name: 'a tidal flow that says so',
      set: { 'inputs.streamflow.may_be_negative_because': 'The tide turns the river twice a day.' },
      files: { 'data/flow.csv': withValues(() => -2.5, 20, 24) },
    },
    { name: 'frost', files: { 'data/temperature.csv': withValues(() => -9.9, 20, 24) } },
    { name: 'a balance that may be negative', files: { 'data/leaf-area.csv': withValues(() => -0.1, 3, 3) } },
  ],
});
