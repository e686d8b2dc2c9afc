import type { StatedParameter } from '../../facts/parameters/stated.ts';
import { handbookOrder } from '../../hydrology/parameters/handbook-order.ts';
import { type HandbookTableName, handbookTables } from '../../hydrology/parameters/handbook-range.ts';
import type { Handbook, Order } from '../../manifest/data.generated.ts';
import { type Draft, rule } from '../rule.ts';
import { handbookClassOf } from './handbook-class.ts';
import { placeOf } from './place.ts';

export const parametersOrderBroken = rule({
  id: 'parameters.order-broken',
  scope: 'parameters',
  from: 'validation',
  means: 'contradicted',
  statement:
    'Values break a stated order, the order between layers and units that they had before they were scaled or shifted, or a published order of their handbook (curve numbers rise with the soil group and with sealing).',
  why: 'A calibration may move values, not turn the catchment upside down: a topsoil that drains slower than the clay below it, or a meadow that sheds more water than a street, fits a curve and no land.',
  source: {
    basis: 'published',
    citation:
      'USDA-NRCS (2004) National Engineering Handbook, Part 630, ch. 9, and TR-55 (1986) Table 2-2; Chow, V. T. (1959) Open-Channel Hydraulics, Table 5-6; Rawls, W. J. et al. (1982) Trans. ASAE 25(5):1316-1320; stated orders follow from the words',
  },
  clear:
    'Calibrate again with one factor for all layers and units, or with bounds that keep the order; or correct the value that was mistyped.',
  check: ({ fragment }, { parameters }) => {
    const { values } = parameters;
    return [
      ...(fragment.orders ?? []).flatMap((order, index) => statedOrder(order, index, values)),
      ...changedOrders(
        values,
        (fragment.orders ?? []).flatMap(({ of, rising }) => (rising ? [] : (of ?? []))),
      ),
      ...publishedOrders(values),
    ];
  },
});

function statedOrder(order: Order, index: number, values: readonly StatedParameter[]): readonly Draft[] {
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
        drafts.push({
          ...pair(low, high),
          field,
          message: `${low.label} is ${told(low)}, ${equals(low, high) ? 'as much as' : 'above'} ${high.label} with ${told(high)}. The record says: ${(states ?? rising.join(' < ')).replace(/\.$/, '')}.`,
        });
      }
  return drafts;
}

/** Scaling and shifting keep what was known of the land before; so do parameters of which the record says so. */
function changedOrders(values: readonly StatedParameter[], kept: readonly string[]): readonly Draft[] {
  const names = new Set(values.map(({ parameter }) => parameter.name));
  return [...names].flatMap((name) => {
    const own = values.filter(
      ({ parameter }) =>
        parameter.name === name &&
        parameter.initial !== undefined &&
        (kept.includes(name) || parameter.change === 'scale' || parameter.change === 'shift'),
    );
    const turned = pairsOf(own).filter(
      ([low, high]) =>
        (low.parameter.initial ?? 0) < (high.parameter.initial ?? 0) &&
        (isBeside(low, high, ['scope']) || isBeside(low, high, ['layer'])) &&
        isAbove(low, high, false),
    );
    const [first] = turned;
    if (first === undefined) return [];
    const [low, high] = first;
    return {
      ...pair(low, high),
      subject: `${name} changed`,
      message: `Calibration turned the order of ${name}${turned.length > 1 ? ` in ${turned.length} pairs of layers and units` : ''}: ${low.label} was ${low.parameter.initial} and below ${high.label} with ${high.parameter.initial}; now they are ${told(low)} and ${told(high)}.`,
    };
  });
}

function publishedOrders(values: readonly StatedParameter[]): readonly Draft[] {
  const inHandbook = values.flatMap((one) => {
    const { handbook } = one.parameter;
    return isPublished(handbook) ? [{ one, table: handbook.table, of: handbookClassOf(handbook) }] : [];
  });
  return pairsOf(inHandbook).flatMap(([low, high]) => {
    if (low.table !== high.table) return [];
    const order = handbookOrder(low.table, low.of, high.of);
    if (order === null || !isAbove(low.one, high.one, !order.orEqual)) return [];
    return {
      ...pair(low.one, high.one),
      subject: `${low.one.label} ${high.one.label} published`,
      message: `${low.one.label} (${described(low.one)}) is ${told(low.one)} and ${high.one.label} (${described(high.one)}) ${told(high.one)}, but by the handbook ${order.states}.`,
    };
  });
}

function isPublished(handbook: Handbook | undefined): handbook is Handbook & { table: HandbookTableName } {
  return (handbookTables as readonly (string | undefined)[]).includes(handbook?.table);
}

function described({ parameter: { handbook } }: StatedParameter): string {
  const group = handbook?.soil_group === undefined ? '' : `, soil group ${handbook.soil_group}`;
  const sealed =
    handbook?.impervious_share === undefined ? '' : `, ${100 * handbook.impervious_share} % sealed`;
  return `${handbook?.class ?? ''}${group}${sealed}`;
}

/** Every two, in both orders. */
function pairsOf<Item>(items: readonly Item[]): readonly (readonly [Item, Item])[] {
  return items.flatMap((one) => items.filter((other) => other !== one).map((other) => [one, other] as const));
}

function isBeside(
  one: StatedParameter,
  other: StatedParameter,
  keys: readonly ('scope' | 'layer')[],
): boolean {
  return keys.every((key) => one.parameter[key] === other.parameter[key]);
}

/** Whether the value that should be smaller is greater, or with `strictly` as great; false where units differ or one is not stated. */
function isAbove(low: StatedParameter, high: StatedParameter, strictly: boolean): boolean {
  const [less, more] = [low.parameter.value, high.parameter.value];
  if (less === undefined || more === undefined || low.parameter.unit !== high.parameter.unit) return false;
  return strictly ? less >= more : less > more;
}

function equals(one: StatedParameter, other: StatedParameter): boolean {
  return one.parameter.value === other.parameter.value;
}

function told({ written, parameter: { value, unit } }: StatedParameter): string {
  return `${written ?? value}${unit === undefined || unit === '1' ? '' : ` ${unit}`}`;
}

function pair(low: StatedParameter, high: StatedParameter): Omit<Draft, 'message'> {
  return {
    ...placeOf(low, 'value'),
    subject: `${low.label} < ${high.label}`,
    found: low.parameter.value ?? '',
  };
}
