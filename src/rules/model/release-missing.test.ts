import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { modelReleaseMissing } from './release-missing.ts';

ruleCases(modelReleaseMissing, {
  fires: [
    {
      name: 'no release',
      remove: ['model.release'],
      phase: 'setup',
      finds: { record: 'model', field: 'model.release', level: 'block' },
    },
    { name: 'no model', remove: ['model'], finds: { record: 'model' } },
  ],
  silent: [{ name: 'a revision number', set: { 'model.release': '2012.664' } }],
});
