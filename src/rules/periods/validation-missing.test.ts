import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { periodsValidationMissing } from './validation-missing.ts';

ruleCases(periodsValidationMissing, {
  fires: [
    {
      name: 'none is stated',
      remove: ['periods.validation'],
      finds: { record: 'periods', field: 'periods.validation', level: 'block' },
    },
    {
      name: 'only noted while calibrating',
      remove: ['periods.validation'],
      phase: 'calibration',
      finds: { level: 'note' },
    },
  ],
  silent: [
    {
      name: 'the target has its own',
      remove: ['periods.validation'],
      set: { 'evaluation.outlet-flow.periods': { validation: ['2007-10-01/2010-09-30'] } },
    },
  ],
});
