import type { Finding } from '../verdict/finding.ts';

export type Group = readonly [record: string, findings: readonly Finding[]];

/** Findings by record, in the order in which records first appear. */
export function groupByRecord(findings: readonly Finding[]): readonly Group[] {
  const groups = new Map<string, Finding[]>();
  for (const finding of findings)
    groups.set(finding.record, [...(groups.get(finding.record) ?? []), finding]);
  return [...groups];
}

/** Records that are counted and not shown. */
export interface Folded {
  readonly records: readonly string[];
  /** The end of a sentence that begins with their number. */
  readonly why: string;
}

/** How many records with one cause are shown one by one: stale ones, and those of one fragment with the same findings. */
const shownStale = 12;
const shownAlike = 3;

/**
 * Where one cause makes many records stale, or one fragment that stands for many records gives them the same findings, most are
 * counted, so that three hundred gauges do not hide what happened to them.
 */
export function fold(groups: readonly Group[]): {
  readonly shown: readonly Group[];
  readonly folded: readonly Folded[];
} {
  const shown: Group[] = [];
  const byCause = new Map<string, { records: string[]; listed: number; why: string }>();
  for (const group of groups) {
    const cause = causeOf(group);
    const same = byCause.get(cause?.key ?? '') ?? { records: [], listed: 0, why: '', ...cause };
    if (cause !== null) {
      same.records.push(group[0]);
      byCause.set(cause.key, same);
    }
    if (cause === null || same.records.length <= same.listed) shown.push(group);
  }
  const folded = [...byCause.values()]
    .map(({ records, listed, why }) => ({ records: records.slice(listed), why }))
    .filter(({ records }) => records.length > 0);
  return { shown, folded };
}

interface Cause {
  readonly key: string;
  readonly listed: number;
  readonly why: string;
}

/** What a record's findings come from, where that may be other records' too; null where they are its own. */
function causeOf([record, findings]: Group): Cause | null {
  const [only] = findings;
  const last = only?.trail.at(-1);
  if (findings.length === 1 && only !== undefined && last !== undefined && only.trail.length > 2)
    return { key: last, listed: shownStale, why: `rest on ${last}` };
  const [area, name, ...entry] = record.split('.');
  if (only === undefined || entry.length === 0) return null;
  // What rests on the entry's own fellow, as gauge.g1 on inputs.gauge.g1, is alike too.
  const root = (trail: readonly string[]) =>
    trail
      .slice(1)
      .at(-1)
      ?.replace(`.${entry.join('.')}`, '');
  const what = findings.map(({ rule, file, line, trail }) => `${rule} ${file}:${line} ${root(trail)}`);
  return {
    key: `${area}.${name}\0${what.join()}`,
    listed: shownAlike,
    why: `stand in ${area}.${name} and have the same findings`,
  };
}
