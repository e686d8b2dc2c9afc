import { mean, squaredDeviations, total } from '../arithmetic.ts';
import { studentTails } from '../distribution/student-tails.ts';
import { defined, isDefined, type Statistic, undefinedBecause } from '../paired.ts';
import { type ChangePoint, pettitt } from '../trend/pettitt.ts';

export interface DoubleMass {
  readonly patternTotal: number;
  readonly stationTotal: number;
  /** Where the yearly ratio station over pattern changes, with its p value. */
  readonly change: ChangePoint;
  /** Slopes of the curve before and after: sum of the station over sum of the pattern. */
  readonly slopeBefore: number;
  readonly slopeAfter: number;
  /** What the earlier years of the station are multiplied by to fit the later ones. */
  readonly adjustment: number;
  /** Test of equal mean ratio before and after. */
  readonly difference: Statistic<{ readonly f: number; readonly p: number }>;
}

/**
 * Double-mass curve of a station against a pattern of others: whether their relation broke, where, and by how much.
 *
 * Formula: ratio y / x by year; break by the Pettitt test of the ratios; slope = sum(y) / sum(x) of each part;
 * adjustment = slope after / slope before; F = between-part over within-part variance of the ratios
 * Inputs: years, station and pattern totals (mm), step beside step, whole years, ascending; the pattern the mean of several stations.
 * Range: slopes above 0; best adjustment 1.
 * Read: a break shorter than five years is to be ignored; poor correlation with the pattern can hide one. Since the break was sought, the F test is generous: use it after the Pettitt p.
 * Undefined: fewer than two years, a year in which the pattern has no rain, ratios all equal (a straight line). F: a part of fewer than two years, or ratios equal within both parts.
 * Source: Searcy & Hardison 1960, Double-mass curves, USGS Water-Supply Paper 1541-B; five years from memory.
 * Example: doubleMass({years: [1, 2, 3, 4, 5, 6], pattern: [800, 900, 1000, 800, 900, 1000], station: [810, 880, 1010, 630, 730, 790]}) -> {value: {change: {lastBefore: 3}, slopeBefore: 1, slopeAfter: 0.7963, adjustment: 0.7963}}
 */
export function doubleMass(of: {
  readonly years: ArrayLike<number>;
  readonly pattern: ArrayLike<number>;
  readonly station: ArrayLike<number>;
}): Statistic<DoubleMass> {
  const pattern = Array.from(of.pattern);
  const station = Array.from(of.station);
  if (pattern.some((rain) => !(rain > 0)))
    return undefinedBecause('the pattern has a year without rain, so that the ratio to it has no value');
  const ratios = station.map((rain, index) => rain / (pattern[index] ?? 0));
  const found = pettitt({ times: of.years, values: ratios });
  if (!isDefined(found)) return found;
  const { before } = found.value;
  const slopeBefore = total(station.slice(0, before)) / total(pattern.slice(0, before));
  const slopeAfter = total(station.slice(before)) / total(pattern.slice(before));
  if (slopeBefore === 0) return undefinedBecause('the station has no rain before the break');
  return defined({
    patternTotal: total(pattern),
    stationTotal: total(station),
    change: found.value,
    slopeBefore,
    slopeAfter,
    adjustment: slopeAfter / slopeBefore,
    difference: meansDiffer({ before: ratios.slice(0, before), after: ratios.slice(before) }),
  });
}

function meansDiffer({ before, after }: { before: readonly number[]; after: readonly number[] }) {
  if (before.length < 2 || after.length < 2)
    return undefinedBecause('one part has a single year, which has no spread');
  const degrees = before.length + after.length - 2;
  const within = squaredDeviations(before) + squaredDeviations(after);
  if (within === 0) return undefinedBecause('the ratios do not vary within the parts');
  const gap = mean(before) - mean(after);
  const between = (gap ** 2 * before.length * after.length) / (before.length + after.length);
  const f = (between * degrees) / within;
  return defined({ f, p: studentTails({ t: Math.sqrt(f), degrees }) });
}
