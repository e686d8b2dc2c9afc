import type { RecordNode } from '../records/record.ts';
import { type StatedCondition, statedConditions, statedDrivers } from './conditions/stated.ts';
import type { Facts } from './facts.ts';
import type { Figure } from './figures.ts';
import { nodesIn } from './nodes-in.ts';

/** Digits that count in a figure that is not stated yet. */
const usualDigits = 4;

/**
 * Figures of conditions and drivers that the files give otherwise, and those of all that state none. Conditions belong to the
 * first scenario; a case that stands for many records has no place for one's figures.
 */
export function conditionFigures(
  facts: Pick<Facts, 'records' | 'manifest' | 'scenarios'>,
): readonly Figure[] {
  const cases = nodesIn(facts.records.nodes, 'scenarios');
  const [first] = cases;
  if (first === undefined) return [];
  return [
    ...toWrite(first, statedConditions(facts)),
    ...cases.flatMap((one) => (one.field.at(-1) === one.name ? toWrite(one, statedDrivers(one, facts)) : [])),
  ];
}

function toWrite({ id }: RecordNode, all: readonly StatedCondition[]): readonly Figure[] {
  const says = new Set(all.flatMap(({ of, name, stated }) => (stated === null ? [] : `${of} ${name}`)));
  return all.flatMap(({ of, name, field, stated, found, agrees }) => {
    if (found === null || agrees || (stated === null && says.has(`${of} ${name}`))) return [];
    const decimals = stated?.decimals ?? usualDigits - 1 - Math.floor(Math.log10(Math.abs(found) || 1));
    return {
      record: id,
      field,
      stated: stated?.value ?? null,
      found: Number(found.toFixed(Math.min(20, Math.max(0, decimals)))),
    };
  });
}
