import type { Away } from '../../facts/input.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { type Draft, rule } from '../rule.ts';
import { whileAway } from '../while-away.ts';
import { firstCase } from './first-case.ts';

export const scenariosConditionsMissing = rule({
  id: 'scenarios.conditions-missing',
  scope: 'scenarios',
  from: 'application',
  means: 'incomplete',
  statement:
    'The calibrated conditions that a scenario’s drivers are measured against are not stated, or they or a driver can’t be computed from the files.',
  why: 'A model knows the weather it was calibrated on. How far a scenario reaches beyond it can only be said when that range is written down and the files give it.',
  source: {
    basis: 'practice',
    citation: 'Common practice: scenarios are compared with the conditions of calibration.',
  },
  clear:
    'Under scenarios.conditions state each driver by the same name as in the case, with the input or run column that gives it over calibration.',
  check: ({ id, name, field: place, fragment }, { manifest, scenarios, records }) => {
    const conditions = manifest.data.scenarios?.conditions ?? {};
    const drivers = Object.keys(fragment.drivers ?? {});
    const field = [...place, 'drivers'];
    if (drivers.length === 0) {
      return [
        {
          record: id,
          field,
          message: `Scenario ${name} names no driver, so nothing can be said of how far it reaches.`,
        },
      ];
    }
    const drafts: Draft[] = [];
    const untold = (about: Pick<Draft, 'field' | 'subject' | 'message'>, away: Away | null): void => {
      drafts.push({
        record: id,
        ...about,
        ...(away === null
          ? {
              clear:
                'Name the file, columns, unit and window so that they can be read; `over` names another window.',
            }
          : whileAway(away)),
      });
    };
    for (const driver of drivers) {
      const what = driver.replaceAll('_', ' ');
      const condition = scenarios.conditions.get(driver);
      if (conditions[driver]?.input === undefined && conditions[driver]?.file === undefined) {
        drafts.push({
          record: id,
          field: [...field, driver],
          subject: driver,
          message: `Scenario ${name} drives the model by ${what}, but the range of it during calibration is not stated.`,
        });
        continue;
      }
      // Said once, by the first case that names it.
      if (condition !== undefined && !isDefined(condition.figures) && firstCase(driver, records) === id)
        untold(
          {
            field: ['scenarios', 'conditions', driver],
            subject: `condition ${driver}`,
            message: `The calibrated ${what} can’t be computed: ${condition.figures.undefined}.`,
          },
          condition.away,
        );
      const found = scenarios.cases.get(id)?.drivers.get(driver);
      if (found !== undefined && !isDefined(found.figures))
        untold(
          {
            field: [...field, driver],
            subject: `driver ${driver}`,
            message: `The ${what} of scenario ${name} can’t be computed: ${found.figures.undefined}.`,
          },
          found.away,
        );
    }
    return drafts;
  },
});
