import { inTurn, withLines, withValues } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsUnreadableRow } from './unreadable-row.ts';

ruleCases(inputsUnreadableRow, {
  fires: [
    {
      name: 'text for a number',
      files: { 'data/rain.csv': withLines({ 7: '2001-10-06,trace' }) },
      phase: 'setup',
      finds: {
        record: 'inputs.rainfall',
        file: 'data/rain.csv',
        line: 7,
        found: '"trace"',
        level: 'block',
        message:
          'data/rain.csv line 7, column rain_mm: expected a number in mm/d, found "trace"; if it marks a missing value, say missing: ["trace"].',
      },
    },
    {
      name: 'a column too many',
      files: { 'data/flow.csv': withLines({ 9: '2001-10-08,0,21' }) },
      finds: { record: 'inputs.streamflow', line: 9, found: '3', message: 'expected 2 columns' },
    },
    {
      name: 'a date of another kind',
      files: { 'data/check.csv': withLines({ 3: '02/10/2001,0' }) },
      finds: { record: 'inputs.check-gauge', line: 3, message: 'a date of the calendar such as 2010-09-30' },
    },
    {
      name: 'many, the first few told',
      files: { 'data/rain.csv': withValues(() => 'M', 10, 39) },
      finds: { line: 10, message: '29 more can’t be read.' },
    },
    {
      name: 'a code among temperatures',
      files: { 'data/temperature.csv': withValues(() => -999, 10, 10) },
      finds: { record: 'inputs.temperature', message: 'expected a plausible number in degC, found "-999"' },
    },
    {
      name: 'text and a code among rain',
      files: {
        'data/rain.csv': inTurn(
          withValues(() => -999, 10, 10),
          withValues(() => 'M', 20, 21),
        ),
      },
      finds: { line: 20, message: '1 more can’t be read.' },
    },
    {
      name: 'a column that the file does not have',
      set: { 'inputs.rainfall.series.values': 'rain' },
      finds: { file: 'data/rain.csv', line: 1, message: 'expected a column named "rain"' },
    },
    {
      name: 'nothing says where the time stands',
      remove: ['inputs.rainfall.series.time'],
      finds: { field: 'inputs.rainfall.series', message: 'no column of the time is stated' },
    },
  ],
  silent: [
    {
      name: 'a code among rain, which another rule names',
      files: { 'data/rain.csv': withValues(() => -999, 10, 12) },
    },
    { name: 'a declared code', files: { 'data/flow.csv': withValues(() => 'NA', 10, 12) } },
    { name: 'Windows line ends', files: { 'data/rain.csv': (old) => old.replaceAll('\n', '\r\n') } },
    { name: 'files that are not here', files: { 'data/rain.csv': null } },
  ],
});
