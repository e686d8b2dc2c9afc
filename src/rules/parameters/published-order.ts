import type { StatedParameter } from '../../facts/parameters/stated.ts';
import { handbookOrder } from '../../hydrology/parameters/handbook-order.ts';
import {
  type HandbookClass,
  type HandbookTableName,
  handbookTables,
} from '../../hydrology/parameters/handbook-range.ts';
import type { Draft } from '../rule.ts';
import { isAbove, pair, told } from './compared.ts';
import { handbookClassOf } from './handbook-class.ts';

/** The parameters of one class of a handbook in one unit, by their extremes. */
interface OfClass {
  readonly table: HandbookTableName;
  readonly of: HandbookClass;
  lowest: StatedParameter;
  highest: StatedParameter;
}

/** Classes of a handbook whose values stand in another order than every published table has them. */
export function publishedOrders(values: readonly StatedParameter[]): readonly Draft[] {
  const classes = classesOf(values);
  return classes.flatMap((smaller) =>
    classes.flatMap((greater) => {
      if (smaller === greater || smaller.table !== greater.table) return [];
      const order = handbookOrder(smaller.table, smaller.of, greater.of);
      const [low, high] = [smaller.highest, greater.lowest];
      if (order === null || !isAbove(low, high, !order.orEqual)) return [];
      return {
        ...pair(low, high),
        subject: `${low.label} ${high.label} published`,
        message: `${low.label} (${described(smaller.of)}) is ${told(low)} and ${high.label} (${described(greater.of)}) ${told(high)}, but by the handbook ${order.states}.`,
      };
    }),
  );
}

function classesOf(values: readonly StatedParameter[]): readonly OfClass[] {
  const found = new Map<string, OfClass>();
  for (const one of values) {
    const { handbook, unit, value } = one.parameter;
    const table = handbookTables.find((name) => name === handbook?.table);
    if (handbook === undefined || table === undefined || value === undefined) continue;
    const of = handbookClassOf(handbook);
    const key = JSON.stringify([table, of.class.toLowerCase(), of.soilGroup, of.sealedShare, unit]);
    const known = found.get(key);
    if (known === undefined) found.set(key, { table, of, lowest: one, highest: one });
    else if (isAbove(one, known.highest, false)) known.highest = one;
    else if (isAbove(known.lowest, one, false)) known.lowest = one;
  }
  return [...found.values()];
}

function described({ class: name, soilGroup, sealedShare }: HandbookClass): string {
  const group = soilGroup === undefined ? '' : `, soil group ${soilGroup}`;
  return `${name}${group}${sealedShare === undefined ? '' : `, ${100 * sealedShare} % sealed`}`;
}
