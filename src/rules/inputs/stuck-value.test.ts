import { expect } from 'vitest';
import { withoutLines, withValues } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsStuckValue } from './stuck-value.ts';

ruleCases(inputsStuckValue, {
  fires: [
    {
      name: 'rain of one amount on five days',
      files: { 'data/rain.csv': withValues(() => 3.4, 31, 35) },
      finds: {
        record: 'inputs.rainfall',
        file: 'data/rain.csv',
        line: 31,
        found: 5,
        unit: 'steps',
        message: 'holds 3.4 in 5 steps in a row, 2001-10-30 to 2001-11-03 (lines 31 to 35)',
        level: 'warn',
      },
    },
    {
      name: 'twice, the longer first',
      files: { 'data/rain.csv': (old) => withValues(() => 2, 100, 106)(withValues(() => 3.4, 31, 35)(old)) },
      finds: { line: 100, found: 7, detail: [expect.stringContaining('3.4 in 5 steps')] as never },
    },
    {
      name: 'a temperature',
      files: { 'data/temperature.csv': withValues(() => 4.2, 31, 38) },
      finds: { record: 'inputs.temperature', found: 8 },
    },
    {
      name: 'a flow',
      files: { 'data/flow.csv': withValues(() => 0.5, 31, 50) },
      finds: { record: 'inputs.streamflow', found: 20 },
    },
    {
      name: 'no rain for far longer than ever',
      files: { 'data/rain.csv': withValues(() => 0, 50, 130) },
      finds: { found: 87, message: 'the next longest time without rain in this record is 3' },
    },
    {
      name: 'what the project lets pass is less',
      set: { departures: [{ threshold: 'inputs.equal_rain_steps', now: 3, because: 'a fine gauge' }] },
      files: { 'data/rain.csv': withValues(() => 3.4, 31, 33) },
      finds: { found: 3 },
    },
  ],
  silent: [
    {
      name: 'a code for a missing value, which another rule names',
      files: { 'data/rain.csv': withValues(() => -9.9, 31, 60) },
    },
    { name: 'four days', files: { 'data/rain.csv': withValues(() => 3.4, 31, 34) } },
    {
      name: 'five days around a gap',
      files: { 'data/rain.csv': (old) => withoutLines(33, 33)(withValues(() => 3.4, 31, 36)(old)) },
    },
    {
      name: 'a dry time no longer than the shortest that counts',
      files: { 'data/rain.csv': withValues(() => 0, 50, 100) },
    },
    { name: 'leaves', files: { 'data/leaf-area.csv': withValues(() => 1.5) } },
    {
      name: 'samples',
      set: { 'inputs.streamflow.series.step': 'irregular' },
      files: { 'data/flow.csv': withValues(() => 0.5, 31, 50) },
    },
    {
      name: 'hours of one flow within a day',
      set: { 'inputs.streamflow.series.step': 'PT1H' },
      files: {
        'data/flow.csv': `date,flow_m3s\n${Array.from({ length: 23 }, (_, hour) => `2001-10-01T${String(hour).padStart(2, '0')}:00,0.5\n`).join('')}`,
      },
    },
  ],
});
