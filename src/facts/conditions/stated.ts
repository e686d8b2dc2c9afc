import { isDefined } from '../../hydrology/paired.ts';
import { agreesAsPrinted, printedNumber } from '../../hydrology/stated/printed-number.ts';
import type { StatedRange } from '../../manifest/data.generated.ts';
import type { FieldPath, Manifest } from '../../manifest/manifest.ts';
import type { RecordNode } from '../../records/record.ts';
import type { Quantity } from '../conditions.ts';
import type { Facts } from '../facts.ts';

export const rangeKeys = ['mean', 'lowest', 'highest'] as const;

/** A stated figure of a condition or driver, and what the files give. */
export interface StatedCondition {
  /** The name of the condition. */
  readonly name: string;
  readonly of: 'condition' | 'driver';
  readonly key: (typeof rangeKeys)[number];
  readonly field: FieldPath;
  /** With the decimals that are written; null where nothing is stated. */
  readonly stated: { readonly value: number; readonly decimals: number } | null;
  /** Null where the files give none. */
  readonly found: number | null;
  readonly agrees: boolean;
}

type Given = Pick<Facts, 'manifest' | 'scenarios'>;

/** Stated or not: mean, lowest and highest of every condition. */
export function statedConditions({ manifest, scenarios }: Given): readonly StatedCondition[] {
  return Object.entries(manifest.data.scenarios?.conditions ?? {}).flatMap(([name, { stated }]) =>
    held(
      { name, of: 'condition' },
      ['scenarios', 'conditions', name],
      stated,
      scenarios.conditions.get(name),
      manifest,
    ),
  );
}

/** Stated or not: mean, lowest and highest of every driver of a case. */
export function statedDrivers(
  { id, field, fragment }: RecordNode<'scenarios'>,
  { manifest, scenarios }: Given,
): readonly StatedCondition[] {
  return Object.entries(fragment.drivers ?? {}).flatMap(([name, { stated }]) =>
    held(
      { name, of: 'driver' },
      [...field, 'drivers', name],
      stated,
      scenarios.cases.get(id)?.drivers.get(name),
      manifest,
    ),
  );
}

function held(
  about: Pick<StatedCondition, 'name' | 'of'>,
  place: FieldPath,
  range: StatedRange | undefined,
  quantity: Quantity | undefined,
  manifest: Manifest,
): readonly StatedCondition[] {
  const figures = quantity !== undefined && isDefined(quantity.figures) ? quantity.figures.value : null;
  return rangeKeys.map((key) => {
    const field = [...place, 'stated', key];
    const value = range?.[key];
    const stated = value === undefined ? null : printedNumber(manifest.source(field) ?? String(value));
    const found = figures?.[key] ?? null;
    const agrees = stated !== null && found !== null && agreesAsPrinted({ stated, recomputed: found });
    return { ...about, key, field, stated, found, agrees };
  });
}
