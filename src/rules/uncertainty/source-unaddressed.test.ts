import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { uncertaintySourceUnaddressed } from './source-unaddressed.ts';

ruleCases(uncertaintySourceUnaddressed, {
  fires: [
    {
      name: 'structure',
      remove: ['uncertainty.sources.structure'],
      finds: {
        record: 'uncertainty',
        field: 'uncertainty.sources.structure',
        subject: 'structure',
        level: 'block',
        message: 'the model’s structure',
      },
    },
    {
      name: 'a stand-in',
      set: { 'uncertainty.sources.inputs.treated': 'to be done' },
      finds: { subject: 'inputs' },
    },
    {
      name: 'no uncertainty at all',
      remove: ['uncertainty'],
      finds: ['observations', 'inputs', 'parameters', 'structure'].map((subject) => ({ subject })),
    },
    {
      name: 'only noted while calibrating',
      remove: ['uncertainty.sources.inputs'],
      phase: 'calibration',
      finds: { level: 'note' },
    },
  ],
  silent: [
    {
      name: 'left out with a reason',
      set: { 'uncertainty.sources.inputs': { left_out_because: 'rain gauges on every hill' } },
    },
  ],
});
