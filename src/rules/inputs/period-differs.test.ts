import { withLines, withoutLines } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsPeriodDiffers } from './period-differs.ts';

/** sound.yaml's rain runs from 2001-10-01 (line 2) to 2010-09-30 (line 3288): 3287 days. */
const last = 3288;

ruleCases(inputsPeriodDiffers, {
  fires: [
    {
      name: 'the file ends ten days earlier',
      files: { 'data/rain.csv': withoutLines(last - 9, last) },
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.period',
        stated: '2001-10-01/2010-09-30',
        found: '2001-10-01/2010-09-20',
        message: 'they end 10 days earlier',
        level: 'block',
      },
    },
    {
      name: 'the file begins a day later',
      files: { 'data/rain.csv': withoutLines(2, 2) },
      finds: { found: '2001-10-02/2010-09-30', message: 'they begin 1 day later' },
    },
    {
      name: 'the stated period is within the file',
      set: { 'inputs.streamflow.period': '2002-10-01/2009-09-30' },
      finds: {
        record: 'inputs.streamflow',
        message: 'they begin 365 days earlier and they end 365 days later',
      },
    },
    {
      name: 'a month of a monthly series',
      files: { 'data/leaf-area.csv': withoutLines(37, 37) },
      finds: { record: 'inputs.vegetation', found: '2007-10-01/2010-08-31' },
    },
    {
      name: 'one gauge of a mean ends early',
      set: {
        'inputs.rainfall.files': ['data/rain.csv', 'data/second.csv'],
        'inputs.rainfall.combine': 'mean',
      },
      files: { 'data/second.csv': 'date,rain_mm\n2001-10-01,1\n2001-10-02,2\n' },
      finds: {
        found: '2001-10-01/2001-10-02',
        message: /hold 2001-10-01\/2001-10-02 together/,
        detail: ['data/rain.csv: 2001-10-01/2010-09-30', 'data/second.csv: 2001-10-01/2001-10-02'],
      },
    },
    {
      name: 'gauges of a mean that share no day',
      set: {
        'inputs.rainfall.files': ['data/rain.csv', 'data/second.csv'],
        'inputs.rainfall.combine': 'mean',
      },
      files: { 'data/second.csv': 'date,rain_mm\n2011-10-01,1\n' },
      finds: { message: 'No day is in all of the files' },
    },
    {
      name: 'samples that the period leaves out',
      set: {
        'inputs.streamflow.series.step': 'irregular',
        'inputs.streamflow.period': '2001-10-01/2010-09-29',
      },
      finds: { message: 'they end 1 day later' },
    },
  ],
  silent: [
    {
      name: 'files that follow one another',
      set: {
        'inputs.rainfall.files': ['data/rain.csv', 'data/more.csv'],
        'inputs.rainfall.period': '2001-10-01/2010-10-01',
      },
      files: { 'data/more.csv': 'date,rain_mm\n2010-10-01,1\n' },
    },
    { name: 'no period is stated', remove: ['inputs.rainfall.period'] },
    {
      name: 'the last row can’t be read, which another rule says',
      files: { 'data/rain.csv': withLines({ [last]: '2010-09-30,x' }) },
    },
    {
      name: 'samples with a pause at either end',
      set: {
        'inputs.streamflow.series.step': 'irregular',
        'inputs.streamflow.period': '2001-09-30/2010-10-01',
      },
    },
  ],
});
