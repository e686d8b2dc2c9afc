import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { modelVersionMissing } from './version-missing.ts';

ruleCases(modelVersionMissing, {
  fires: [
    {
      name: 'no version',
      remove: ['model.version'],
      phase: 'setup',
      finds: { record: 'model', field: 'model.version', level: 'block', message: 'which version' },
    },
    { name: 'no model', remove: ['model'], finds: { record: 'model', message: 'no `model` section' } },
  ],
  silent: [{ name: 'any version', set: { 'model.version': 'r664' } }],
});
