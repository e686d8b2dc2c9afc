import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsLicenceMissing } from './licence-missing.ts';

ruleCases(inputsLicenceMissing, {
  fires: [
    {
      name: 'none, in an archive',
      remove: ['inputs.rainfall.source.licence'],
      phase: 'archive',
      finds: { record: 'inputs.rainfall', field: 'inputs.rainfall.source.licence', level: 'block' },
    },
    { name: 'none before', remove: ['inputs.rainfall.source.licence'], finds: { level: 'note' } },
  ],
  silent: [
    {
      name: 'a licence with a name of its own',
      set: { 'inputs.rainfall.source.licence': 'Eastmoor data terms of 2019' },
    },
  ],
});
