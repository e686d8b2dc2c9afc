import { isDefined } from '../hydrology/paired.ts';
import type { ManifestData } from '../manifest/data.generated.ts';
import { calendarYears, parseYearBegins, type YearBegins } from '../series/hydrological-year.ts';
import { conversion } from '../series/units/conversion.ts';

/** The catchment's area in km2; null where none is stated, or in no unit of area. */
export function areaKm2Of({ catchment }: ManifestData): number | null {
  const { area } = catchment ?? {};
  if (area === undefined) return null;
  const toKm2 = conversion({ from: area.unit, to: 'km2' });
  return isDefined(toKm2) ? area.value * toKm2.value.factor : null;
}

/** The day on which the study's years begin; 1 January unless stated. */
export function yearBeginsOf({ periods }: ManifestData): YearBegins {
  return parseYearBegins(periods?.year_begins ?? '') ?? calendarYears;
}
