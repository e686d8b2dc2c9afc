import { runOf, windowSets } from '../../facts/windows.ts';
import { type Period, parsePeriod } from '../../manifest/period.ts';
import type { RecordNode, Records } from '../../records/record.ts';
import { rule } from '../rule.ts';

export const periodsOutsideSimulation = rule({
  id: 'periods.outside-simulation',
  scope: 'manifest',
  from: 'calibration',
  means: 'contradicted',
  statement: 'A window reaches beyond the simulation.',
  why: 'Where nothing was simulated there is nothing to compare; the window that was really used is another one than stated.',
  source: { basis: 'definition', citation: 'Follows from the words: a window is part of the simulation.' },
  clear: 'Correct the window or periods.simulation so that they agree with the run.',
  check: (_, { records }) => {
    return windowSets(records).flatMap(({ record, windows }) => {
      const simulation = simulationOf(record, records);
      if (simulation === null) return [];
      return windows
        .filter(({ field }) => record === 'periods' || field[0] !== 'periods')
        .filter(({ period }) => period.first < simulation.first || period.last > simulation.last)
        .map(({ kind, field, period }) => ({
          record,
          field,
          subject: `${kind} ${field.at(-1)}`,
          stated: `${period.first}/${period.last}`,
          found: `${simulation.first}/${simulation.last}`,
          message: `The ${kind} window reaches beyond the simulation.`,
        }));
    });
  },
});

/** What the run of a target simulates; for the study's own windows, what the study says. */
function simulationOf(record: string, { manifest, nodes }: Records): Period | null {
  const target = nodes.get(record) as RecordNode<'evaluation'> | undefined;
  const run = record === 'periods' || target === undefined ? undefined : runOf(target, nodes);
  return parsePeriod(run?.fragment.simulation ?? manifest.data.periods?.simulation ?? '');
}
