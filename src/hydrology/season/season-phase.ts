import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * When in the year the first harmonic of a climatology peaks.
 *
 * Formula: atan2(sum x_m sin(2 pi m / 12), sum x_m cos(2 pi m / 12)) 12 / (2 pi), wrapped to [0, 12)
 * Inputs: twelve monthly means, January first, any unit; the result is in months.
 * Range: 0 (middle of January) to 12.
 * Read: differences between two phases resolve parts of a month.
 * Undefined: other than twelve values; a climatology that is flat, or has two seasons (second harmonic above the first).
 * Source: Fourier analysis; no published limit for hydrology is known.
 * Example: seasonPhase([1, 0.866, 0.5, 0, -0.5, -0.866, -1, -0.866, -0.5, 0, 0.5, 0.866]) -> {value: 0}
 */
export function seasonPhase(months: ArrayLike<number>): Statistic {
  if (months.length !== 12) return undefinedBecause('a climatology has twelve months');
  const first = harmonic(months, 1);
  const second = harmonic(months, 2);
  const largest = Math.max(...Array.from(months, Math.abs));
  if (first.amplitude <= 1e-12 * largest) return undefinedBecause('the climatology has no yearly wave');
  if (second.amplitude > first.amplitude)
    return undefinedBecause('the climatology has two seasons a year, so one phase does not describe it');
  const phase = (Math.atan2(first.sine, first.cosine) * 12) / (2 * Math.PI);
  return computed(((phase % 12) + 12) % 12);
}

function harmonic(months: ArrayLike<number>, order: number) {
  let sine = 0;
  let cosine = 0;
  for (let month = 0; month < 12; month++) {
    const angle = (2 * Math.PI * order * month) / 12;
    sine += (months[month] ?? 0) * Math.sin(angle);
    cosine += (months[month] ?? 0) * Math.cos(angle);
  }
  return { sine, cosine, amplitude: Math.hypot(sine, cosine) };
}
