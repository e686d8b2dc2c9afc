import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { studyPhaseBehind } from './phase-behind.ts';

ruleCases(studyPhaseBehind, {
  fires: [
    {
      name: 'scenarios in a validation',
      set: { 'study.phase': 'validation' },
      finds: {
        record: 'study',
        field: 'study.phase',
        stated: 'validation',
        found: 'application',
        level: 'warn',
      },
    },
    {
      name: 'validation scores in a calibration',
      set: { 'study.phase': 'calibration' },
      remove: ['scenarios.cases'],
      finds: { found: 'validation' },
    },
    {
      name: 'calibration scores in the set-up',
      set: { 'study.phase': 'setup' },
      remove: ['scenarios.cases', 'evaluation.outlet-flow.scores.validation'],
      finds: { found: 'calibration', message: 'scores' },
    },
    {
      name: 'parameters, and no phase stated',
      remove: ['study.phase', 'scenarios.cases', 'evaluation'],
      finds: { stated: 'setup', found: 'calibration', message: 'parameters' },
    },
  ],
  silent: [
    { name: 'an archive', set: { 'study.phase': 'archive' } },
    {
      name: 'a calibration without more',
      set: { 'study.phase': 'calibration' },
      remove: ['scenarios.cases', 'evaluation.outlet-flow.scores.validation'],
    },
    { name: 'judged as an earlier phase on the command line', phase: 'calibration' },
  ],
});
