import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { scenariosConditionsDiffer } from './conditions-differ.ts';

// The files give 981 to 1161 mm, mean 1050, for the calibration and 987 to 1081 mm, mean 1019, for the scenario.
const condition = 'scenarios.conditions.annual_rainfall.stated';
const driver = 'scenarios.cases.dry.drivers.annual_rainfall.stated';

ruleCases(scenariosConditionsDiffer, {
  fires: [
    {
      name: 'a wrong digit in the calibrated mean',
      set: { [condition]: { mean: 1005, lowest: 981, highest: 1161 } },
      finds: {
        record: 'scenarios.dry',
        level: 'block',
        field: `${condition}.mean`,
        stated: 1005,
        found: 1050,
        unit: 'mm',
        message: 'The mean of annual rainfall during calibration is stated as 1005; the files give 1050',
      },
    },
    {
      name: 'the lowest year of the whole record',
      set: { [condition]: { lowest: 900.5 } },
      finds: { subject: 'condition annual_rainfall lowest', found: 981 },
    },
    {
      name: 'the label of a change factor in place of what the forcing holds',
      set: { [driver]: { mean: 892.5 } },
      finds: { field: `${driver}.mean`, found: 1019, message: 'in scenario dry is stated as 892.5' },
    },
    {
      name: 'summer months that are not those stated',
      set: {
        'scenarios.conditions.summer_evapotranspiration.stated': { mean: 428.7 },
        'scenarios.conditions.summer_evapotranspiration.months': [5, 9],
      },
      finds: { subject: 'condition summer_evapotranspiration mean', stated: 428.7 },
    },
    {
      name: 'figures over another window',
      set: {
        [condition]: { mean: 1050 },
        'scenarios.conditions.annual_rainfall.over': 'validation',
      },
      finds: { subject: 'condition annual_rainfall mean' },
    },
  ],
  silent: [
    {
      name: 'figures as printed',
      set: {
        [condition]: { mean: 1050, lowest: 981, highest: 1161 },
        [driver]: { mean: 1019, lowest: 987, highest: 1081 },
        'scenarios.conditions.summer_evapotranspiration.stated': { mean: 428.7 },
      },
    },
  ],
});
