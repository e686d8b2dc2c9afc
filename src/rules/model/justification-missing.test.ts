import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { modelJustificationMissing } from './justification-missing.ts';

ruleCases(modelJustificationMissing, {
  fires: [
    {
      name: 'no reason',
      remove: ['model.justification'],
      finds: { record: 'model', field: 'model.justification', level: 'block' },
    },
    {
      name: 'no alternative',
      remove: ['model.alternatives'],
      finds: { field: 'model.alternatives', message: 'No other model' },
    },
    {
      name: 'an alternative without the reason',
      remove: ['model.alternatives.0.rejected_because'],
      finds: { field: 'model.alternatives' },
    },
    {
      name: 'neither, a note in the calibration',
      remove: ['model.alternatives', 'model.justification'],
      phase: 'calibration',
      finds: [{ level: 'note' }, { level: 'note' }],
    },
  ],
  silent: [
    {
      name: 'one of two alternatives with its reason',
      set: { 'model.alternatives.1': { name: 'regression' } },
    },
  ],
});
