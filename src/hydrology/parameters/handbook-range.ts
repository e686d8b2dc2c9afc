import { defined, isDefined, type Statistic, undefinedBecause } from '../paired.ts';
import {
  antecedentRunoff,
  curveNumberSource,
  curveNumbers,
  type SoilGroup,
  soilGroups,
} from '../tables/curve-numbers.ts';
import { manningN, manningSource } from '../tables/manning-n.ts';
import { conductivitySource, saturatedConductivity } from '../tables/saturated-conductivity.ts';
import { compositeCurveNumber } from './composite-curve-number.ts';
import { conductivityUnits } from './conductivity-units.ts';

/** What a class of a handbook usually has. */
export interface HandbookRange {
  readonly low: number;
  /** Null where the handbook leaves it open. */
  readonly high: number | null;
  /** Null for a coefficient whose unit nobody converts. */
  readonly unit: string | null;
  readonly source: string;
}

export const handbookTables = ['manning-n', 'curve-number', 'saturated-conductivity'] as const;
export type HandbookTableName = (typeof handbookTables)[number];

/** A class of a handbook, as a record names it. */
export interface HandbookClass {
  readonly class: string;
  readonly soilGroup?: SoilGroup | undefined;
  /** 0 to 1, sealed within the class; for a curve number. */
  readonly sealedShare?: number | undefined;
}

/** Effective values of a model's cell lie this far from the means of a texture (our choice). */
const conductivityFactor = 100;

/**
 * The range that a handbook gives for a class.
 *
 * Formula: Manning n: minimum to maximum of the row. Curve number: the row's value for the soil group (all four where none is stated),
 * with the sealed share by the composite formula, from dry (ARC I) to wet (ARC III) before the storm, no lower than 30. Saturated
 * conductivity: the lower of both class means / 100 to the higher x 100, mm/h.
 * Inputs: the table's name and the class as the table words it; capitals do not count.
 * Range: low to high, in the unit that is given.
 * Read: a range of judgement: a calibrated value may leave it for a reason.
 * Undefined: a class that the table does not have.
 * Source: Chow 1959, Table 5-6; TR-55 1986, Table 2-2 and NEH-4 1985, Table 10.1; Rawls et al. 1982, Table 2; Carsel & Parrish 1988.
 * Example: handbookRange('manning-n', {class: 'lined or built-up, concrete, trowel finish'}) -> {value: {low: 0.011, high: 0.015}}
 */
export function handbookRange(table: HandbookTableName, of: HandbookClass): Statistic<HandbookRange> {
  const named = <Row extends { readonly class: string }>(rows: readonly Row[]) =>
    rows.find((row) => row.class.toLowerCase() === of.class.trim().toLowerCase());
  const unknown = undefinedBecause(`the table has no class "${of.class}"`);
  if (table === 'manning-n') {
    const row = named(manningN);
    if (row === undefined) return unknown;
    return defined({ low: row.lowest, high: row.highest, unit: null, source: manningSource });
  }
  if (table === 'saturated-conductivity') {
    const row = named(saturatedConductivity);
    if (row === undefined) return unknown;
    const carsel = conductivityUnits(row.carselCmPerDay);
    const means = [row.rawlsMmPerHour, isDefined(carsel) ? carsel.value.mmPerHour : null].filter(
      (mean) => mean !== null,
    );
    return defined({
      low: Math.min(...means) / conductivityFactor,
      high: Math.max(...means) * conductivityFactor,
      unit: 'mm/h',
      source: conductivitySource,
    });
  }
  const row = named(curveNumbers);
  if (row === undefined) return unknown;
  const groups = of.soilGroup === undefined ? soilGroups : [of.soilGroup];
  const values = groups.map((group) => {
    const composite = compositeCurveNumber({
      pervious: row.numbers[group],
      sealedPercent: 100 * (of.sealedShare ?? 0),
    });
    return isDefined(composite) ? composite.value : row.numbers[group];
  });
  return defined({
    low: Math.max(30, whenBefore('dry', Math.min(...values))),
    high: whenBefore('wet', Math.max(...values)),
    unit: '1',
    source: curveNumberSource,
  });
}

/** A curve number of average antecedent runoff as it is when all was dry or wet before, between the printed rows on a straight line. */
function whenBefore(state: 'dry' | 'wet', curveNumber: number): number {
  const place = state === 'dry' ? 1 : 2;
  const above = antecedentRunoff.find(([average]) => average >= curveNumber) ?? [100, 100, 100];
  const below = antecedentRunoff.findLast(([average]) => average <= curveNumber) ?? above;
  if (above[0] === below[0]) return above[place];
  return below[place] + ((curveNumber - below[0]) / (above[0] - below[0])) * (above[place] - below[place]);
}

/**
 * The classes of a table.
 *
 * Formula: none
 * Inputs: the table's name.
 * Range: names, in the order of the table.
 * Read: as records name them.
 * Undefined: never.
 * Source: the tables' own.
 * Example: handbookClasses('saturated-conductivity').slice(0, 2) -> ['sand', 'loamy sand']
 */
export function handbookClasses(table: HandbookTableName): readonly string[] {
  const rows = {
    'manning-n': manningN,
    'curve-number': curveNumbers,
    'saturated-conductivity': saturatedConductivity,
  }[table];
  return rows.map((row) => row.class);
}
