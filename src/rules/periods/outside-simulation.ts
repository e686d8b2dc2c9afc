import { parsePeriod } from '../../manifest/period.ts';
import { rule } from '../rule.ts';
import { windowSets } from './windows.ts';

export const periodsOutsideSimulation = rule({
  id: 'periods.outside-simulation',
  scope: 'manifest',
  from: 'calibration',
  means: 'contradicted',
  statement: 'A window reaches beyond the simulation.',
  why: 'Where nothing was simulated there is nothing to compare; the window that was really used is another one than stated.',
  source: { basis: 'definition', citation: 'Follows from the words: a window is part of the simulation.' },
  clear: 'Correct the window or periods.simulation so that they agree with the run.',
  check: (_, { manifest }) => {
    const simulation = parsePeriod(manifest.data.periods?.simulation ?? '');
    if (simulation === null) return [];
    return windowSets(manifest).flatMap(({ record, windows }) =>
      windows
        .filter(({ field }) => record === 'periods' || field[0] !== 'periods')
        .filter(({ period }) => period.first < simulation.first || period.last > simulation.last)
        .map(({ kind, field, period }) => ({
          record,
          field,
          subject: `${kind} ${field.at(-1)}`,
          stated: `${period.first}/${period.last}`,
          found: `${simulation.first}/${simulation.last}`,
          message: `The ${kind} window reaches beyond the simulation.`,
        })),
    );
  },
});
