import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { sealUnmoved } from './unmoved.ts';

const otherRain = { 'inputs.rainfall': '1'.repeat(64) };

ruleCases(sealUnmoved, {
  fires: [
    {
      name: 'other rain, the same outputs',
      sealed: { 'runs.calibrated': { unmoved: ['inputs.rainfall'] } },
      finds: {
        record: 'runs.calibrated',
        level: 'block',
        message: /inputs\.rainfall had changed, but the outputs/,
        clear: 'stoplog seal runs.calibrated --because',
      },
    },
    {
      name: 'other flow, the same parameters',
      sealed: { parameters: { unmoved: ['inputs.streamflow'] } },
      phase: 'calibration',
      finds: { record: 'parameters', level: 'note', message: 'the calibrated values had not' },
    },
    {
      name: 'the seal was taken out and made anew since the commit before',
      sealedBefore: { 'runs.calibrated': { driven_by: otherRain } },
      finds: { record: 'runs.calibrated', message: 'inputs.rainfall had changed' },
    },
  ],
  silent: [
    {
      name: 'the commit before had other outputs too',
      sealedBefore: { 'runs.calibrated': { driven_by: otherRain, outcome: '0'.repeat(64) } },
    },
    { name: 'as in the commit before', sealedBefore: {} },
    {
      name: 'with a reason',
      sealed: { 'runs.calibrated': { unmoved: ['inputs.rainfall'], because: 'only a comment changed' } },
    },
    { name: 'rerun', sealed: { 'runs.calibrated': { unmoved: ['inputs.rainfall'], grade: 'rerun' } } },
    {
      name: 'the record is gone',
      seals: 'sound',
      sealed: { catchment: { unmoved: ['x'] } },
      remove: ['catchment'],
    },
  ],
});
