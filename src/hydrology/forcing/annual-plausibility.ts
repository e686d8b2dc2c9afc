import { defined, type Statistic, undefinedBecause } from '../paired.ts';
import { depthFactors, type UnitFactor } from './unit-factor.ts';

/** Mean annual depths in mm between which places where people gauge water lie; the ends are our choice, from memory. */
const usualMm = {
  precipitation: { lowest: 20, highest: 12_000 },
  evapotranspiration: { lowest: 50, highest: 4000 },
} as const;

export interface AnnualPlausibility {
  readonly plausible: boolean;
  /** Factors that would bring the depth between the ends, when it is not there. */
  readonly factors: readonly UnitFactor[];
}

/**
 * Whether a mean annual depth can be what its role says, or comes out so only in another unit.
 *
 * Formula: lowest <= depth <= highest of the role (precipitation 20 to 12 000 mm, evapotranspiration 50 to 4000 mm); else the unit factors f with depth * f or depth / f there
 * Inputs: mean annual depth in mm, as the stated unit makes it.
 * Range: plausible or not; a list of factors.
 * Read: 41 mm a year of evapotranspiration may be inches; without a reference series this is all that a total can tell.
 * Undefined: a depth that is no finite number, or is negative.
 * Source: our choice; wettest mean annual rainfall about 11 900 mm (Mawsynram, from memory).
 * Example: annualPlausibility({role: 'precipitation', annualMm: 1.1}) -> {value: {plausible: false, factors: [{factor: 25.4}, {factor: 1000}, {factor: 3600}]}}
 */
export function annualPlausibility(of: {
  readonly role: keyof typeof usualMm;
  readonly annualMm: number;
}): Statistic<AnnualPlausibility> {
  if (!(of.annualMm >= 0 && Number.isFinite(of.annualMm)))
    return undefinedBecause('an annual depth is a finite number from zero');
  const { lowest, highest } = usualMm[of.role];
  const usual = (depth: number) => depth >= lowest && depth <= highest;
  const plausible = usual(of.annualMm);
  const brings = ({ factor }: UnitFactor) => usual(of.annualMm * factor) || usual(of.annualMm / factor);
  return defined({ plausible, factors: plausible ? [] : depthFactors.filter(brings) });
}
