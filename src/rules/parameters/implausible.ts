import type { OwnTable } from '../../facts/parameters/own-tables.ts';
import type { StatedParameter } from '../../facts/parameters/stated.ts';
import { defined, isDefined, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import {
  type HandbookRange,
  type HandbookTableName,
  handbookClasses,
  handbookRange,
  handbookTables,
} from '../../hydrology/parameters/handbook-range.ts';
import type { Handbook } from '../../manifest/data.generated.ts';
import { nearestName } from '../../manifest/nearest.ts';
import { conversion } from '../../series/units/conversion.ts';
import { few, figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { handbookClassOf } from './handbook-class.ts';
import { placeOf } from './place.ts';

/** What no channel, soil or cover has: Manning n above 1, curve numbers under the lowest that any printing has (NEH-4: 25) or above 100. */
const impossible: Readonly<Record<HandbookTableName, (value: number) => boolean>> = {
  'manning-n': (value) => value <= 0 || value > 1,
  'curve-number': (value) => value < 25 || value > 100,
  'saturated-conductivity': (value) => value <= 0,
};

export const parametersImplausible = rule({
  id: 'parameters.implausible',
  scope: 'parameters',
  from: 'warn',
  means: null,
  statement:
    'A value lies outside the handbook class that it names (Manning n, curve number, saturated conductivity, or a table of the project’s own), or the class is unknown. A value that nothing can have blocks.',
  why: 'A parameter that keeps a physical meaning can be judged, regionalised and defended; one that left it only fits this record.',
  source: {
    basis: 'published',
    citation:
      'Chow, V. T. (1959) Open-Channel Hydraulics, Table 5-6; USDA-NRCS (1986) TR-55, Table 2-2; Rawls, W. J. et al. (1982) Trans. ASAE 25(5):1316-1320, Table 2; Carsel, R. F. & Parrish, R. S. (1988) Water Resour. Res. 24(5):755-769',
  },
  clear:
    'Check value, unit and class. If the value stands for more than the class does (a whole cell, a daily water balance), say so in its note.',
  check: (_, { parameters }) =>
    parameters.values.flatMap((of) => {
      const { handbook, value } = of.parameter;
      if (handbook === undefined || value === undefined) return [];
      const draft = judge(of, handbook, value, parameters.ownTables);
      return draft === null ? [] : [{ ...placeOf(of, 'value'), ...draft }];
    }),
});

type Judged = Omit<Draft, 'record' | 'field'>;

function judge(
  { label, parameter, written }: StatedParameter,
  handbook: Handbook,
  value: number,
  ownTables: ReadonlyMap<string, OwnTable>,
): Judged | null {
  const range = rangeOf(handbook, ownTables);
  if (!isDefined(range))
    return {
      subject: `${label} class`,
      message: `${label} can’t be held against its handbook: ${range.undefined}.`,
      clear: 'Name a table and a class that it has, as the table words it.',
    };
  const { low, high, unit, source } = range.value;
  const toUnit =
    unit === null ? defined({ factor: 1, offset: 0 }) : conversion({ from: parameter.unit ?? '1', to: unit });
  if (!isDefined(toUnit))
    return {
      subject: `${label} class`,
      message: `${label} can’t be held against its handbook: ${toUnit.undefined}.`,
    };
  const number = value * toUnit.value.factor + toUnit.value.offset;
  const isNothing = isPublished(handbook.table) && impossible[handbook.table](number);
  if (!isNothing && number >= low && (high === null || number <= high)) return null;
  const inUnit = unit === null || unit === '1' ? '' : ` ${unit}`;
  const within = `${figure(low)} to ${high === null ? 'no stated end' : figure(high)}${inUnit}`;
  const isInverse =
    handbook.table === 'manning-n' && value > 1 && 1 / value >= low && 1 / value <= (high ?? 1);
  return {
    stated: within,
    found: value,
    ...(parameter.unit === undefined ? {} : { unit: parameter.unit }),
    ...(isNothing ? { from: 'calibration' as const } : {}),
    message: `${label} is ${written ?? value}; ${handbook.class} has ${within}.${isNothing ? ` ${isInverse ? 'It looks like Strickler’s coefficient, 1/n.' : 'Nothing has such a value.'}` : ''}`,
    detail: [source],
  };
}

function isPublished(table: string): table is HandbookTableName {
  return (handbookTables as readonly string[]).includes(table);
}

function rangeOf(handbook: Handbook, ownTables: ReadonlyMap<string, OwnTable>): Statistic<HandbookRange> {
  const { table, class: name = '', soil_group } = handbook;
  if (isPublished(table)) {
    const range = handbookRange(table, handbookClassOf(handbook));
    return isDefined(range) ? range : unknownClass(range.undefined, name, handbookClasses(table));
  }
  const own = ownTables.get(table);
  if (own === undefined)
    return undefinedBecause(
      `there is no table ${table}; known are ${[...handbookTables, ...ownTables.keys()].join(', ')}`,
    );
  if (own.problem !== null) return undefinedBecause(`${table} can’t be read: ${own.problem}`);
  const row = own.rows.find(
    (one) =>
      one.class.toLowerCase() === name.trim().toLowerCase() &&
      (one.soilGroup === null || one.soilGroup === soil_group),
  );
  return row === undefined
    ? unknownClass(
        `${table} has no class "${name}"${soil_group === undefined ? '' : ` for soil group ${soil_group}`}`,
        name,
        own.rows.map((one) => one.class),
      )
    : defined({ low: row.low, high: row.high, unit: own.unit, source: own.source });
}

/** Names the class that is meant, or some that share a word with it. */
function unknownClass(
  reason: string,
  name: string,
  classes: readonly string[],
): { readonly undefined: string } {
  const nearest = nearestName(name, classes);
  if (nearest !== undefined && nearest !== name)
    return undefinedBecause(`${reason}; did you mean "${nearest}"?`);
  const words = name.toLowerCase().match(/[a-z]{4,}/g) ?? [];
  const alike = classes.filter((one) => words.some((word) => one.toLowerCase().includes(word)));
  const shown = (alike.length > 0 ? alike : classes).map((one) => `"${one}"`);
  return undefinedBecause(`${reason}; it has ${few(shown, 5)}`);
}
