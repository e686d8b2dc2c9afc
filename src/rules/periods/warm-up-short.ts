import { nodesIn } from '../../facts/nodes-in.ts';
import type { FieldPath } from '../../manifest/manifest.ts';
import { parsePeriod } from '../../manifest/period.ts';
import { type Draft, rule } from '../rule.ts';

export const periodsWarmUpShort = rule({
  id: 'periods.warm-up-short',
  scope: 'manifest',
  from: 'warn',
  means: null,
  statement: 'The warm-up is under a year, or under 4.6 times the time constant of the slowest store.',
  why: 'A linear store forgets its first content exponentially: after 4.6 time constants one hundredth of the error is left. A groundwater store of 120 days needs 553 days.',
  source: {
    basis: 'published',
    citation:
      'Rahman, M. & Lu, M. (2015) Model spin-up behavior for wet and dry basins. Water 7(8):4256-4273 (spin-up of 55 days in wet and 298 in dry basins); the factor follows from the linear store: ln 100 = 4.6; a year is our own choice',
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
  check: (_, { manifest, records }, limits) => {
    const shortest = limits.warm_up_days ?? 0;
    const multiple = limits.warm_up_constants ?? 0;
    const study = warmUpAt('periods', ['periods', 'warm_up'], manifest.data.periods?.warm_up);
    const tooShort = (
      warmUp: WarmUp | null,
      needed: number,
      subject: string,
      reason: string,
    ): readonly Draft[] => {
      if (warmUp === null || warmUp.days >= needed) return [];
      const { days, record, field } = warmUp;
      return [
        {
          record,
          field,
          subject,
          stated: days,
          unit: 'd',
          message: `The warm-up has ${days} days; ${reason}`,
        },
      ];
    };
    const year = `under ${shortest}, it does not see every season once.`;
    return [
      ...tooShort(study, shortest, 'year', year),
      ...nodesIn(records.nodes, 'runs').flatMap(({ id, field, name, fragment: { warm_up, stores } }) => {
        const own = warmUpAt(id, [...field, 'warm_up'], warm_up);
        const constant = stores?.slowest_days ?? 0;
        const needed = Math.ceil(multiple * constant);
        const reason = `the slowest store of run ${name} (${constant} days) needs ${needed} to forget its first content to one hundredth.`;
        return [
          ...tooShort(own, shortest, 'year', year),
          ...tooShort(warm_up === undefined ? study : own, needed, `${id} stores`, reason),
        ];
      }),
    ];
  },
});

interface WarmUp {
  readonly record: string;
  readonly field: FieldPath;
  readonly days: number;
}

/** A warm-up of days; null for none and for one of zero, which has its reason. */
function warmUpAt(record: string, field: FieldPath, stated: unknown): WarmUp | null {
  const days = typeof stated === 'string' ? parsePeriod(stated)?.days : undefined;
  return days === undefined ? null : { record, field, days };
}
