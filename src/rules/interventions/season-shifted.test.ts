import { editColumn } from '../../../tests/harness/columns.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { interventionsSeasonShifted } from './season-shifted.ts';

/** Leaf area as sound-files.ts has it, but so many months late: a wave of one year, lowest between January and February. */
const late = (months: number) => (date: string) =>
  2 - 1.5 * Math.cos((2 * Math.PI * (Number(date.slice(5, 7)) - 1.5 - months)) / 12);
const simulated = (months: number) => ({ 'runs/calibrated/monthly.csv': editColumn('lai', late(months)) });
const season = 'seasons.0';

ruleCases(interventionsSeasonShifted, {
  fires: [
    {
      name: 'two months late',
      files: simulated(2),
      finds: {
        record: 'interventions',
        field: 'seasons[0]',
        subject: '0 leaf_area',
        found: 2,
        unit: 'months',
        level: 'warn',
        message: 'The simulated season of leaf area is 2 months behind the observed one.',
      },
    },
    { name: 'three months early', files: simulated(-3), finds: { found: -3, message: '3 months ahead of' } },
    {
      name: 'the calendar of the other hemisphere',
      files: simulated(6),
      finds: { message: 'six months away from' },
    },
    {
      name: 'daily evapotranspiration against monthly means',
      set: {
        [season]: {
          variable: 'evapotranspiration',
          simulated: {
            run: 'calibrated',
            file: 'runs/calibrated/daily.csv',
            time: 'date',
            values: 'pet_mm',
            step: 'P1D',
          },
          observed: { input: 'vegetation' },
        },
      },
      files: { 'data/leaf-area.csv': editColumn('lai', late(4)) },
      // Potential evapotranspiration of sound-files.ts peaks on 20 July, the observed wave four months after the end of July.
      finds: { found: -4 },
    },
    {
      name: 'a calendar month that no year has',
      files: { 'data/leaf-area.csv': (old) => old.replace(/^\d{4}-02,.*\n/gm, '') },
      finds: { message: 'no pair falls in month 2' },
    },
    {
      name: 'a flat season',
      files: { 'runs/calibrated/monthly.csv': editColumn('lai', () => 2) },
      finds: { message: 'can’t be held against' },
    },
    {
      name: 'a column that is not there',
      set: { [`${season}.simulated.values`]: 'leaves' },
      finds: { message: 'expected a column named "leaves"' },
    },
    {
      name: 'no observed input',
      remove: [`${season}.observed`],
      finds: { message: 'no observed input is named' },
    },
  ],
  silent: [
    { name: 'one month late', files: simulated(1) },
    { name: 'a month and a bit', files: simulated(1.4) },
    {
      name: 'twice as large, in another unit',
      files: { 'runs/calibrated/monthly.csv': editColumn('lai', (date) => 2 * late(0)(date)) },
    },
    { name: 'no seasons', remove: ['seasons'] },
    {
      name: 'a shift within the warm-up only',
      files: {
        'runs/calibrated/monthly.csv': editColumn('lai', (date) => late(date < '2003-10' ? 6 : 0)(date)),
      },
    },
  ],
});
