import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { manifestCircle } from './circle.ts';

ruleCases(manifestCircle, {
  fires: [
    {
      name: 'of three',
      set: { 'inputs.rainfall.rests_on': ['evaluation.outlet-flow'] },
      phase: 'setup',
      finds: { message: 'rest on each other in a circle', level: 'block' },
    },
    {
      name: 'of one',
      set: { 'study.rests_on': ['study'] },
      finds: { record: 'study', found: 'study <- study' },
    },
  ],
  silent: [{ name: 'a link that closes none', set: { 'inputs.rainfall.rests_on': ['inputs.check-gauge'] } }],
});
