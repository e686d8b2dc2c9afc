import type { Comparison } from '../../facts/profiles/comparison.ts';
import {
  depthFactors,
  type UnitDoubt,
  type UnitFactor,
  unitFactor,
  unitFactors,
} from '../../hydrology/forcing/unit-factor.ts';
import { isDefined } from '../../hydrology/paired.ts';
import type { Input } from '../../manifest/data.generated.ts';
import type { Limits } from '../rule.ts';

/** For rules that ask for the factor, or make room for the one that does. */
export const factorTolerance = {
  unit_factor_tolerance: {
    default: 0.35,
    unit: '1',
    states: 'A total off its reference by a unit’s factor, this share more or less, is doubted.',
    looser: 'lower',
  },
} as const;

/** The factor between two units by which a series is off its reference; null where it is not. */
export function unitDoubt(
  { totals }: Comparison,
  role: Input['role'],
  { unit_factor_tolerance: toleranceShare = 0 }: Limits,
): (UnitDoubt & { readonly near: UnitFactor }) | null {
  if (totals === null) return null;
  const doubt = unitFactor({
    total: totals.checked,
    referenceTotal: totals.reference,
    toleranceShare,
    among: role === 'streamflow' ? unitFactors : depthFactors,
  });
  if (!isDefined(doubt) || doubt.value.near === null) return null;
  return { ...doubt.value, near: doubt.value.near };
}
