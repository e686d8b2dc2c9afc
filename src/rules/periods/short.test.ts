import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { periodsShort } from './short.ts';

ruleCases(periodsShort, {
  fires: [
    {
      name: 'a day short of three years',
      set: { 'periods.calibration': ['2003-10-01/2006-09-29'] },
      finds: {
        record: 'periods',
        field: 'periods.calibration[0]',
        found: 2,
        level: 'warn',
        message: 'holds 2 complete',
      },
    },
    {
      name: 'three calendar years hold two hydrological ones',
      set: { 'periods.calibration': ['2004-01-01/2006-12-31'] },
      finds: { found: 2 },
    },
    {
      name: 'half a year',
      set: { 'periods.calibration': ['2003-10-01/2004-03-31'] },
      finds: { found: 0 },
    },
    {
      name: 'a target’s own',
      set: { 'evaluation.outlet-flow.periods': { calibration: ['2003-10-01/2004-09-30'] } },
      finds: { record: 'evaluation.outlet-flow', found: 1, message: 'holds 1 complete year from' },
    },
  ],
  silent: [
    { name: 'three years', set: { 'periods.calibration': ['2003-10-01/2006-09-30'] } },
    {
      name: 'three years in pieces',
      set: {
        'periods.calibration': ['2003-10-01/2004-09-30', '2005-10-01/2006-09-30', '2008-10-01/2009-09-30'],
      },
    },
    {
      name: 'calendar years where the study counts in them',
      set: { 'periods.year_begins': '01-01', 'periods.calibration': ['2004-01-01/2006-12-31'] },
    },
    { name: 'none is stated', remove: ['periods.calibration'] },
  ],
});
