import { statedConditions, statedDrivers } from '../../facts/conditions/stated.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { asPrinted } from '../evaluation/score-names.ts';
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
    'Find out which is wrong, the figure or the file, window or months that it names; `stoplog seal --all --figures` writes the recomputed figures.',
  check: (record, facts) => {
    const conditions = statedConditions(facts).filter(
      ({ name }) => firstCase(name, facts.records) === record.id,
    );
    return [...conditions, ...statedDrivers(record, facts)].flatMap(({ name, of, compared }) => {
      const whose = of === 'condition' ? 'during calibration' : `in scenario ${record.name}`;
      const { unit } = facts.manifest.data.scenarios?.conditions?.[name] ?? {};
      return compared.flatMap(({ name: key, field, printed, recomputed, agrees }) => {
        // That nothing can be computed has a rule of its own.
        if (agrees || !isDefined(recomputed)) return [];
        const found = Number(asPrinted({ value: recomputed.value, decimals: printed.decimals + 1 }));
        return {
          record: record.id,
          field,
          subject: `${of} ${name} ${key}`,
          stated: printed.value,
          found,
          ...(unit === undefined ? {} : { unit }),
          message: `The ${key === 'mean' ? key : `${key} value`} of ${name.replaceAll('_', ' ')} ${whose} is stated as ${asPrinted(printed)}; the files give ${found}.`,
        };
      });
    });
  },
});
