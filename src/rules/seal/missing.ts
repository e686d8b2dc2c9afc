import { rule } from '../rule.ts';
import { fromPhase } from './required.ts';

export const sealMissing = rule({
  id: 'seal.missing',
  scope: 'manifest',
  from: 'calibration',
  means: 'unsealed',
  statement:
    'A record was never sealed: study, catchment, model, inputs and periods from the calibration on, all others from the validation on.',
  why: 'Until a named person has looked at a record and its files, nobody answers for it, and a later change to them can’t be noticed.',
  source: {
    basis: 'house',
    citation: 'Our own choice: a record counts once a named person has reviewed it.',
  },
  clear: 'Look at the record and its files, then: stoplog seal RECORD',
  check(_, { records, standings, sealsFile }) {
    const unreadable = new Set(sealsFile.faults.map(({ record }) => record));
    if (unreadable.has(null)) return [];
    return [...records.nodes.values()]
      .filter(({ id }) => standings.get(id)?.state === 'unsealed' && !unreadable.has(id))
      .map(({ id, area }) => ({
        record: id,
        ...fromPhase(area),
        message: 'Nobody has sealed this record yet: no named person has looked at it and its files.',
        clear: `Look at the record and its files, then: stoplog seal ${id}`,
      }));
  },
});
