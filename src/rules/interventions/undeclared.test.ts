import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { interventionsUndeclared } from './undeclared.ts';

ruleCases(interventionsUndeclared, {
  fires: [
    {
      name: 'nothing is said',
      remove: ['interventions'],
      finds: { record: 'interventions', field: 'interventions', level: 'block' },
    },
    {
      name: 'none, with a stand-in',
      set: { interventions: { none_because: 'tbd' } },
      finds: { level: 'block' },
    },
    { name: 'only noted in set-up', remove: ['interventions'], phase: 'setup', finds: { level: 'note' } },
  ],
  silent: [
    {
      name: 'none, with the reason',
      set: { interventions: { none_because: 'headwater without dwellings or licences' } },
    },
  ],
});
