import { defined, type Statistic, undefinedBecause } from '../paired.ts';

export interface UnitFactor {
  readonly factor: number;
  readonly between: string;
  /** Between units of volume, so never that of a depth of rain or evaporation. */
  readonly ofVolume?: true;
}

/** Factors by which rainfall, evaporation and flow come out wrong when a unit is mistaken. */
export const unitFactors: readonly UnitFactor[] = [
  { factor: 10, between: 'tenths of millimetres (or centimetres) and millimetres' },
  { factor: 25.4, between: 'inches and millimetres' },
  { factor: 35.3147, between: 'cubic feet and cubic metres', ofVolume: true },
  { factor: 86.4, between: 'cubic metres a second and megalitres a day', ofVolume: true },
  { factor: 1000, between: 'millimetres and metres (or litres and cubic metres)' },
  { factor: 3600, between: 'seconds and hours' },
  { factor: 86_400, between: 'seconds and days' },
];

/** Those of rain and evaporation. */
export const depthFactors = unitFactors.filter(({ ofVolume }) => ofVolume === undefined);

export interface UnitDoubt {
  /** Checked total over reference total. */
  readonly ratio: number;
  /** The factor that the ratio, or its inverse, comes near; null when none does. */
  readonly near: UnitFactor | null;
  /** True when the checked series is too large by that factor. */
  readonly tooLarge: boolean;
}

/**
 * Whether a total is off its reference by the factor between two units.
 *
 * Formula: the factor f nearest to S / O or O / S in logarithms, if within the tolerance
 * Inputs: both totals in the unit they claim, over the same days; tolerance as a share, such as 0.2; the factors that come into question, all unless said.
 * Range: no factor is best.
 * Read: nature rarely differs by 25.4; somebody read inches as millimetres.
 * Undefined: a total that is not above zero.
 * Source: definitions of the units; the tolerance is our choice.
 * Example: unitFactor({total: 41, referenceTotal: 1000, toleranceShare: 0.2}) -> {value: {ratio: 0.041, near: {factor: 25.4}, tooLarge: false}}
 */
export function unitFactor(of: {
  readonly total: number;
  readonly referenceTotal: number;
  readonly toleranceShare: number;
  readonly among?: readonly UnitFactor[];
}): Statistic<UnitDoubt> {
  if (!(of.total > 0 && of.referenceTotal > 0))
    return undefinedBecause('totals that are not above zero have no ratio of units');
  const ratio = of.total / of.referenceTotal;
  const distance = ({ factor }: UnitFactor) => Math.abs(Math.abs(Math.log(ratio)) - Math.log(factor));
  const [nearest] = (of.among ?? unitFactors).toSorted((a, b) => distance(a) - distance(b));
  const near = nearest && distance(nearest) <= Math.log(1 + of.toleranceShare) ? nearest : null;
  return defined({ ratio, near, tooLarge: ratio > 1 });
}
