import { defined, isDefined, type Statistic } from '../../hydrology/paired.ts';
import type { StatedRange } from '../../manifest/data.generated.ts';
import type { FieldPath, Manifest } from '../../manifest/manifest.ts';
import type { RecordNode } from '../../records/record.ts';
import type { Quantity } from '../conditions.ts';
import type { Facts } from '../facts.ts';
import { type ComparedFigure, compareFigures } from '../stated-figure.ts';

/** A condition or a driver: what is stated of it, and what the files give. */
export interface StatedCondition {
  /** The name of the condition. */
  readonly name: string;
  readonly of: 'condition' | 'driver';
  /** Where its figures are stated, or would be. */
  readonly field: FieldPath;
  readonly compared: readonly ComparedFigure[];
  /** Mean, lowest and highest; empty where the files give none. */
  readonly found: ReadonlyMap<string, Statistic>;
}

type Given = Pick<Facts, 'manifest' | 'scenarios'>;

export function statedConditions({ manifest, scenarios }: Given): readonly StatedCondition[] {
  return Object.entries(manifest.data.scenarios?.conditions ?? {}).map(([name, { stated }]) => ({
    name,
    of: 'condition',
    ...held(['scenarios', 'conditions', name], stated, scenarios.conditions.get(name), manifest),
  }));
}

export function statedDrivers(
  { id, field, fragment }: RecordNode<'scenarios'>,
  { manifest, scenarios }: Given,
): readonly StatedCondition[] {
  const { drivers } = scenarios.cases.get(id) ?? {};
  return Object.entries(fragment.drivers ?? {}).map(([name, { stated }]) => ({
    name,
    of: 'driver',
    ...held([...field, 'drivers', name], stated, drivers?.get(name), manifest),
  }));
}

function held(
  place: FieldPath,
  stated: StatedRange | undefined,
  quantity: Quantity | undefined,
  manifest: Manifest,
): Pick<StatedCondition, 'field' | 'compared' | 'found'> {
  const field = [...place, 'stated'];
  const found = new Map<string, Statistic>();
  if (quantity !== undefined && isDefined(quantity.figures)) {
    const { mean, lowest, highest } = quantity.figures.value;
    for (const [key, value] of Object.entries({ mean, lowest, highest })) found.set(key, defined(value));
  }
  return { field, compared: compareFigures(stated, field, found, manifest), found };
}
