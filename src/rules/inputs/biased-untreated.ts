import type { Held } from '../../facts/profiles/beside-others.ts';
import type { Comparison } from '../../facts/profiles/comparison.ts';
import { isDefined } from '../../hydrology/paired.ts';
import type { Input } from '../../manifest/data.generated.ts';
import { figure } from '../figures.ts';
import { type Draft, type Limits, rule } from '../rule.ts';
import { factorTolerance, unitDoubt } from './unit-doubt.ts';

export const inputsBiasedUntreated = rule({
  id: 'inputs.biased-untreated',
  scope: 'inputs',
  from: 'warn',
  means: null,
  statement:
    'Against its reference the series is biased, has lost the wet and dry years while the season agrees, or breaks in the double-mass curve, and no step of `preparation` speaks of a correction.',
  why: 'A model calibrated on rain that is 20 % short makes up for it with wrong evapotranspiration; a product with the right season and the wrong years passes every look at monthly means.',
  source: {
    basis: 'published',
    citation:
      'Searcy, J. K. & Hardison, C. H. (1960) Double-mass curves. US Geological Survey Water-Supply Paper 1541-B; the limits are our choice',
  },
  clear:
    'Correct the series and say how in `preparation` (step, because, script), or say there why no correction is needed.',
  limits: {
    ...factorTolerance,
    annual_bias_percent: {
      default: 10,
      unit: '%',
      states: 'Largest difference of the totals over the years that both have.',
      looser: 'higher',
    },
    annual_correlation: {
      default: 0.5,
      unit: '1',
      states:
        'Least correlation of annual totals (five years or more), and of monthly totals without their season.',
      looser: 'lower',
    },
    season_correlation: {
      default: 0.8,
      unit: '1',
      states: 'From here on the season counts as agreeing.',
      looser: 'higher',
    },
    double_mass_percent: {
      default: 10,
      unit: '%',
      states: 'Least change of slope that counts as a break.',
      looser: 'higher',
    },
    double_mass_probability: {
      default: 0.05,
      unit: '1',
      states: 'Largest probability (Pettitt) that the break is chance.',
      looser: 'lower',
    },
  },
  check: ({ id, name, field, fragment }, { profiles }, limits) => {
    const { comparisons = [] } = profiles.get(name ?? '') ?? {};
    const steps = (fragment.preparation ?? []).map(({ step = '', because = '' }) => `${step} ${because}`);
    // One gauge of a mean may differ from the reference by its place; it breaks with it only by a fault of its own.
    const isPart = ({ file }: Held) => file !== null && fragment.combine !== 'each';
    const breaks = ({ outcome }: Held) => isDefined(outcome) && massBreak(outcome.value, limits) !== null;
    const allBreak = comparisons.filter(isPart).every(breaks);
    return comparisons.flatMap((held): readonly Draft[] => {
      const { file, reference, outcome } = held;
      const about = { record: id, field: [...field, 'compare_with'] };
      const subject = (fault: string) => (file === null ? fault : `${file} ${fault}`);
      if (isDefined(outcome))
        return faultsOf(outcome.value, fragment.role, limits)
          .filter(({ fault }) => !isPart(held) || (fault === 'break' && !allBreak))
          .filter(({ answer }) => !steps.some((step) => answer.test(step)))
          .map(({ fault, says, found, unit }) => ({
            ...about,
            subject: subject(fault),
            found,
            unit,
            message: `${file ?? 'The series'} ${says(reference)}, and no step of preparation answers it.`,
          }));
      if (isPart(held)) return [];
      return [
        {
          ...about,
          subject: subject('comparison'),
          message: `${file ?? 'The series'} can’t be compared with ${reference}: ${outcome.undefined}.`,
          clear: 'Name a reference that has values of the same kind over the same time.',
        },
      ];
    });
  },
});

/** Words of a step that treats a bias. */
const treatsBias =
  /bias|correct|adjust|\b(?:re)?scal|homogen|undercatch|quantile|double.mass|multipl|factor/i;

interface Fault {
  readonly fault: 'bias' | 'years' | 'break';
  /** What a step of preparation says that answers it. */
  readonly answer: RegExp;
  says(reference: string): string;
  readonly found: number;
  readonly unit: string;
}

/** Fewer years tell neither a lost correlation nor a break from chance (Searcy & Hardison; from memory). */
const fewestYears = 5;

function faultsOf(comparison: Comparison, role: Input['role'], limits: Limits): readonly Fault[] {
  // Another unit is no bias.
  const faults = unitDoubt(comparison, role, limits) === null ? [bias(comparison, limits)] : [];
  return [...faults, wrongYears(comparison, limits), massBreak(comparison, limits)].filter(
    (fault) => fault !== null,
  );
}

function bias({ biasPercent, years }: Comparison, { annual_bias_percent: most = 0 }: Limits): Fault | null {
  if (!isDefined(biasPercent) || Math.abs(biasPercent.value) <= most) return null;
  const { value } = biasPercent;
  return {
    fault: 'bias',
    answer: treatsBias,
    found: Number(value.toPrecision(3)),
    unit: '%',
    says: (reference) =>
      `has ${figure(Math.abs(value))} % ${value < 0 ? 'less' : 'more'} than ${reference} over the days that both have in ${years.length === 1 ? years[0] : `${years.length} years`} (a difference of ${most} % is let pass)`,
  };
}

function wrongYears(
  { annualCorrelation: annual, anomalyCorrelation: anomaly, seasonCorrelation: season, years }: Comparison,
  { annual_correlation: least = 0, season_correlation: agreeing = 0 }: Limits,
): Fault | null {
  if (!isDefined(season) || season.value < agreeing) return null;
  const lost = [
    ...(isDefined(annual) && years.length >= fewestYears && annual.value < least
      ? [`annual totals correlate at ${figure(annual.value)}`]
      : []),
    ...(isDefined(anomaly) && anomaly.value < least
      ? [`monthly ones, once the season is taken out, at ${figure(anomaly.value)}`]
      : []),
  ];
  if (lost.length === 0) return null;
  const [found] = [anomaly, annual].filter(isDefined);
  return {
    fault: 'years',
    answer: treatsBias,
    found: Number((found?.value ?? 0).toPrecision(3)),
    unit: '1',
    says: (reference) =>
      `has the season of ${reference} (correlation ${figure(season.value)}) but not its wet and dry times: ${lost.join('; ')}`,
  };
}

function massBreak({ doubleMass, years }: Comparison, limits: Limits): Fault | null {
  if (!isDefined(doubleMass)) return null;
  const { adjustment, change } = doubleMass.value;
  const { double_mass_percent: most = 0, double_mass_probability: chance = 0 } = limits;
  const percent = 100 * (adjustment - 1);
  const isLong = change.before >= fewestYears && years.length - change.before >= fewestYears;
  if (!isLong || change.p > chance || Math.abs(percent) < most) return null;
  return {
    fault: 'break',
    // A factor over all years mends no break: the step speaks of it, or of the year.
    answer: new RegExp(`homogen|double.mass|\\bbreak|${change.lastBefore}|${change.firstAfter}`, 'i'),
    found: Number(percent.toPrecision(3)),
    unit: '%',
    says: (reference) =>
      `breaks against ${reference}: from ${change.firstAfter} on it has ${figure(Math.abs(percent))} % ${percent < 0 ? 'less' : 'more'} for the same amount than until ${change.lastBefore} (Pettitt p ${change.p.toPrecision(2)})`,
  };
}
