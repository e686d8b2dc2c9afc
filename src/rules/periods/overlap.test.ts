import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { periodsOverlap } from './overlap.ts';

const own = 'evaluation.outlet-flow.periods';

ruleCases(periodsOverlap, {
  fires: [
    {
      name: 'one day of calibration and validation',
      set: { 'periods.validation': ['2007-09-30/2010-09-30'] },
      finds: {
        record: 'periods',
        field: 'periods.validation[0]',
        subject: 'calibration and validation',
        found: 1,
        level: 'block',
        message: 'share 2007-09-30.',
      },
    },
    {
      name: 'warm-up and calibration',
      set: { 'periods.warm_up': '2001-10-01/2004-09-30' },
      // A leap year.
      finds: {
        subject: 'warm-up and calibration',
        found: 366,
        message: '366 days, 2003-10-01 to 2004-09-30',
      },
    },
    {
      name: 'two calibration windows',
      set: { 'periods.calibration': ['2003-10-01/2005-09-30', '2005-09-01/2007-09-30'] },
      finds: { subject: 'calibration and calibration', found: 30, message: 'count twice' },
    },
    {
      name: 'a target’s own window with the study’s',
      set: { [own]: { validation: ['2006-10-01/2010-09-30'] } },
      finds: { record: 'evaluation.outlet-flow', field: `${own}.validation[0]`, found: 365 },
    },
    {
      name: 'the run’s own warm-up with the study’s calibration',
      set: { 'runs.calibrated.warm_up': '2001-10-01/2003-10-01' },
      finds: { record: 'evaluation.outlet-flow', field: 'runs.calibrated.warm_up', found: 1 },
    },
    {
      name: 'said once where targets take the study’s windows',
      set: { 'periods.validation': ['2007-09-30/2010-09-30'], [own]: { warm_up: '2001-10-01/2003-09-30' } },
      finds: { record: 'periods' },
    },
  ],
  silent: [
    { name: 'the next day', set: { 'periods.validation': ['2007-10-01/2010-09-30'] } },
    {
      name: 'halves swapped for a second parameter set',
      set: { [own]: { calibration: ['2007-10-01/2010-09-30'], validation: ['2003-10-01/2007-09-30'] } },
    },
  ],
});
