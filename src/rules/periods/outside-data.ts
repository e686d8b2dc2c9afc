import type { Facts } from '../../facts/facts.ts';
import { nodesIn } from '../../facts/nodes-in.ts';
import { inputsTakenBy } from '../../facts/taken-inputs.ts';
import { windowsOfTarget } from '../../facts/windows.ts';
import { dayNumber, type Period, parsePeriod } from '../../manifest/period.ts';
import type { RecordNode } from '../../records/record.ts';
import { formatDate } from '../../series/calendar.ts';
import { type Draft, rule } from '../rule.ts';

/** What must cover every simulated day; observed flow, and a calendar of leaves or of takings, need not. */
const forcing: ReadonlySet<string> = new Set(['precipitation', 'temperature', 'evapotranspiration']);

export const periodsOutsideData = rule({
  id: 'periods.outside-data',
  scope: 'manifest',
  from: 'calibration',
  means: 'contradicted',
  statement:
    'A window reaches beyond the observed record, or the simulation beyond the rain, temperature or evapotranspiration that drive it. The record is the stated period, or where none is stated what the files hold.',
  why: 'Days without observations can’t be scored, and days without rain data were filled by something that nobody stated.',
  source: {
    basis: 'definition',
    citation: 'Follows from the words: a window is covered by the data it uses.',
  },
  clear: 'Correct the window, or the input’s period if it is the one that is wrong.',
  check: (_, facts) => [...windowsBeyond(facts), ...simulationsBeyond(facts)],
});

function windowsBeyond(facts: Facts): readonly Draft[] {
  const seen = new Set<string>();
  return nodesIn(facts.records.nodes, 'evaluation').flatMap((target) => {
    const { input = '' } = target.fragment.observed ?? {};
    const observed = recordOf(input, facts);
    return windowsOfTarget(target, facts.records).flatMap(({ kind, field, period }) => {
      // Windows of the study are those of many targets, often of one gauge.
      const key = [...field, input].join('\0');
      if (kind === 'warm-up' || observed === null || !beyond(period, observed) || seen.has(key)) return [];
      seen.add(key);
      return {
        record: field[0] === 'periods' ? 'periods' : target.id,
        field,
        subject: `${target.name} ${kind} ${field.at(-1)}`,
        stated: written(period),
        found: written(observed),
        message: `The ${kind} window of ${target.name} has ${daysOutside(period, observed)} outside the record of its observations, inputs.${input}.`,
      };
    });
  });
}

function simulationsBeyond(facts: Facts): readonly Draft[] {
  const { records, manifest } = facts;
  const scenarios = new Set(Object.values(manifest.data.scenarios?.cases ?? {}).map(({ run }) => run));
  return nodesIn(records.nodes, 'runs').flatMap((run) => {
    const { simulation: own } = run.fragment;
    const simulation = parsePeriod(own ?? manifest.data.periods?.simulation ?? '');
    // A scenario that does not say what it simulates hardly simulates the study's own years.
    if (simulation === null || (own === undefined && scenarios.has(run.name ?? ''))) return [];
    // Of many inputs that one fragment states, the first that does not hold the days speaks for all that hold the same.
    const told = new Set<string>();
    return inputsTakenBy(run, records).flatMap((input) => {
      if (!forcing.has(input.fragment.role ?? '')) return [];
      const held = recordOf(input.name ?? '', facts);
      if (held === null || !beyond(simulation, held)) return [];
      const same = `${input.field.join('.')} ${written(held)}`;
      if (told.has(same)) return [];
      told.add(same);
      return {
        record: own === undefined ? 'periods' : run.id,
        field: own === undefined ? ['periods', 'simulation'] : [...run.field, 'simulation'],
        subject: `${run.id} ${input.id}`,
        stated: written(simulation),
        found: written(held),
        message: `Run ${run.name} simulates ${daysOutside(simulation, held)} for which its input ${input.name} holds no data.`,
      };
    });
  });
}

/** What an input covers: as it states, else as its files have it. */
function recordOf(name: string, { records, profiles }: Facts): Period | null {
  const input = records.nodes.get(`inputs.${name}`) as RecordNode<'inputs'> | undefined;
  const stated = input?.fragment.period;
  if (stated !== undefined) return parsePeriod(stated);
  const days = profiles.get(name)?.days;
  return days == null ? null : parsePeriod(`${formatDate(days.firstDay)}/${formatDate(days.lastDay)}`);
}

function beyond(period: Period, record: Period): boolean {
  return period.first < record.first || period.last > record.last;
}

function daysOutside(period: Period, record: Period): string {
  const shared =
    Math.min(dayNumber(period.last), dayNumber(record.last)) -
    Math.max(dayNumber(period.first), dayNumber(record.first)) +
    1;
  const days = period.days - Math.max(0, shared);
  return days === 1 ? 'one day' : `${days} days`;
}

function written({ first, last }: Period): string {
  return `${first}/${last}`;
}
