import type { StatedParameter } from '../../facts/parameters/stated.ts';
import type { Order } from '../../manifest/data.generated.ts';
import type { Draft } from '../rule.ts';
import { isAbove, isBeside, pair, told } from './compared.ts';

/** An order of parameters, or of the layers or scopes of one, that the record states. */
export function statedOrder(
  order: Order,
  index: number,
  values: readonly StatedParameter[],
): readonly Draft[] {
  const { of, by = 'layer', rising, states } = order;
  if (rising === undefined) return [];
  const field = ['parameters', 'orders', index];
  const members = rising.map((entry) => ({
    entry,
    values: values.filter(({ parameter }) =>
      of === undefined
        ? parameter.name === String(entry)
        : parameter.name === of && String(parameter[by]) === String(entry),
    ),
  }));
  const absent = members.filter((member) => member.values.length === 0).map(({ entry }) => String(entry));
  const drafts: Draft[] = absent.map((entry) => ({
    record: 'parameters',
    field,
    subject: `order ${entry}`,
    from: 'warn',
    message: `The order ${rising.join(' < ')}${of === undefined ? '' : ` of ${of}`} names ${entry}, which is no ${of === undefined ? 'parameter' : `${by} of ${of}`} of this record.`,
    clear: 'Correct the name, or leave it out of the order.',
  }));
  // Where they stand for several layers or units, those of the same place are compared.
  const apart =
    of === undefined ? (['scope', 'layer'] as const) : ([by === 'layer' ? 'scope' : 'layer'] as const);
  const isSingle = members.every((member) => member.values.length < 2);
  for (const [place, { values: lower }] of members.slice(0, -1).entries())
    for (const low of lower)
      for (const high of members[place + 1]?.values ?? []) {
        if (!(isSingle || isBeside(low, high, apart)) || !isAbove(low, high, true)) continue;
        const how = low.parameter.value === high.parameter.value ? 'as much as' : 'above';
        drafts.push({
          ...pair(low, high),
          field,
          message: `${low.label} is ${told(low)}, ${how} ${high.label} with ${told(high)}. The record says: ${(states ?? rising.join(' < ')).replace(/\.$/, '')}.`,
        });
      }
  return drafts;
}
