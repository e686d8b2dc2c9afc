import type { StatedParameter } from '../../facts/parameters/stated.ts';
import type { Draft } from '../rule.ts';
import { isAbove, pair, told } from './compared.ts';

type Pair = readonly [low: StatedParameter, high: StatedParameter];

/**
 * Parameters whose layers or units changed their order in calibration. Scaling and shifting keep what was known of the land before;
 * so do parameters of which the record says so (`kept`).
 */
export function changedOrders(
  values: readonly StatedParameter[],
  kept: ReadonlySet<string>,
): readonly Draft[] {
  const byName = grouped(
    values.filter(
      ({ parameter: { name, initial, change } }) =>
        initial !== undefined && (kept.has(name) || change === 'scale' || change === 'shift'),
    ),
    ({ parameter }) => parameter.name,
  );
  return [...byName].flatMap(([name, own]) => {
    const turned = (['scope', 'layer'] as const).flatMap((key) =>
      [...grouped(own, ({ parameter }) => String(parameter[key])).values()].flatMap(turnedIn),
    );
    // Without layers, or without scopes, all stand in both groups.
    const places = new Map(turned.map((one) => [one[1], one]));
    const [first] = places.values();
    if (first === undefined) return [];
    const [low, high] = first;
    return {
      ...pair(low, high),
      subject: `${name} changed`,
      message: `Calibration turned the order of ${name}${places.size > 1 ? ` in ${places.size} layers and units` : ''}: ${low.label} was ${low.parameter.initial} and below ${high.label} with ${high.parameter.initial}; now they are ${told(low)} and ${told(high)}.`,
    };
  });
}

/** Each that has come below one that was smaller before, with the one of those that is greatest now. */
function turnedIn(group: readonly StatedParameter[]): readonly Pair[] {
  const initial = ({ parameter }: StatedParameter) => parameter.initial ?? 0;
  const inOrder = group.toSorted((one, other) => initial(one) - initial(other));
  const turned: Pair[] = [];
  let greatest: StatedParameter | undefined;
  let equal: StatedParameter[] = [];
  const settle = () => {
    for (const one of equal) if (greatest === undefined || isAbove(one, greatest, false)) greatest = one;
    equal = [];
  };
  for (const one of inOrder) {
    // Those that were equal before may come to lie in any order.
    if (equal[0] !== undefined && initial(equal[0]) < initial(one)) settle();
    if (greatest !== undefined && isAbove(greatest, one, false)) turned.push([greatest, one]);
    equal.push(one);
  }
  return turned;
}

function grouped(
  values: readonly StatedParameter[],
  keyOf: (one: StatedParameter) => string,
): ReadonlyMap<string, readonly StatedParameter[]> {
  const groups = new Map<string, StatedParameter[]>();
  for (const one of values) {
    const group = groups.get(keyOf(one));
    if (group === undefined) groups.set(keyOf(one), [one]);
    else group.push(one);
  }
  return groups;
}
