import { rule } from '../rule.ts';
import { called, declared } from './declared.ts';

export const interventionsDefaultUnstated = rule({
  id: 'interventions.default-unstated',
  scope: 'interventions',
  from: 'validation',
  means: 'incomplete',
  statement: 'A represented intervention does not say whether its settings are the model’s defaults.',
  why: 'A default reservoir rule or irrigation calendar was made for some other place; a reviewer has to know that nobody set it for this one.',
  source: { basis: 'practice', citation: 'Common practice in describing a model’s set-up.' },
  clear:
    'Say `default: true` where the model’s own settings were left, or `default: false` and name the settings file.',
  check: ({ id, fragment }) =>
    declared(fragment).flatMap((intervention, index) =>
      intervention.represented !== true || intervention.default !== undefined
        ? []
        : [
            {
              record: id,
              field: ['interventions', index],
              subject: called(intervention),
              message: `Nothing says whether the settings of the ${called(intervention)} were made for this catchment or left at default.`,
            },
          ],
    ),
});
