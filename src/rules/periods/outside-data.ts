import { windowSets } from '../../facts/windows.ts';
import { dayNumber, type Period, parsePeriod } from '../../manifest/period.ts';
import { type Draft, rule } from '../rule.ts';

export const periodsOutsideData = rule({
  id: 'periods.outside-data',
  scope: 'manifest',
  from: 'calibration',
  means: 'contradicted',
  statement: 'A window reaches beyond the observed record, or the simulation beyond the forcing.',
  why: 'Days without observations can’t be scored, and days without rain data were filled by something that nobody stated.',
  source: {
    basis: 'definition',
    citation: 'Follows from the words: a window is covered by the data it uses.',
  },
  clear: 'Correct the window, or the input’s period if it is the one that is wrong.',
  check: (_, { records }) => {
    const { data } = records.manifest;
    const recordOf = (input: string | undefined): Period | null =>
      parsePeriod(data.inputs?.[input ?? '']?.period ?? '');
    const drafts: Draft[] = [];
    const sets = windowSets(records);
    for (const [name, target] of Object.entries(data.evaluation ?? {})) {
      const observed = recordOf(target.observed?.input);
      const set = sets.find(({ record }) => record === `evaluation.${name}`) ?? sets[0];
      for (const { kind, field, period } of set?.windows ?? []) {
        if (observed === null) break;
        if (kind === 'warm-up' || !beyond(period, observed)) continue;
        drafts.push({
          record: set?.record ?? 'periods',
          field,
          subject: `${name} ${kind} ${field.at(-1)}`,
          stated: written(period),
          found: written(observed),
          message: `The ${kind} window of ${name} has ${outside(period, observed)} days outside the record of its observations, inputs.${target.observed?.input}.`,
        });
      }
    }
    for (const [name, run] of Object.entries(data.runs ?? {})) {
      const simulation = parsePeriod(run.simulation ?? data.periods?.simulation ?? '');
      const scenario = Object.values(data.scenarios?.cases ?? {}).some((one) => one.run === name);
      if (simulation === null || (scenario && run.simulation === undefined)) continue;
      for (const input of (run.takes ?? [])
        .filter((one) => one.startsWith('inputs.'))
        .map((one) => one.slice(7))) {
        const forcing = recordOf(input);
        if (forcing === null || data.inputs?.[input]?.series === undefined || !beyond(simulation, forcing))
          continue;
        drafts.push({
          record: run.simulation === undefined ? 'periods' : `runs.${name}`,
          field: run.simulation === undefined ? ['periods', 'simulation'] : ['runs', name, 'simulation'],
          subject: `runs.${name} inputs.${input}`,
          stated: written(simulation),
          found: written(forcing),
          message: `Run ${name} simulates ${outside(simulation, forcing)} days for which its input ${input} holds no data.`,
        });
      }
    }
    return drafts;
  },
});

function beyond(period: Period, record: Period): boolean {
  return period.first < record.first || period.last > record.last;
}

function outside(period: Period, record: Period): number {
  const shared =
    Math.min(dayNumber(period.last), dayNumber(record.last)) -
    Math.max(dayNumber(period.first), dayNumber(record.first)) +
    1;
  return period.days - Math.max(0, shared);
}

function written({ first, last }: Period): string {
  return `${first}/${last}`;
}
