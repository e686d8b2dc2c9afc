import type { Facts } from '../../facts/facts.ts';
import type { InputProfile } from '../../facts/profiles.ts';
import { annualPlausibility } from '../../hydrology/forcing/annual-plausibility.ts';
import type { UnitFactor } from '../../hydrology/forcing/unit-factor.ts';
import { isDefined } from '../../hydrology/paired.ts';
import type { Input } from '../../manifest/data.generated.ts';
import type { RecordNode } from '../../records/record.ts';
import { conversion } from '../../series/units/conversion.ts';
import { figure } from '../figures.ts';
import { type Draft, type Limits, rule } from '../rule.ts';
import { togetherOrAlone } from './together-or-alone.ts';
import { factorTolerance, unitDoubt } from './unit-doubt.ts';

export const inputsUnitDoubtful = rule({
  id: 'inputs.unit-doubtful',
  scope: 'inputs',
  from: 'warn',
  means: null,
  statement:
    'Totals are off their reference, or off what such a series can be, as if by another unit (10, 25.4, 35.3, 86.4, 1 000, 3 600 times).',
  why: 'Inches read as millimetres or megalitres a day as cubic metres a second pass every check of form; the balance then closes on water that was never there.',
  source: {
    basis: 'practice',
    citation:
      'Factors by the definitions of the units; the ranges of annual depths and the tolerance are our choice; extremes of temperature from the WMO archive (from memory)',
  },
  clear: 'Look at the source’s unit and correct `series.unit`, or say in `note` why the totals are right.',
  limits: {
    ...factorTolerance,
    runoff_over_rain: {
      default: 3,
      unit: '1',
      states: 'Flow over the catchment above so many times the rain of the study is doubted.',
      looser: 'higher',
    },
    rain_over_runoff: {
      default: 100,
      unit: '1',
      states: 'Rain above so many times the flow over the catchment makes the flow doubtful.',
      looser: 'higher',
    },
  },
  check: ({ id, name, field, fragment }, facts, limits) => {
    const profile = facts.profiles.get(name ?? '');
    if (profile === undefined) return [];
    const unit = fragment.series?.unit;
    const about = {
      record: id,
      field: [...field, 'series', 'unit'],
      ...(unit === undefined ? {} : { stated: unit }),
    };
    const offReference = againstReference(profile, fragment.role, limits);
    const doubts = offReference.length > 0 ? offReference : alone(profile, fragment, facts, limits);
    return doubts.map((doubt): Draft => ({ ...about, ...doubt }));
  },
});

type Doubt = Pick<Draft, 'message' | 'subject' | 'found'>;

function againstReference(
  { comparisons }: InputProfile,
  role: Input['role'],
  limits: Limits,
): readonly Doubt[] {
  return togetherOrAlone(comparisons, ({ file, reference, outcome }) => {
    const doubt = isDefined(outcome) ? unitDoubt(outcome.value, role, limits) : null;
    if (doubt === null) return [];
    const times = figure(doubt.tooLarge ? doubt.ratio : 1 / doubt.ratio);
    const says = doubt.tooLarge
      ? `${file ?? 'The series'} holds ${times} times what ${reference} holds`
      : `${reference} holds ${times} times what ${file ?? 'the series'} holds`;
    return [
      {
        ...(file === null ? {} : { subject: file }),
        message: `${says} over the same time; ${doubt.near.factor} lies between ${doubt.near.between}.`,
      },
    ];
  });
}

function alone(
  profile: InputProfile,
  { role, series }: Input,
  facts: Facts,
  limits: Limits,
): readonly Doubt[] {
  if (role === 'temperature') return beyondAir(profile, series?.unit ?? '');
  const { annualMm } = profile;
  if (annualMm === null) return [];
  if (role === 'streamflow') return besideRain(annualMm, series?.unit ?? '', facts, limits);
  if (role !== 'precipitation' && role !== 'evapotranspiration') return [];
  const outcome = annualPlausibility({ role, annualMm });
  if (!isDefined(outcome) || outcome.value.plausible) return [];
  const what = role === 'precipitation' ? 'of rain' : 'of evapotranspiration';
  return [
    {
      found: Number(annualMm.toPrecision(3)),
      message: `In its unit the series gives ${figure(annualMm)} mm ${what} in a mean year, which is hardly anywhere so${perhaps(outcome.value.factors)}.`,
    },
  ];
}

/** Units in which flow is given, each other in use somewhere. */
const flowUnits = ['m3/s', 'L/s', 'ft3/s', 'ML/d', 'm3/d'];

/** Shares of the rain that ordinary catchments let run off. */
const ordinary = { lowest: 0.02, highest: 1.2 };

/** Runoff against the rain of the study: neither far above it nor a hundredth of it. */
function besideRain(
  annualMm: number,
  unit: string,
  { records, profiles }: Facts,
  limits: Limits,
): readonly Doubt[] {
  const rains = [...profiles].flatMap(([name, profile]) => {
    const record = records.nodes.get(`inputs.${name}`) as RecordNode<'inputs'> | undefined;
    return record?.fragment.role === 'precipitation' && profile.annualMm !== null ? [profile.annualMm] : [];
  });
  const { runoff_over_rain: most = 0, rain_over_runoff: least = 0 } = limits;
  const rainMm = Math.max(...rains);
  const isUsual = rains.some((rain) => annualMm <= most * rain && annualMm * least >= rain);
  if (rains.length === 0 || annualMm <= 0 || isUsual) return [];
  const read = flowUnits.flatMap((other) => {
    const converted = conversion({ from: other, to: unit });
    const depth = isDefined(converted) ? annualMm * converted.value.factor : 0;
    const fits = depth >= ordinary.lowest * rainMm && depth <= ordinary.highest * rainMm;
    return fits ? [`${figure(depth)} mm in ${other}`] : [];
  });
  return [
    {
      found: Number(annualMm.toPrecision(3)),
      message: `Over the catchment the flow makes ${figure(annualMm)} mm in a mean year, beside ${figure(rainMm)} mm of rain${read.length === 0 ? '' : `; it would make ${read.join(', ')}`}.`,
    },
  ];
}

/** The coldest and the hottest air measured: Vostok 1983 and Furnace Creek 1913 (WMO archive of extremes, from memory). */
const airDegC = { lowest: -89.2, highest: 56.7 };

function beyondAir({ files }: InputProfile, unit: string): readonly Doubt[] {
  const toDegC = conversion({ from: unit, to: 'degC' });
  if (!isDefined(toDegC)) return [];
  const { factor, offset } = toDegC.value;
  for (const { path, columns } of files) {
    for (const { lowest, highest, suspectedCodes } of columns) {
      const beyond = [highest, lowest].find(
        (one) =>
          one !== null &&
          !suspectedCodes.some(({ value }) => value === one.value) &&
          (one.value * factor + offset > airDegC.highest || one.value * factor + offset < airDegC.lowest),
      );
      if (!beyond) continue;
      return [
        {
          found: beyond.value,
          message: `${path} has ${beyond.value} ${unit} on ${beyond.time} (line ${beyond.line}); no air was ever measured so ${beyond.value * factor + offset > airDegC.highest ? 'hot' : 'cold'}. Kelvin, degrees Fahrenheit or tenths of a degree may be meant.`,
        },
      ];
    }
  }
  return [];
}

function perhaps(factors: readonly UnitFactor[]): string {
  const [first, ...more] = factors;
  if (first === undefined) return '';
  const between = more.length === 0 ? first.between : `${first.between}, or another pair of units`;
  return `; a factor of ${first.factor} lies between ${between}`;
}
