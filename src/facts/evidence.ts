import { isDefined } from '../hydrology/paired.ts';
import { parsePeriod } from '../manifest/period.ts';
import type { Evidence } from '../records/make-seals.ts';
import type { RecordNode } from '../records/record.ts';
import type { Standing } from '../records/seal.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { parseDate } from '../series/calendar.ts';
import { balancesOf, balancesVersion, type VolumeFigures } from './balances.ts';
import { bandsOf, bandsVersion } from './bands.ts';
import { conditionVersion } from './conditions/figures.ts';
import { statedConditions, statedDrivers } from './conditions/stated.ts';
import { scenariosOf } from './conditions.ts';
import type { Facts } from './facts.ts';
import { missingShares } from './missing-shares.ts';
import { fileProfileVersion } from './profiles/file-profile.ts';
import { type InputProfile, profilesOf } from './profiles.ts';
import { scoredWindows } from './scores/stated.ts';
import { scoresVersion } from './scores/subject.ts';
import { scoresOf, type TargetFigures } from './scores.ts';
import { graphVersion, reviewDigest } from './seen-series.ts';
import { allAgree, type ComparedFigure } from './stated-figure.ts';

/** What a seal's evidence is made of. */
type Computed = Pick<
  Facts,
  'records' | 'standings' | 'manifest' | 'scores' | 'profiles' | 'balances' | 'bands' | 'scenarios'
>;

/**
 * By record: what a seal made now should keep of what was computed. A record is `recomputed` where it states figures, and each
 * of them is what its files give.
 */
export async function evidenceFor(
  study: Pick<Computed, 'records' | 'standings' | 'manifest'>,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, Evidence>> {
  const { records } = study;
  return evidenceIn({
    ...study,
    scores: await scoresOf(records, snapshot),
    profiles: await profilesOf(records, snapshot),
    balances: await balancesOf(records, snapshot),
    bands: await bandsOf(records, snapshot),
    scenarios: await scenariosOf(records, snapshot),
  });
}

function evidenceIn(computed: Computed): ReadonlyMap<string, Evidence> {
  const { records, standings, scores, profiles, manifest } = computed;
  const evidence = new Map<string, Evidence>();
  for (const [id, record] of records.nodes) {
    if (record.area === 'evaluation')
      evidence.set(
        id,
        ofTarget(record as RecordNode<'evaluation'>, scores.get(record.name ?? ''), standings.get(id)),
      );
    if (record.area === 'balance') evidence.set(id, ofBalance(computed.balances.get(record.name ?? '')));
    if (record.area === 'uncertainty') evidence.set(id, ofBands(computed.bands));
    if (record.area === 'scenarios')
      evidence.set(id, ofScenario(record as RecordNode<'scenarios'>, computed));
    const profile = record.area === 'inputs' ? profiles.get(record.name ?? '') : undefined;
    if (profile !== undefined) evidence.set(id, ofInput(record as RecordNode<'inputs'>, profile, manifest));
  }
  return evidence;
}

function ofTarget(
  { fragment: { review } }: RecordNode<'evaluation'>,
  figures: TargetFigures | undefined,
  standing: Standing | undefined,
): Evidence {
  if (figures === undefined) return { facts: {}, grade: 'sealed' };
  const { recomputed, stated, unread } = figures;
  const isProven = stated.length > 0 && unread.length === 0 && stated.every(({ agrees }) => agrees);
  const facts: Record<string, Evidence['facts'][string]> = {};
  if (isDefined(recomputed))
    for (const window of scoredWindows) {
      const over = recomputed.value.windows[window];
      if (over !== undefined && isDefined(over))
        facts[`${window}.pairs`] = { value: over.value.pairs, computed_by: scoresVersion };
    }
  for (const { window, score, recomputed: figure } of stated)
    if (isDefined(figure)) facts[`${window}.${score}`] = { value: figure.value, computed_by: scoresVersion };
  const sealed = standing?.seal?.facts;
  if (review !== undefined) {
    const digest = reviewDigest(review);
    // A review is about the series that it was first sealed with.
    const before = sealed?.review?.value === digest ? sealed.series_seen : undefined;
    const now = isDefined(recomputed)
      ? { value: recomputed.value.graph, computed_by: graphVersion }
      : undefined;
    const seen = before?.computed_by === graphVersion ? before : now;
    facts.review = { value: digest, computed_by: 1 };
    if (seen !== undefined) facts.series_seen = seen;
  }
  return { facts, grade: isProven ? 'recomputed' : 'sealed' };
}

function ofInput(record: RecordNode<'inputs'>, profile: InputProfile, manifest: Facts['manifest']): Evidence {
  const { period, missing_share } = record.fragment;
  const shares = missingShares(record, profile, manifest).filter(({ stated }) => stated !== null);
  const facts: Record<string, Evidence['facts'][string]> = {};
  for (const { file, found } of shares)
    facts[file === null ? 'missing_share' : `missing_share ${file}`] = {
      value: found,
      computed_by: fileProfileVersion,
    };
  const sharesHold =
    missing_share === undefined || (shares.length > 0 && shares.every(({ agrees }) => agrees));
  const says = period !== undefined || missing_share !== undefined;
  return { facts, grade: says && sharesHold && holdsPeriod(period, profile) ? 'recomputed' : 'sealed' };
}

function holdsPeriod(period: string | undefined, { days }: InputProfile): boolean {
  if (period === undefined) return true;
  const stated = parsePeriod(period);
  return (
    stated !== null && parseDate(stated.first) === days?.firstDay && parseDate(stated.last) === days.lastDay
  );
}

function ofBalance(figures: VolumeFigures | undefined): Evidence {
  if (figures === undefined) return { facts: {}, grade: 'sealed' };
  return {
    facts: comparedFacts(figures.stated, '', balancesVersion),
    grade: allAgree(figures.stated) ? 'recomputed' : 'sealed',
  };
}

function ofBands(bands: Facts['bands']): Evidence {
  const facts = bands.map(({ target, stated }) => comparedFacts(stated, `${target}.`, bandsVersion));
  const isProven = bands.length > 0 && bands.every(({ stated }) => allAgree(stated));
  return { facts: Object.assign({}, ...facts), grade: isProven ? 'recomputed' : 'sealed' };
}

function comparedFacts(
  stated: readonly ComparedFigure[],
  prefix: string,
  version: number,
): Evidence['facts'] {
  return Object.fromEntries(
    stated.flatMap(({ name, recomputed }) =>
      isDefined(recomputed)
        ? [[`${prefix}${name}`, { value: recomputed.value, computed_by: version }] as const]
        : [],
    ),
  );
}

/** Of the figures of a case's drivers, and of the conditions that they are held against. */
function ofScenario(record: RecordNode<'scenarios'>, computed: Computed): Evidence {
  const drivers = statedDrivers(record, computed);
  const against = new Set(drivers.map(({ name }) => name));
  const all = [...statedConditions(computed).filter(({ name }) => against.has(name)), ...drivers];
  const facts = all.map(({ of, name, compared }) =>
    comparedFacts(compared, `${of} ${name}.`, conditionVersion),
  );
  const isProven = allAgree(all.flatMap(({ compared }) => compared));
  return { facts: Object.assign({}, ...facts), grade: isProven ? 'recomputed' : 'sealed' };
}
