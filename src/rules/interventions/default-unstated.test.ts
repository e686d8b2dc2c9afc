import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { interventionsDefaultUnstated } from './default-unstated.ts';

ruleCases(interventionsDefaultUnstated, {
  fires: [
    {
      name: 'nothing says whether the settings are the model’s own',
      remove: ['interventions.0.default'],
      finds: {
        record: 'interventions',
        field: 'interventions[0]',
        subject: 'reservoir mill pond',
        level: 'block',
      },
    },
  ],
  silent: [
    { name: 'a default that is said', set: { 'interventions.0.default': true } },
    {
      name: 'not represented',
      set: { 'interventions.0.represented': false },
      remove: ['interventions.0.default'],
    },
    { name: 'no interventions', remove: ['interventions'] },
  ],
});
