import type { Facts } from '../../facts/facts.ts';
import { nodesIn } from '../../facts/nodes-in.ts';
import { type RainYears, rainOfRun } from '../../facts/rain-years.ts';
import { runOf, type StatedWindow, type WindowSet, windowSets } from '../../facts/windows.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { type Wetness, wetnessClasses } from '../../hydrology/windows/wetness-classes.ts';
import type { RecordNode } from '../../records/record.ts';
import { parseDate } from '../../series/calendar.ts';
import { calendarYears, daysOfYear, parseYearBegins } from '../../series/hydrological-year.ts';
import { few, figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';

const classes: readonly Wetness[] = ['wet', 'average', 'dry'];

export const periodsOneSided = rule({
  id: 'periods.one-sided',
  scope: 'manifest',
  from: 'warn',
  means: null,
  statement:
    'The calibration lacks a wet, an average or a dry year of the long rainfall record, so that validation may hold wetness that it never saw. A differential split-sample test is one-sided on purpose.',
  why: 'Parameters fitted in wet years alone carry the wet years’ flow paths into dry ones, and the reverse; transfers from wet to dry fail most.',
  source: {
    basis: 'published',
    citation:
      'Gan, T. Y. et al. (1997), as cited in Moriasi, D. N. et al. (2007) Trans. ASABE 50(3):885-900, p. 892; Klemeš, V. (1986) Hydrological Sciences Journal 31(1):13-24. Terciles of the record as dry, average and wet: climatological practice (from memory)',
  },
  clear:
    'Move the windows so that the calibration has years of each class; or say in the periods’ note why the record allows no other.',
  check: (_, facts) => {
    const rain = longRecord(facts);
    if (rain === null) return [];
    return windowSets(facts.records).flatMap((set) => {
      const [first] = ofKind(set, 'calibration');
      const inherited = set.record !== 'periods' && first?.field[0] === 'periods';
      return first === undefined || inherited || isDifferential(set, facts)
        ? []
        : judge(set, first, rain, facts);
    });
  },
});

interface LongRecord extends RainYears {
  readonly input: string;
}

/** The rain that evaluated runs take; of several inputs the one with the most complete years. Null where none is known. */
function longRecord({ records, rainYears }: Facts): LongRecord | null {
  const taken = new Set(
    nodesIn(records.nodes, 'evaluation').flatMap((target) =>
      rainOfRun(runOf(target, records.nodes), records),
    ),
  );
  const known = [...taken].flatMap((input) => {
    const years = rainYears.get(input);
    return years !== undefined && isDefined(years) ? [{ input, ...years.value }] : [];
  });
  return known.reduce<LongRecord | null>(
    (longest, one) => (longest === null || one.years.length > longest.years.length ? one : longest),
    null,
  );
}

function judge(set: WindowSet, first: StatedWindow, rain: LongRecord, facts: Facts): readonly Draft[] {
  const about = { record: set.record, field: first.field };
  const inWindow = (kind: StatedWindow['kind']) => completeYearsIn(ofKind(set, kind), rain.years, facts);
  const [calibration, validation] = [inWindow('calibration'), inWindow('validation')];
  const classed = wetnessClasses({ years: rain.years, totals: rain.totalsMm });
  const reason = !isDefined(classed)
    ? classed.undefined
    : calibration.size === rain.years.length
      ? 'the rainfall record holds no complete year outside the calibration'
      : null;
  if (!isDefined(classed) || reason !== null)
    return [
      {
        ...about,
        subject: 'untold',
        message: `Whether the calibration saw wet, average and dry years can’t be told from inputs.${rain.input}, which has ${rain.years.length} complete hydrological years: ${reason}.`,
        detail: yearsLeftOut(rain),
        clear: 'Use a longer record of rain, or fill its gaps and say how.',
      },
    ];
  const yearsOf = (years: ReadonlySet<number>, wetness: Wetness) =>
    classed.value.years.filter((one) => years.has(one.year) && one.wetness === wetness);
  const lacking = classes.filter((wetness) => yearsOf(calibration, wetness).length === 0);
  if (lacking.length === 0) return [];
  const unseen = lacking.flatMap((wetness) =>
    yearsOf(validation, wetness).map(({ year }) => `${year} (${wetness})`),
  );
  const { lowerTercile, upperTercile } = classed.value;
  const shown = (kind: string, years: ReadonlySet<number>) =>
    `${kind}: ${
      classed.value.years
        .filter(({ year }) => years.has(year))
        .map(({ year, wetness, total }) => `${year} ${wetness} ${figure(total)} mm`)
        .join(', ') || 'no complete year'
    }`;
  return [
    {
      ...about,
      subject: lacking.join(' '),
      message: `The calibration has no ${lacking.join(' and no ')} year${unseen.length === 0 ? '' : `; the validation has ${unseen.join(', ')}, which it never saw`}.`,
      detail: [
        `by inputs.${rain.input}: dry below ${figure(lowerTercile)} mm, wet above ${figure(upperTercile)} mm, of ${rain.years.length} complete hydrological years`,
        shown('calibration', calibration),
        shown('validation', validation),
        ...yearsLeftOut(rain),
      ],
    },
  ];
}

const namedAtMost = 6;

/** The years of the record that count for nothing because of what is missing in them. */
function yearsLeftOut({ leftOut }: LongRecord): readonly string[] {
  if (leftOut.length === 0) return [];
  const named = leftOut.map(({ year, missing, steps }) => `${year} (${missing} of ${steps} steps missing)`);
  return [`left out, since a total needs every step: ${few(named, namedAtMost)}`];
}

function ofKind({ windows }: WindowSet, kind: StatedWindow['kind']): readonly StatedWindow[] {
  return windows.filter((window) => window.kind === kind);
}

/** Years of the record that lie wholly inside one of the windows. */
function completeYearsIn(
  windows: readonly StatedWindow[],
  years: readonly number[],
  { manifest }: Facts,
): ReadonlySet<number> {
  const begins = parseYearBegins(manifest.data.periods?.year_begins ?? '') ?? calendarYears;
  const spans = windows.map(({ period }) => ({
    first: parseDate(period.first) ?? 0,
    last: parseDate(period.last) ?? 0,
  }));
  return new Set(
    years.filter((year) => {
      const { firstDay, lastDay } = daysOfYear(year, begins);
      return spans.some(({ first, last }) => first <= firstDay && lastDay <= last);
    }),
  );
}

function isDifferential({ record }: WindowSet, { records }: Facts): boolean {
  const node = records.nodes.get(record);
  if (node?.area !== 'evaluation') return false;
  const { split_test } = (node as RecordNode<'evaluation'>).fragment;
  return split_test === 'differential' || split_test === 'differential_proxy_basin';
}
