import { nodesIn } from '../../facts/nodes-in.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { wetnessClasses } from '../../hydrology/windows/wetness-classes.ts';
import { figure } from '../figures.ts';
import { rule } from '../rule.ts';
import { isAnnualRain } from './annual-rain.ts';

export const scenariosNoSplit = rule({
  id: 'scenarios.no-split',
  scope: 'scenarios',
  from: 'warn',
  means: null,
  statement:
    'The mean rain of a scenario is that of a dry or a wet year of calibration, and no target records a differential split-sample test.',
  why: 'Transfers from wet to dry years fail most. A model is trusted in a drier or wetter climate after it was calibrated on wet years and tested on dry ones, or the reverse.',
  source: {
    basis: 'published',
    citation:
      'Klemeš, V. (1986) Hydrological Sciences Journal 31(1):13-24. Terciles of the calibrated years as dry, average and wet: climatological practice (from memory)',
  },
  clear:
    'Calibrate on the other kind of years, test on this kind, and record the test as a target with `split_test: differential`.',
  check: (record, facts) => {
    const isTested = nodesIn(facts.records.nodes, 'evaluation').some(
      ({ fragment: { split_test: test } }) => test === 'differential' || test === 'differential_proxy_basin',
    );
    if (isTested) return [];
    return [...(facts.scenarios.cases.get(record.id)?.drivers ?? [])].flatMap(([name, { figures }]) => {
      const calibrated = facts.scenarios.conditions.get(name)?.figures;
      if (calibrated === undefined || !isDefined(calibrated) || !isDefined(figures)) return [];
      // The rain of the study itself is no other climate.
      const { input } = facts.manifest.data.scenarios?.conditions?.[name] ?? {};
      const isSame = input !== undefined && record.fragment.drivers?.[name]?.input === input;
      if (isSame || !isAnnualRain(name, record, facts)) return [];
      const { labels, values } = calibrated.value;
      const classes = wetnessClasses({ years: labels.map(Number), totals: values });
      if (!isDefined(classes)) return [];
      const { lowerTercile, upperTercile } = classes.value;
      const { mean } = figures.value;
      if (mean >= lowerTercile && mean <= upperTercile) return [];
      const [kind, side, limit] =
        mean < lowerTercile ? ['dry', 'below', lowerTercile] : ['wet', 'above', upperTercile];
      const { unit } = facts.manifest.data.scenarios?.conditions?.[name] ?? {};
      return {
        record: record.id,
        field: [...record.field, 'drivers', name],
        subject: name,
        message: `The mean ${name.replaceAll('_', ' ')} of scenario ${record.name}, ${figure(mean)}${unit === undefined ? '' : ` ${unit}`}, is that of a ${kind} year of calibration (${side} ${figure(Number(limit))}), and no differential split-sample test is recorded.`,
      };
    });
  },
});
