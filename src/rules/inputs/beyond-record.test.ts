import { withValues } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsBeyondRecord } from './beyond-record.ts';

// Records: WMO World Weather and Climate Extremes Archive: 1825 mm in 24 hours, 26 470 mm in 12 months.
ruleCases(inputsBeyondRecord, {
  fires: [
    {
      name: 'a day above the record',
      files: { 'data/rain.csv': withValues(() => 1825.1, 40, 40) },
      phase: 'setup',
      finds: {
        record: 'inputs.rainfall',
        file: 'data/rain.csv',
        line: 40,
        found: 1825.1,
        unit: 'mm',
        message: '1 825 mm of rain within 24 hours, on 2001-11-08 (line 40)',
        level: 'block',
      },
    },
    {
      name: 'twelve months above the record, over the turn of the year',
      files: { 'data/rain.csv': withValues(() => 73, 100, 465) },
      finds: {
        line: 100,
        found: 26_718,
        message: 'within twelve months, from 2002-01-07 (line 100) to 2003-01-07',
      },
    },
    {
      name: 'hours that add up',
      set: { 'inputs.check-gauge.series.step': 'PT6H', 'inputs.check-gauge.series.unit': 'mm' },
      files: {
        'data/check.csv': `date,rain_mm\n${[0, 6, 12, 18].map((hour) => `2001-10-01T${String(hour).padStart(2, '0')}:00,500\n`).join('')}`,
      },
      finds: { record: 'inputs.check-gauge', line: 2, found: 2000, message: '24 hours' },
    },
    {
      name: 'metres said to be what they are',
      set: { 'inputs.rainfall.series.unit': 'm/d' },
      finds: [{ message: '24 hours' }, { message: 'twelve months' }],
    },
    {
      name: 'kilograms on a square metre',
      set: { 'inputs.rainfall.series.unit': 'kg m-2 d-1' },
      files: { 'data/rain.csv': withValues(() => 2000, 40, 40) },
      finds: { found: 2000 },
    },
  ],
  silent: [
    { name: 'the record itself', files: { 'data/rain.csv': withValues(() => 1825, 40, 40) } },
    { name: 'a river', files: { 'data/flow.csv': withValues(() => 5000, 40, 40) } },
    { name: 'a unit that is none', set: { 'inputs.rainfall.series.unit': 'buckets' } },
  ],
});
