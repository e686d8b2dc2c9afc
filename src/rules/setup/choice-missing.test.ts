import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { setupChoiceMissing } from './choice-missing.ts';

const units = 'setup.choices.0';

ruleCases(setupChoiceMissing, {
  fires: [
    {
      name: 'no routing',
      remove: ['setup.choices.3'],
      finds: { record: 'setup', field: 'setup.choices', subject: 'routing', level: 'block' },
    },
    {
      name: 'no set-up at all',
      remove: ['setup'],
      finds: [
        { subject: 'spatial units' },
        { subject: 'evapotranspiration' },
        { subject: 'runoff generation' },
        { subject: 'routing' },
      ],
    },
    {
      name: 'a topic without a choice',
      set: { 'setup.choices.1.chosen': 'tbd' },
      finds: { subject: 'evapotranspiration' },
    },
    {
      name: 'a unit hydrograph is no spatial unit',
      set: { [`${units}.topic`]: 'unit hydrograph' },
      finds: { subject: 'spatial units' },
    },
    {
      name: 'units without thresholds',
      set: { [`${units}.chosen`]: 'six response units' },
      remove: [`${units}.thresholds`],
      finds: { field: 'setup.choices[0]', subject: 'thresholds', message: 'six response units' },
    },
    { name: 'only noted in set-up', remove: ['setup.choices.3'], phase: 'setup', finds: { level: 'note' } },
  ],
  silent: [
    { name: 'a catchment in one piece has no thresholds', remove: [`${units}.thresholds`] },
    {
      name: 'a lumped model',
      set: { [`${units}.chosen`]: 'Lumped over the catchment' },
      remove: [`${units}.thresholds`],
    },
    {
      name: 'topics in other words',
      set: {
        [`${units}.topic`]: 'Discretization',
        'setup.choices.1.topic': 'potential ET',
        'setup.choices.2.topic': 'Infiltration',
        'setup.choices.3.topic': 'river channels',
      },
    },
  ],
});
