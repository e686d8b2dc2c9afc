import type { Comparison } from '../../facts/profiles/comparison.ts';
import { type UnitDoubt, type UnitFactor, unitFactor } from '../../hydrology/forcing/unit-factor.ts';
import { isDefined } from '../../hydrology/paired.ts';

/** Unless a project says otherwise: a total off by a unit's factor, this share more or less, counts as off by it. */
export const factorTolerance = 0.2;

/** The factor between two units by which a series is off its reference; null where it is not. */
export function unitDoubt(
  { totals }: Comparison,
  toleranceShare: number,
): (UnitDoubt & { readonly near: UnitFactor }) | null {
  if (totals === null) return null;
  const doubt = unitFactor({ total: totals.checked, referenceTotal: totals.reference, toleranceShare });
  if (!isDefined(doubt) || doubt.value.near === null) return null;
  return { ...doubt.value, near: doubt.value.near };
}
