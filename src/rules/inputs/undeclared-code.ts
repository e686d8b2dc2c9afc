import type { Input } from '../../manifest/data.generated.ts';
import type { SeriesProblem } from '../../series/table.ts';

/** Amounts of water and of what it carries, which can't be below zero. */
const amounts: readonly Input['role'][] = [
  'precipitation',
  'evapotranspiration',
  'streamflow',
  'water_quality',
];

export function isAmount(role: Input['role']): boolean {
  return amounts.includes(role);
}

/** The number that reading refused because no series of a catchment holds it, such as -9999; null for other problems. */
export function undeclaredCode({ expected, found }: SeriesProblem): string | null {
  return expected.startsWith('a plausible number') ? found.replaceAll('"', '') : null;
}
