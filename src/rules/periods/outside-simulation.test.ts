import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { periodsOutsideSimulation } from './outside-simulation.ts';

ruleCases(periodsOutsideSimulation, {
  fires: [
    {
      name: 'validation ends a day late',
      set: { 'periods.validation': ['2007-10-01/2010-10-01'] },
      finds: {
        record: 'periods',
        field: 'periods.validation[0]',
        subject: 'validation 0',
        stated: '2007-10-01/2010-10-01',
        found: '2001-10-01/2010-09-30',
        level: 'block',
      },
    },
    {
      name: 'warm-up begins before',
      set: { 'periods.warm_up': '2001-09-01/2003-09-30' },
      finds: { field: 'periods.warm_up' },
    },
    {
      name: 'a target’s own window',
      set: { 'evaluation.outlet-flow.periods': { validation: ['2009-10-01/2011-09-30'] } },
      finds: { record: 'evaluation.outlet-flow', field: 'evaluation.outlet-flow.periods.validation[0]' },
    },
    {
      name: 'a target whose run simulates less',
      set: {
        'runs.calibrated.simulation': '2001-10-01/2009-09-30',
        'evaluation.outlet-flow.periods': { validation: ['2007-10-01/2010-09-30'] },
      },
      finds: { record: 'evaluation.outlet-flow', found: '2001-10-01/2009-09-30' },
    },
  ],
  silent: [
    { name: 'no simulation is stated', remove: ['periods.simulation'] },
    { name: 'up to its last day', set: { 'periods.validation': ['2010-09-30/2010-09-30'] } },
  ],
});
