import type { RecomputedBalance } from '../../facts/balances/balance-of.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../figures.ts';
import { type Draft, type Limits, rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';
import { computedBalance } from './computed-balance.ts';
import { shortYears } from './short-years.ts';

/** Fewer years that all rise may be chance: one in sixteen for five. */
const fewestYears = 5;

export const balanceStorageUnstated = rule({
  id: 'balance.storage-unstated',
  scope: 'balance',
  from: 'warn',
  means: null,
  statement:
    'Storage is left out without a reason or over a window too short for it, a store only fills or only empties year after year, or much of the inflow is stored.',
  why: 'A balance can be made to close by a store that takes in what is lost: a leak. And ratios over a window in which much is stored say nothing of the long run.',
  source: {
    basis: 'practice',
    citation:
      'Common practice: storage may be left out of ratios over five to ten years (no published limit was found).',
  },
  clear:
    'Name the columns of storage, or give `storage_neglected_because` and a longer window. If a store fills for ever, call it what it is: an outflow out of the catchment.',
  limits: {
    short_years: shortYears,
    steady_share: {
      default: 0.01,
      unit: '1',
      states:
        'share of the inflow that a store may take in or give while it changes in one direction every year',
      looser: 'higher',
    },
    storage_share: {
      default: 0.05,
      unit: '1',
      states: 'share of the inflow that all stores together may take in or give',
      looser: 'higher',
    },
  },
  check: (record, { balances }, limits) => {
    const balance = computedBalance(record, balances);
    if (balance === null) return [];
    const about = { record: record.id, field: [...record.field, 'storage'] };
    const parts =
      balance.storageChangeMm === null
        ? leftOut(balance, isStated(record.fragment.storage_neglected_because), limits)
        : changing(balance, limits);
    return parts.map((part) => ({ ...about, ...part }));
  },
});

type Part = Omit<Draft, 'record' | 'field'>;

function leftOut({ years }: RecomputedBalance, hasReason: boolean, limits: Limits): readonly Part[] {
  const isShort = years.length < (limits.short_years ?? 0);
  if (!isShort && hasReason) return [];
  return [
    {
      subject: 'left out',
      message: isShort
        ? `Storage is left out over ${years.length} complete years: in so short a window what is stored can be a large part of the rain.`
        : 'Storage is left out, and nothing says why that is tolerable (`storage_neglected_because`).',
    },
  ];
}

function changing(balance: RecomputedBalance, limits: Limits): readonly Part[] {
  const { years, inflowMm: inflow, unit, storageShare: share, storageChangeMm: change } = balance;
  const inUnit = unit === '' ? '' : ` ${unit}`;
  const steady = steadyStores(balance, limits.steady_share ?? 0);
  if (steady.length > 0)
    return steady.map(({ store, total }) => ({
      subject: store,
      found: Number(total.toPrecision(4)),
      ...(unit === '' ? {} : { unit }),
      message:
        total > 0
          ? `${store} fills in every one of ${years.length} years, by ${figure(total)}${inUnit} in all, ${figure((100 * total) / inflow)} % of the inflow. The balance closes only because this water counts as stored: a store that only fills is a leak.`
          : `${store} empties in every one of ${years.length} years, by ${figure(-total)}${inUnit} in all, ${figure((-100 * total) / inflow)} % of the inflow: the flows are fed by water that was there at the start.`,
    }));
  if (!isDefined(share) || Math.abs(share.value) <= (limits.storage_share ?? 0)) return [];
  return [
    {
      subject: 'change',
      found: Number((change ?? 0).toPrecision(4)),
      ...(unit === '' ? {} : { unit }),
      message: `${figure(Math.abs(change ?? 0))}${inUnit}, ${figure(Math.abs(100 * share.value))} % of the inflow, ${share.value > 0 ? 'went into' : 'came out of'} storage: runoff ratio and evaporative ratio over this window are not those of the long run.`,
    },
  ];
}

/** Stores that rise, or fall, in every complete year, and by more than a share of the inflow. */
function steadyStores({ years, inflowMm }: RecomputedBalance, leastShare: number) {
  if (years.length < fewestYears) return [];
  return Object.keys(years[0]?.stored ?? {}).flatMap((store) => {
    const changes = years.map(({ stored }) => stored[store] ?? 0);
    const total = changes.reduce((sum, change) => sum + change, 0);
    const isSteady = changes.every((change) => change > 0) || changes.every((change) => change < 0);
    return isSteady && Math.abs(total) > leastShare * inflowMm ? [{ store, total }] : [];
  });
}
