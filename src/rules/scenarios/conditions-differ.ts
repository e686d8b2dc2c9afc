import { type StatedCondition, statedConditions, statedDrivers } from '../../facts/conditions/stated.ts';
import { rule } from '../rule.ts';
import { firstCase } from './first-case.ts';

export const scenariosConditionsDiffer = rule({
  id: 'scenarios.conditions-differ',
  scope: 'scenarios',
  from: 'application',
  means: 'contradicted',
  statement:
    'A stated mean, lowest or highest of the calibrated conditions or of a scenario’s driver is not what the files give, within its printed decimals.',
  why: 'How far a scenario reaches is read from these figures; another figure belongs to another window, season or forcing, or to a label and not to the data.',
  source: {
    basis: 'definition',
    citation: 'Follows from the words: a stated condition is that of the named file over its window.',
  },
  clear:
    'Find out which is wrong, the figure or the file, window or months that it names; `stoplog seal --figures` writes the recomputed figures.',
  check: (record, facts) => {
    const conditions = statedConditions(facts).filter(
      ({ name }) => firstCase(name, facts.records) === record.id,
    );
    const unit = (name: string) => facts.manifest.data.scenarios?.conditions?.[name]?.unit;
    return [...conditions, ...statedDrivers(record, facts)].flatMap((one: StatedCondition) => {
      const { name, of, key, field, stated, found, agrees } = one;
      if (stated === null || found === null || agrees) return [];
      const shown = Number(found.toFixed(Math.min(20, Math.max(0, stated.decimals + 1))));
      const whose = of === 'condition' ? 'during calibration' : `in scenario ${record.name}`;
      const what = key === 'mean' ? 'mean' : `${key} value`;
      const ofUnit = unit(name);
      return {
        record: record.id,
        field,
        subject: `${of} ${name} ${key}`,
        stated: stated.value,
        found: shown,
        ...(ofUnit === undefined ? {} : { unit: ofUnit }),
        message: `The ${what} of ${name.replaceAll('_', ' ')} ${whose} is stated as ${stated.value.toFixed(Math.max(0, stated.decimals))}; the files give ${shown}.`,
      };
    });
  },
});
