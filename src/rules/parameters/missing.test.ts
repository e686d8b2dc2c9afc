import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { parametersMissing } from './missing.ts';

ruleCases(parametersMissing, {
  fires: [
    {
      name: 'no values',
      remove: ['parameters.values'],
      finds: { record: 'parameters', field: 'parameters.values', level: 'block' },
    },
    { name: 'an empty list', set: { 'parameters.values': [] }, finds: { record: 'parameters' } },
    { name: 'no parameters in set-up', remove: ['parameters'], phase: 'setup', finds: { level: 'note' } },
  ],
  silent: [
    {
      name: 'a table',
      remove: ['parameters.values'],
      set: { 'parameters.table': 'calibration/sensitivity.csv' },
    },
  ],
});
