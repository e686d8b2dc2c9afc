import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { scenariosConditionsMissing } from './conditions-missing.ts';

ruleCases(scenariosConditionsMissing, {
  fires: [
    {
      name: 'a driver without a condition',
      remove: ['scenarios.conditions.annual_rainfall'],
      finds: {
        record: 'scenarios.dry',
        level: 'block',
        subject: 'annual_rainfall',
        message: 'the range of it during calibration is not stated',
      },
    },
    {
      name: 'a scenario without drivers',
      remove: ['scenarios.cases.dry.drivers'],
      finds: { record: 'scenarios.dry', message: 'names no driver' },
    },
    {
      name: 'a column that the run does not give',
      set: { 'scenarios.conditions.summer_evapotranspiration.values': 'pet' },
      finds: {
        field: 'scenarios.conditions.summer_evapotranspiration',
        subject: 'condition summer_evapotranspiration',
        message: 'a column named "pet"',
      },
    },
    {
      name: 'a unit of something else',
      set: { 'scenarios.conditions.annual_rainfall.unit': 'degC' },
      finds: [{ subject: 'condition annual_rainfall' }, { subject: 'driver annual_rainfall' }],
    },
    {
      name: 'a window too short for a whole year',
      set: { 'scenarios.cases.dry.drivers.annual_rainfall.over': '2044-01-01/2044-12-31' },
      finds: { subject: 'driver annual_rainfall', message: 'no year of the window is there as a whole' },
    },
  ],
  silent: [
    {
      name: 'seasons that go over the turn of the year',
      set: { 'scenarios.conditions.summer_evapotranspiration.months': [11, 2] },
    },
  ],
});
