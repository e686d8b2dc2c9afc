import { computedTogether, type Statistic } from '../paired.ts';

/**
 * A saturated conductivity of the handbooks in the units of models.
 *
 * Formula: mm/h = 10 / 24 cm/d; m/s = cm/d / 8 640 000
 * Inputs: conductivity in cm/d.
 * Range: 0 upwards.
 * Read: handbooks print cm/d or cm/h, models take mm/h or m/s; a factor of 24 is soon lost.
 * Undefined: figures that are no finite number.
 * Source: definitions of the units.
 * Example: conductivityUnits(712.8) -> {value: {mmPerHour: 297, metresPerSecond: 0.0000825}}
 */
export function conductivityUnits(
  cmPerDay: number,
): Statistic<{ readonly mmPerHour: number; readonly metresPerSecond: number }> {
  return computedTogether({ mmPerHour: (cmPerDay * 10) / 24, metresPerSecond: cmPerDay / 8_640_000 });
}
