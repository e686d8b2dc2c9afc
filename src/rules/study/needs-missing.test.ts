import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { studyNeedsMissing } from './needs-missing.ts';

ruleCases(studyNeedsMissing, {
  fires: [
    {
      name: 'none',
      remove: ['study.needs'],
      phase: 'calibration',
      finds: { record: 'study', field: 'study.needs', level: 'block' },
    },
    { name: 'an empty list', set: { 'study.needs': [] }, finds: { message: 'which variable' } },
    {
      name: 'no regime',
      remove: ['study.needs.0.regime'],
      finds: { field: 'study.needs[0]', subject: 'streamflow', message: 'no regime' },
    },
    {
      name: 'no variable in the second',
      set: { 'study.needs.1': { regime: 'high' } },
      finds: { field: 'study.needs[1]', message: 'no variable' },
    },
    { name: 'a note in the set-up', remove: ['study.needs'], phase: 'setup', finds: { level: 'note' } },
  ],
  silent: [{ name: 'two needs', set: { 'study.needs.1': { variable: 'sediment', regime: 'whole' } } }],
});
