import type { RecomputedBalance } from '../../facts/balances/balance-of.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../figures.ts';
import { rule } from '../rule.ts';
import { computedBalance } from './computed-balance.ts';

export const balanceNotClosed = rule({
  id: 'balance.not-closed',
  scope: 'balance',
  from: 'validation',
  means: 'contradicted',
  statement:
    'What flows in is not what flows out and is stored: more than 1 % of the inflow is left over (0.1 % warns), or more than 1 % in a single year (warns).',
  why: 'A model that loses or makes water gives low flows and loads that no catchment has. Its own books must close far better than any measured balance.',
  source: {
    basis: 'published',
    citation:
      'Anderson, M. P. & Woessner, W. W. (1992) Applied Groundwater Modeling. Academic Press (limits of 1 % and 0.1 %, from memory); conservation of mass',
  },
  clear:
    'Look for a flow or a store that the balance leaves out, for a column in another unit or over another area, and for storage that is taken a step late.',
  limits: {
    residual_share: {
      default: 0.01,
      unit: '1',
      states: 'largest share of the inflow that may be left over',
      looser: 'higher',
    },
    residual_share_warned: {
      default: 0.001,
      unit: '1',
      states: 'share of the inflow left over from which a warning is given',
      looser: 'higher',
    },
  },
  check: (record, { balances }, limits) => {
    const balance = computedBalance(record, balances);
    if (balance === null) return [];
    const most = limits.residual_share ?? 0;
    const { residualMm: residual, inflowMm: inflow, residualShare: share } = balance;
    const about = { record: record.id, field: record.field, unit: '1' };
    // In a window without inflow, what flows out is all there is to compare with.
    const whole = inflow > 0 ? inflow : balance.outflowMm;
    const size = whole > 0 ? Math.abs(residual) / whole : 0;
    if (size > Math.min(most, limits.residual_share_warned ?? 0)) {
      const amount = `${figure(Math.abs(residual))}${withUnit(balance)}`;
      const part = isDefined(share) ? ` (${figure(100 * size)} %)` : '';
      return [
        {
          ...about,
          subject: 'window',
          ...(size > most ? {} : { from: 'warn' as const }),
          found: isDefined(share) ? Number(share.value.toPrecision(4)) : residual,
          message:
            residual > 0
              ? `The water balance of ${record.name} does not close: of ${figure(inflow)}${withUnit(balance)} that flow in, ${amount}${part} neither flow out nor are stored.`
              : `The water balance of ${record.name} does not close: ${amount}${part} more flow out or are stored than flow in.`,
          detail: [inWords(balance)],
        },
      ];
    }
    const worst = worstYear(balance);
    if (worst === null || worst.share <= most) return [];
    return [
      {
        ...about,
        subject: 'year',
        from: 'warn',
        found: Number(worst.share.toPrecision(4)),
        message: `The water balance of ${record.name} closes over the whole window, but not in ${worst.year}: ${figure(100 * worst.share)} % of that year’s inflow ${worst.residual > 0 ? 'is left over' : 'is missing'}. Faults of single years cancel.`,
      },
    ];
  },
});

function worstYear({ years }: RecomputedBalance) {
  const shares = years.map(({ year, inflow, residual }) => ({
    year,
    residual,
    share: inflow > 0 ? Math.abs(residual) / inflow : 0,
  }));
  return shares.toSorted((one, other) => other.share - one.share)[0] ?? null;
}

function withUnit({ unit }: RecomputedBalance): string {
  return unit === '' ? '' : ` ${unit}`;
}

/** Every term, for the reader to find what is wrong. */
function inWords(balance: RecomputedBalance): string {
  const side = (which: 'inflow' | 'outflow') =>
    balance.terms
      .filter((term) => term.side === which)
      .map(({ name, total }) => `${name} ${figure(total)}`)
      .join(', ');
  const { storageChangeMm: stored } = balance;
  return `${balance.first} to ${balance.last}, in${balance.unit === '' ? '' : ` (${balance.unit})`}: ${side('inflow')}; out: ${side('outflow')}; ${stored === null ? 'storage left out' : `stored: ${figure(stored)}`}`;
}
