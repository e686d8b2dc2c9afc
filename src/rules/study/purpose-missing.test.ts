import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { studyPurposeMissing } from './purpose-missing.ts';

ruleCases(studyPurposeMissing, {
  fires: [
    {
      name: 'no purpose',
      remove: ['study.purpose'],
      finds: { record: 'study', field: 'study.purpose', level: 'block' },
    },
    {
      name: 'no decision',
      remove: ['study.decision'],
      finds: { field: 'study.decision', message: 'which decision' },
    },
    {
      name: 'no study at all',
      remove: ['study'],
      finds: [
        { subject: 'purpose', level: 'block' },
        { subject: 'decision', level: 'block' },
      ],
    },
  ],
  silent: [
    {
      name: 'both, in other words',
      set: { 'study.purpose': 'Flood peaks at the bridge.', 'study.decision': 'Height of the bank.' },
    },
  ],
});
