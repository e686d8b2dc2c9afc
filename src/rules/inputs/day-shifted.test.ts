import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { soundFiles } from '../../../tests/harness/sound-files.ts';
import { inputsDayShifted } from './day-shifted.ts';

/** Every value one row later (or earlier, with -1); the first and the last keep what they have. */
const moved = (rows: 1 | -1) => (text: string) => {
  const lines = text.trimEnd().split('\n');
  const values = lines.map((line) => line.split(',')[1]);
  return `${lines.map((line, row) => (row === 0 ? line : `${line.split(',')[0]},${(row - rows > 0 ? values[row - rows] : undefined) ?? values[row]}`)).join('\n')}\n`;
};

ruleCases(inputsDayShifted, {
  fires: [
    {
      name: 'a day late',
      files: { 'data/rain.csv': moved(1) },
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.series',
        found: 'one day late',
        message:
          'its correlation with inputs.check-gauge is 1 against the day before and -0.2995 on the same day',
        level: 'warn',
      },
    },
    { name: 'a day early', files: { 'data/rain.csv': moved(-1) }, finds: { found: 'one day early' } },
    {
      name: 'one gauge of a mean that as a whole fits',
      set: {
        'inputs.rainfall.files': ['data/rain.csv', 'data/second.csv', 'data/third.csv'],
        'inputs.rainfall.combine': 'mean',
      },
      files: {
        'data/rain.csv': moved(1),
        'data/second.csv': soundFiles()['data/rain.csv'] ?? '',
        'data/third.csv': soundFiles()['data/rain.csv'] ?? '',
      },
      finds: { subject: 'data/rain.csv', found: 'one day late' },
    },
    {
      name: 'one gauge of several',
      set: {
        'inputs.rainfall.files': ['data/rain.csv', 'data/second.csv'],
        'inputs.rainfall.combine': 'each',
      },
      files: { 'data/second.csv': '', 'data/check.csv': moved(1) },
      finds: { subject: 'data/rain.csv', found: 'one day early' },
    },
  ],
  silent: [
    {
      name: 'nothing to compare with',
      remove: ['inputs.rainfall.compare_with'],
      files: { 'data/rain.csv': moved(1) },
    },
    {
      name: 'a project that lets it pass',
      set: { departures: [{ threshold: 'inputs.day_shift_gain', now: 2, because: 'known and harmless' }] },
      files: { 'data/rain.csv': moved(1) },
    },
    {
      name: 'fewer days than a year',
      files: { 'data/rain.csv': (old) => moved(1)(old).split('\n').slice(0, 300).join('\n') },
    },
  ],
});
