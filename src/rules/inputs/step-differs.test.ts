import { withLines, withoutLines } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsStepDiffers } from './step-differs.ts';

const [tenth, eleventh] = ['2001-10-10,0.0000', '2001-10-11,0.0000'];

ruleCases(inputsStepDiffers, {
  fires: [
    {
      name: 'a day twice',
      files: { 'data/rain.csv': withLines({ 12: `${tenth}\n${eleventh}` }) },
      finds: {
        record: 'inputs.rainfall',
        file: 'data/rain.csv',
        line: 12,
        stated: 'P1D',
        message: 'has a row for a time that an earlier row has: 2001-10-10 (line 12).',
        level: 'block',
      },
    },
    {
      name: 'three days left out',
      files: { 'data/rain.csv': withoutLines(11, 13) },
      finds: {
        line: 11,
        message: 'lacks rows for 3 steps of P1D: 2001-10-10 to 2001-10-12 (before line 11)',
      },
    },
    {
      name: 'two days in the wrong order',
      files: { 'data/rain.csv': withLines({ 11: eleventh, 12: tenth }) },
      finds: { line: 12, message: 'has a row out of order of time: 2001-10-10 (line 12)' },
    },
    {
      name: 'monthly values said to be daily',
      set: { 'inputs.vegetation.series.step': 'P1D' },
      files: {
        'data/leaf-area.csv': `month,lai\n${Array.from({ length: 12 }, (_, month) => `2008-${String(month + 1).padStart(2, '0')}-01,1\n`).join('')}`,
      },
      finds: { record: 'inputs.vegetation', message: 'has rows that are mostly a month apart, not P1D' },
    },
    {
      name: 'daily values said to be hourly',
      set: { 'inputs.rainfall.series.step': 'PT1H' },
      finds: { message: 'has rows that are mostly P1D apart, not PT1H' },
    },
    {
      name: 'hourly values said to be daily',
      files: {
        'data/check.csv': `date,rain_mm\n${['00', '06', '12', '18'].map((hour) => `2001-10-01T${hour}:00,1\n`).join('')}`,
      },
      finds: { record: 'inputs.check-gauge', message: 'has 3 rows for a time that an earlier row has' },
    },
    {
      name: 'a row between the hours',
      set: { 'inputs.check-gauge.series.step': 'PT1H' },
      files: {
        'data/check.csv': `date,rain_mm\n${['00:00', '01:00', '01:30', '02:00', '03:00', '04:00', '05:00'].map((clock) => `2001-10-01T${clock},1\n`).join('')}`,
      },
      finds: {
        record: 'inputs.check-gauge',
        line: 4,
        message: 'off the step of PT1H that its first row begins: 2001-10-01T01:30 (line 4)',
      },
    },
  ],
  silent: [
    {
      name: 'samples',
      set: { 'inputs.streamflow.series.step': 'irregular' },
      files: { 'data/flow.csv': withoutLines(11, 13) },
    },
    {
      name: 'no step is stated',
      remove: ['inputs.rainfall.series.step'],
      files: { 'data/rain.csv': withoutLines(11, 13) },
    },
    {
      name: 'a row that can’t be read, which another rule says',
      files: { 'data/rain.csv': withLines({ 9: '2001-10-08,x' }) },
    },
  ],
});
