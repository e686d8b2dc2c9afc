import { expect } from 'vitest';
import { editColumn, waterYear } from '../../../tests/harness/columns.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { periodsOneSided } from './one-sided.ts';

/**
 * Rain in mm a day by hydrological year. Of nine totals the terciles (type 7) lie two thirds of the way from the third to the fourth,
 * and a third of the way from the sixth to the seventh: here three years each are dry (1.0 to 1.4), average (2.0 to 2.2) and wet.
 */
const perDay: Record<number, number> = {
  2002: 1.4,
  2003: 3,
  2004: 2,
  2005: 2.1,
  2006: 2.2,
  2007: 3.2,
  2008: 1,
  2009: 1.2,
  2010: 3.4,
};
const rain = (values: Record<number, number>) => ({
  'data/rain.csv': editColumn('rain_mm', (date) => values[waterYear(date)] ?? 0),
});
const files = rain(perDay);
const allClasses = {
  'periods.calibration': ['2003-10-01/2008-09-30'],
  'periods.validation': ['2008-10-01/2010-09-30'],
};

ruleCases(periodsOneSided, {
  fires: [
    {
      name: 'no dry year in the calibration, two in the validation',
      files,
      finds: {
        record: 'periods',
        field: 'periods.calibration[0]',
        subject: 'dry',
        level: 'warn',
        message: 'no dry year; the validation has 2008 (dry), 2009 (dry), which it never saw',
        // 1.2 mm over 365 days; 3.4 mm over 365 days.
        detail: [
          expect.stringContaining('9 complete hydrological years'),
          // 2004 is a leap year: 2 x 366 days, 2.1 x 365, 2.2 x 365, 3.2 x 365.
          'calibration: 2004 average 732 mm, 2005 average 766.5 mm, 2006 average 803 mm, 2007 wet 1 168 mm',
          'validation: 2008 dry 366 mm, 2009 dry 438 mm, 2010 wet 1 241 mm',
        ],
      },
    },
    {
      name: 'a year with one day missing is left out, and said to be',
      files: {
        'data/rain.csv': editColumn('rain_mm', (date) =>
          date === '2005-02-14' ? '' : (perDay[waterYear(date)] ?? 0),
        ),
      },
      finds: {
        subject: 'dry',
        detail: [
          expect.stringContaining('of 8 complete hydrological years'),
          'calibration: 2004 average 732 mm, 2006 average 803 mm, 2007 wet 1 168 mm',
          expect.any(String),
          'left out, since a total needs every step: 2005 (1 of 365 steps missing)',
        ],
      },
    },
    {
      name: 'average years only',
      files,
      set: { 'periods.calibration': ['2003-10-01/2006-09-30'] },
      finds: { subject: 'wet dry', message: 'no wet and no dry year' },
    },
    {
      name: 'years cut short do not count',
      files,
      set: { ...allClasses, 'periods.calibration': ['2003-10-01/2008-09-29'] },
      finds: { subject: 'dry' },
    },
    {
      name: 'windows of a target',
      files,
      set: { ...allClasses, 'evaluation.outlet-flow.periods': { calibration: ['2006-10-01/2008-09-30'] } },
      finds: { record: 'evaluation.outlet-flow', subject: 'average' },
    },
    {
      name: 'a record that is no longer than the calibration',
      files: { 'data/rain.csv': (old) => old.replace(/^(?:200[12]|2003-0|20(?:0[89]|10)|2007-1).*\n/gm, '') },
      finds: { subject: 'untold', message: /4 complete hydrological years: .*outside the calibration/ },
    },
    {
      name: 'a gap in every year',
      files: {
        'data/rain.csv': editColumn('rain_mm', (date, value) => (date.endsWith('-02-14') ? '' : value)),
      },
      finds: {
        subject: 'untold',
        message: '0 complete hydrological years: three classes need at least three years',
        detail: [
          'left out, since a total needs every step: 2002 (1 of 365 steps missing), 2003 (1 of 365 steps missing), 2004 (1 of 366 steps missing), 2005 (1 of 365 steps missing), 2006 (1 of 365 steps missing), 2007 (1 of 365 steps missing) and 3 more',
        ],
      },
    },
  ],
  silent: [
    { name: 'a year of each class', files, set: allClasses },
    {
      name: 'a differential split-sample test is one-sided on purpose',
      files,
      set: {
        ...allClasses,
        'evaluation.outlet-flow.split_test': 'differential',
        'evaluation.outlet-flow.periods': { calibration: ['2006-10-01/2007-09-30'] },
      },
    },
    {
      name: 'the run takes no rain that is recorded',
      files,
      set: { 'runs.calibrated.takes': ['inputs.temperature'] },
    },
    { name: 'no calibration is stated', files, remove: ['periods.calibration'] },
  ],
});
