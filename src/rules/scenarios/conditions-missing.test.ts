import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { scenariosConditionsMissing } from './conditions-missing.ts';

ruleCases(scenariosConditionsMissing, {
  fires: [
    {
      name: 'a driver without its condition',
      remove: ['scenarios.conditions.annual_rainfall'],
      finds: {
        record: 'scenarios.dry',
        field: 'scenarios.cases.dry.drivers.annual_rainfall',
        subject: 'annual_rainfall',
        level: 'block',
        message: 'by annual rainfall',
      },
    },
    {
      name: 'a condition that no file gives',
      remove: ['scenarios.conditions.annual_rainfall.input'],
      finds: { subject: 'annual_rainfall' },
    },
    {
      name: 'no conditions at all',
      remove: ['scenarios.conditions'],
      finds: [{ subject: 'annual_rainfall' }, { subject: 'summer_evapotranspiration' }],
    },
    {
      name: 'no drivers',
      remove: ['scenarios.cases.dry.drivers'],
      finds: { field: 'scenarios.cases.dry.drivers', message: 'names no driver' },
    },
    {
      name: 'only noted at validation',
      remove: ['scenarios.conditions.annual_rainfall'],
      phase: 'validation',
      finds: { level: 'note' },
    },
  ],
  silent: [{ name: 'no scenarios', remove: ['scenarios'] }],
});
