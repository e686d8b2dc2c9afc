import { parsePeriod } from '../../manifest/period.ts';
import { type Draft, rule } from '../rule.ts';

export const periodsWarmUpShort = rule({
  id: 'periods.warm-up-short',
  scope: 'periods',
  from: 'warn',
  means: null,
  statement: 'The warm-up is under a year, or under 4.6 times the time constant of the slowest store.',
  why: 'A linear store forgets its first content exponentially: after 4.6 time constants one hundredth of the error is left. A groundwater store of 120 days needs 553 days.',
  source: {
    basis: 'published',
    citation:
      'Rahman, M. & Lu, M. (2015) Model spin-up behavior for wet and dry basins. Water 7(8):4256-4273 (spin-up of 55 days in wet and 298 in dry basins); the factor follows from the linear store: ln 100 = 4.6',
  },
  clear:
    'Begin the simulation earlier and move the warm-up with it, or say in the periods’ note why the stores are settled sooner.',
  limits: {
    warm_up_days: { default: 365, unit: 'd', states: 'shortest warm-up', looser: 'lower' },
    warm_up_constants: {
      default: 4.6,
      unit: 'time constants',
      states: 'shortest warm-up as a multiple of the slowest store’s time constant',
      looser: 'lower',
    },
  },
  check: ({ id, fragment }, { manifest }, limits) => {
    if (typeof fragment.warm_up !== 'string') return [];
    const days = parsePeriod(fragment.warm_up)?.days;
    if (days === undefined) return [];
    const draft = (needed: number, reason: string, subject: string): readonly Draft[] =>
      days >= needed
        ? []
        : [
            {
              record: id,
              field: ['periods', 'warm_up'],
              subject,
              stated: days,
              unit: 'd',
              message: `The warm-up has ${days} days; ${reason}`,
            },
          ];
    const shortest = limits.warm_up_days ?? 0;
    const multiple = limits.warm_up_constants ?? 0;
    return [
      ...draft(shortest, `under ${shortest}, it does not see every season once.`, 'year'),
      ...Object.entries(manifest.data.runs ?? {}).flatMap(([name, { stores }]) => {
        const needed = Math.ceil(multiple * (stores?.slowest_days ?? 0));
        const reason = `the slowest store of run ${name} (${stores?.slowest_days} days) needs ${needed} to forget its first content to one hundredth.`;
        return draft(needed, reason, `runs.${name}`);
      }),
    ];
  },
});
