import { computed, type Statistic } from '../paired.ts';
import { klingGuptaOfTheMean } from './kling-gupta-2009.ts';

/**
 * Skill of a Kling-Gupta efficiency over the observed mean, on the scale that NSE has by itself.
 *
 * Formula: (KGE - (1 - sqrt 2)) / sqrt 2
 * Inputs: a Kling-Gupta efficiency, no unit.
 * Range: below 1 without limit; best 1; 0 is as good as the observed mean.
 * Read: an efficiency between -0.41 and 0 still beats the mean; the skill says so by its sign.
 * Undefined: for an efficiency that is no finite number.
 * Source: Knoben, Freer & Woods 2019, Hydrol. Earth Syst. Sci. 23:4323-4331.
 * Example: klingGuptaSkill(0) -> {value: 0.2929}
 */
export function klingGuptaSkill(efficiency: number): Statistic {
  return computed((efficiency - klingGuptaOfTheMean) / Math.SQRT2);
}
