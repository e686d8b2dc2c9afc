import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { periodsWarmUpMissing } from './warm-up-missing.ts';

ruleCases(periodsWarmUpMissing, {
  fires: [
    {
      name: 'none is stated',
      remove: ['periods.warm_up'],
      finds: { record: 'periods', field: 'periods.warm_up', level: 'block' },
    },
    {
      name: 'no periods at all',
      remove: ['periods'],
      phase: 'setup',
      finds: { record: 'periods', level: 'note' },
    },
  ],
  silent: [
    {
      name: 'zero with its reason',
      set: { 'periods.warm_up': { zero_because: 'begins from the state of the forecast model' } },
    },
  ],
});
