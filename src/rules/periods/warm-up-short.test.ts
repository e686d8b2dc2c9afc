import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { periodsWarmUpShort } from './warm-up-short.ts';

// ln 100 = 4.6: the store of 70 days needs 322 days, one of 120 days 552 (METHODS: 120 x ln 100 = 552.6).
const stores = 'runs.calibrated.stores.slowest_days';

ruleCases(periodsWarmUpShort, {
  fires: [
    {
      name: 'a day under a year',
      set: { 'periods.warm_up': '2001-10-01/2002-09-29' },
      finds: {
        record: 'periods',
        field: 'periods.warm_up',
        stated: 364,
        level: 'warn',
        message: 'every season',
      },
    },
    {
      name: 'under 4.6 constants of the slowest store',
      set: { 'periods.warm_up': '2001-10-01/2003-04-04', [stores]: 120 },
      finds: { stated: 551, subject: 'runs.calibrated stores', message: /120 days\) needs 552/ },
    },
    {
      name: 'both',
      set: { 'periods.warm_up': '2001-10-01/2001-12-31' },
      finds: [{ subject: 'year' }, { subject: 'runs.calibrated stores', message: 'needs 322' }],
    },
    {
      name: 'the run has a short one of its own',
      set: { 'runs.calibrated.warm_up': '2001-10-01/2002-06-30', 'runs.calibrated.stores.slowest_days': 20 },
      finds: { record: 'runs.calibrated', field: 'runs.calibrated.warm_up', stated: 273 },
    },
    {
      name: 'the run’s own is too short for its store only',
      set: { 'runs.calibrated.warm_up': '2001-10-01/2002-09-30', [stores]: 100 },
      finds: { record: 'runs.calibrated', stated: 365, message: 'needs 460' },
    },
  ],
  silent: [
    {
      name: 'just enough days for the store',
      set: { 'periods.warm_up': '2001-10-01/2003-04-05', [stores]: 120 },
    },
    { name: 'a year', set: { 'periods.warm_up': '2001-10-01/2002-09-30' } },
    { name: 'none, which is another rule’s', remove: ['periods.warm_up'] },
    {
      name: 'zero with its reason',
      set: { 'periods.warm_up': { zero_because: 'begins from an observed state' } },
    },
    {
      name: 'a store that the run’s own, longer one serves',
      set: { 'runs.calibrated.warm_up': '2001-10-01/2005-09-30', [stores]: 300 },
    },
  ],
});
