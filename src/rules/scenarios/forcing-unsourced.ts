import { inputsNamed } from '../../facts/series-of.ts';
import { inputsTakenBy } from '../../facts/taken-inputs.ts';
import { parsePeriod } from '../../manifest/period.ts';
import type { RecordNode } from '../../records/record.ts';
import { rule } from '../rule.ts';

export const scenariosForcingUnsourced = rule({
  id: 'scenarios.forcing-unsourced',
  scope: 'scenarios',
  from: 'application',
  means: 'incomplete',
  statement:
    'What drives a scenario is no input record: a driver’s input is not one that the run takes, or the run takes no input whose period holds the days that it simulates.',
  why: 'A scenario is as good as its forcing. Where that is a file without a source, nobody can tell whose climate, from which model and which change factors, was run.',
  source: {
    basis: 'published',
    citation:
      'Wilkinson, M. D. et al. (2016) The FAIR Guiding Principles. Scientific Data 3:160018, principle R1.2: data come with detailed provenance',
  },
  clear: 'State the forcing as inputs with their source, and name them in the `takes` of the scenario’s run.',
  check: ({ id, name, field, fragment }, { records }) => {
    const run = records.nodes.get(`runs.${fragment.run}`) as RecordNode<'runs'> | undefined;
    if (run === undefined) return [];
    const taken = inputsTakenBy(run, records);
    const ids = new Set(taken.map((input) => input.id));
    const drivers = Object.entries(fragment.drivers ?? {});
    const apart = drivers.flatMap(([driver, { input }]) => {
      if (input === undefined || inputsNamed(input, records).some((one) => ids.has(one.id))) return [];
      return {
        record: id,
        field: [...field, 'drivers', driver, 'input'],
        subject: driver,
        message: `The ${driver.replaceAll('_', ' ')} of scenario ${name} is measured on inputs.${input}, but run ${run.name} does not take it, so it is not what drives the scenario.`,
      };
    });
    const simulated = parsePeriod(run.fragment.simulation ?? records.manifest.data.periods?.simulation ?? '');
    const holds = taken.some(({ fragment: { period } }) => {
      const held = parsePeriod(period ?? '');
      return (
        held !== null && simulated !== null && held.first <= simulated.first && simulated.last <= held.last
      );
    });
    if (apart.length > 0 || holds || simulated === null) return apart;
    return [
      {
        record: id,
        field: [...field, 'run'],
        subject: 'run',
        message: `Run ${run.name} of scenario ${name} simulates ${simulated.first} to ${simulated.last}, but takes no input record that holds these days, so where its forcing comes from is not known.`,
      },
    ];
  },
});
