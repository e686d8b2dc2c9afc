import { rule } from '../rule.ts';

export const scenariosConditionsMissing = rule({
  id: 'scenarios.conditions-missing',
  scope: 'scenarios',
  from: 'application',
  means: 'incomplete',
  statement: 'The calibrated conditions that a scenario’s drivers are measured against are not stated.',
  why: 'A model knows the weather it was calibrated on. How far a scenario reaches beyond it can only be said when that range is written down.',
  source: {
    basis: 'practice',
    citation: 'Common practice: scenarios are compared with the conditions of calibration.',
  },
  clear:
    'Under scenarios.conditions state each driver by the same name as in the case, with the input or run column that gives it over calibration.',
  check: ({ id, name, fragment }, { manifest }) => {
    const conditions = manifest.data.scenarios?.conditions ?? {};
    const drivers = Object.keys(fragment.drivers ?? {});
    const field = ['scenarios', 'cases', name ?? '', 'drivers'];
    if (drivers.length === 0) {
      return [
        {
          record: id,
          field,
          message: `Scenario ${name} names no driver, so nothing can be said of how far it reaches.`,
        },
      ];
    }
    return drivers
      .filter((driver) => conditions[driver]?.input === undefined && conditions[driver]?.file === undefined)
      .map((driver) => ({
        record: id,
        field: [...field, driver],
        subject: driver,
        message: `Scenario ${name} drives the model by ${driver.replaceAll('_', ' ')}, but the range of it during calibration is not stated.`,
      }));
  },
});
