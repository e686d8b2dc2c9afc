import { isDefined } from '../hydrology/paired.ts';
import type { RecordNode } from '../records/record.ts';
import { type StatedCondition, statedConditions, statedDrivers } from './conditions/stated.ts';
import type { Facts } from './facts.ts';
import type { Figure } from './figures.ts';
import { nodesIn } from './nodes-in.ts';
import { figuresOf } from './stated-figure.ts';

/** Digits that count in a figure that is not stated yet. */
const usualDigits = 4;

/** What `seal --figures` writes of conditions, which belong to the first scenario, and of drivers. */
export function conditionFiguresToWrite(
  facts: Pick<Facts, 'records' | 'manifest' | 'scenarios'>,
): readonly Figure[] {
  const cases = nodesIn(facts.records.nodes, 'scenarios');
  const [first] = cases;
  if (first === undefined) return [];
  return [
    // No fragment of many records states a condition.
    ...statedConditions(facts).flatMap((one) => toWrite({ ...first, name: null }, one)),
    ...cases.flatMap((node) => statedDrivers(node, facts).flatMap((one) => toWrite(node, one))),
  ];
}

function toWrite(node: RecordNode, { field, compared, found }: StatedCondition): readonly Figure[] {
  const usual = [...found].flatMap(([key, figure]) => {
    const size = isDefined(figure) ? Math.floor(Math.log10(Math.abs(figure.value) || 1)) : 0;
    return [[key, Math.max(0, usualDigits - 1 - size)] as const];
  });
  return figuresOf(node, field, compared, found, Object.fromEntries(usual));
}
