import type { BandOver } from '../../facts/bands/band-over.ts';
import type { BandFigures } from '../../facts/bands.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../figures.ts';
import { type Draft, type Limits, rule } from '../rule.ts';

/** What is carried by the water varies more than the water, and bands of it are rightly wider and hold less. */
const carried: ReadonlySet<string> = new Set(['sediment', 'nitrogen', 'phosphorus']);

export const uncertaintyWeak = rule({
  id: 'uncertainty.weak',
  scope: 'uncertainty',
  from: 'warn',
  means: null,
  statement:
    'A band holds too few observations (coverage below 0.7), is too wide beside their spread (relative width above 1.5), is judged on calibration only, or leaves out its own simulation. Bands of sediment and nutrients are held to half as much.',
  why: 'Coverage and width mean something only together: an endless band covers everything, a thin one is precise and wrong. And a band that was fitted to calibration says little of other years.',
  source: {
    basis: 'published',
    citation:
      'Abbaspour, K. C. et al. (2004) Vadose Zone J. 3:1340-1352; Abbaspour, K. C. et al. (2007) J. Hydrol. 333:413-430 (advice of both, from memory); looser limits for sediment and nutrients are our own choice',
  },
  clear:
    'Treat the sources of uncertainty that the band leaves out, or say in the report what the band can’t hold.',
  limits: {
    coverage: { default: 0.7, unit: '1', states: 'least coverage of flow', looser: 'lower' },
    relative_width: { default: 1.5, unit: '1', states: 'largest relative width of flow', looser: 'higher' },
    coverage_carried: {
      default: 0.35,
      unit: '1',
      states: 'least coverage of sediment and nutrients',
      looser: 'lower',
    },
    relative_width_carried: {
      default: 3,
      unit: '1',
      states: 'largest relative width of sediment and nutrients',
      looser: 'higher',
    },
    simulation_held: {
      default: 0.5,
      unit: '1',
      states: 'least share of its own simulation that a band holds',
      looser: 'lower',
    },
  },
  check: ({ id }, { bands }, limits) =>
    bands.flatMap((band) =>
      doubtsAbout(band, limits).map((doubt) => ({ record: id, field: band.field, ...doubt })),
    ),
});

type Doubt = Omit<Draft, 'record' | 'field'>;

function doubtsAbout(band: BandFigures, limits: Limits): readonly Doubt[] {
  const { target, variable, over, recomputed } = band;
  if (!isDefined(recomputed)) return [];
  const { stated, validation, holdsSimulated } = recomputed.value;
  const suffix = carried.has(variable) ? '_carried' : '';
  const doubts: Doubt[] = [];
  const judge = (what: string, { coverage, relativeWidth }: BandOver) => {
    if (isDefined(coverage) && coverage.value < (limits[`coverage${suffix}`] ?? 0))
      doubts.push({
        subject: `${target} coverage ${what}`,
        found: Number(coverage.value.toPrecision(4)),
        unit: '1',
        message: `The band of ${target} holds ${figure(100 * coverage.value)} % of the observations of ${what}, ${meant(band)}.`,
      });
    if (isDefined(relativeWidth) && relativeWidth.value > (limits[`relative_width${suffix}`] ?? 0))
      doubts.push({
        subject: `${target} width ${what}`,
        found: Number(relativeWidth.value.toPrecision(4)),
        unit: '1',
        message: `The band of ${target} is ${figure(relativeWidth.value)} times as wide as the observations of ${what} spread (standard deviation): it says little.`,
      });
  };
  if (isDefined(stated)) judge(over, stated.value);
  if (over === 'calibration' && isDefined(validation)) {
    const { coverage, steps } = validation.value;
    doubts.push({
      subject: `${target} window`,
      message: `The band of ${target} is judged over calibration, which it was fitted to; ${steps > 0 && isDefined(coverage) ? `of validation it holds ${figure(100 * coverage.value)} %` : 'it has no values over validation'}.`,
      clear: 'Make the band over validation too, and judge it there (`over: validation`).',
    });
  }
  if (isDefined(holdsSimulated) && holdsSimulated.value < (limits.simulation_held ?? 0))
    doubts.push({
      subject: `${target} simulation`,
      found: Number(holdsSimulated.value.toPrecision(4)),
      unit: '1',
      message: `The band of ${target} holds ${figure(100 * holdsSimulated.value)} % of the simulation that it is the band of: it may belong to another run or another variable.`,
    });
  return doubts;
}

function meant({ fragment: { level } }: BandFigures): string {
  return level === undefined ? 'and has no level' : `where it is meant to hold ${figure(100 * level)} %`;
}
