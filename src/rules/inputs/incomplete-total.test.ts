import { inTurn, withLines, withValues } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsIncompleteTotal } from './incomplete-total.ts';

// October 2001 in data/rain.csv: every fourth day from the 1st, 5 + (place * 7) % 11 + (2001 * 5) % 4 mm at places 0, 4, ... 28:
// 6, 12, 7, 13, 8, 14, 9, 15 = 84 mm (first and second from the formula: 5+0+1, 5+28%11+1 = 5+6+1).
const monthly = (october: number, months = '2001-10') => `month,rain_mm\n${months},${october}\n`;
const made = {
  'inputs.monthly': {
    role: 'precipitation',
    files: ['data/monthly.csv'],
    series: { time: 'month', values: 'rain_mm', unit: 'mm', step: 'P1M' },
    rests_on: ['inputs.rainfall'],
  },
};
/** The fifth of October, a day of 12 mm, is missing. */
const gap = withLines({ 6: '2001-10-05,' });

ruleCases(inputsIncompleteTotal, {
  fires: [
    {
      name: 'a month without one of its days',
      set: made,
      files: { 'data/rain.csv': gap, 'data/monthly.csv': monthly(72) },
      finds: {
        record: 'inputs.monthly',
        subject: 'inputs.rainfall',
        found: 1,
        message:
          'One figure is that of the steps that inputs.rainfall happens to have: 2001-10 (1 of 31 steps missing).',
        level: 'warn',
      },
    },
    {
      name: 'one that is compared with the daily record',
      set: {
        'inputs.monthly': { ...made['inputs.monthly'], rests_on: [], compare_with: { input: 'rainfall' } },
      },
      files: { 'data/rain.csv': gap, 'data/monthly.csv': monthly(72) },
      finds: { record: 'inputs.monthly' },
    },
    {
      name: 'a monthly mean of flow with twelve days missing',
      set: {
        'inputs.monthly': {
          role: 'streamflow',
          files: ['data/monthly.csv'],
          series: { time: 'month', values: 'rain_mm', unit: 'm3/s', step: 'P1M' },
          rests_on: ['inputs.streamflow'],
        },
      },
      files: {
        'data/flow.csv': inTurn(
          withValues(() => 0.25, 2, 32),
          withValues(() => 'NA', 5, 16),
        ),
        'data/monthly.csv': monthly(0.25),
      },
      finds: { message: '12 of 31' },
    },
  ],
  silent: [
    { name: 'nothing is missing', set: made, files: { 'data/monthly.csv': monthly(84) } },
    {
      name: 'the day was filled first',
      set: made,
      files: { 'data/rain.csv': gap, 'data/monthly.csv': monthly(84) },
    },
    {
      name: 'the month is missing',
      set: {
        ...made,
        'inputs.monthly': {
          ...made['inputs.monthly'],
          series: { ...made['inputs.monthly'].series, missing: [-1] },
        },
      },
      files: { 'data/rain.csv': gap, 'data/monthly.csv': monthly(-1) },
    },
    {
      name: 'nothing says what it is made of',
      set: { 'inputs.monthly': { ...made['inputs.monthly'], rests_on: [] } },
      files: { 'data/rain.csv': gap, 'data/monthly.csv': monthly(72) },
    },
  ],
});
