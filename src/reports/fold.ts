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

/**
 * Where one cause makes more than `listed` records stale, or one fragment that stands for many records gives more than that
 * the same findings, the rest are counted, so that three hundred gauges do not hide what happened to them.
 */
export function fold(
  groups: readonly Group[],
  listed: number,
): { readonly shown: readonly Group[]; readonly folded: readonly Folded[] } {
  const shown: Group[] = [];
  const byCause = new Map<string, { records: string[]; why: string }>();
  for (const group of groups) {
    const cause = causeOf(group);
    const same = byCause.get(cause?.key ?? '') ?? { records: [], why: cause?.why ?? '' };
    if (cause !== null) {
      same.records.push(group[0]);
      byCause.set(cause.key, same);
    }
    if (cause === null || same.records.length <= listed) shown.push(group);
  }
  const folded = [...byCause.values()]
    .map(({ records, why }) => ({ records: records.slice(listed), why }))
    .filter(({ records }) => records.length > 0);
  return { shown, folded };
}

/** What a record's findings come from, where that may be other records' too; null where they are its own. */
function causeOf([record, findings]: Group): { readonly key: string; readonly why: string } | null {
  const [only] = findings;
  const last = only?.trail.at(-1);
  if (findings.length === 1 && only !== undefined && last !== undefined && only.trail.length > 2)
    return { key: last, why: `rest on ${last}` };
  const [area, name, ...entry] = record.split('.');
  if (only === undefined || entry.length === 0) return null;
  const what = findings.map(({ rule, file, line, trail }) => `${rule} ${file}:${line} ${trail.length}`);
  return { key: `${area}.${name}\0${what.join()}`, why: `stand in ${area}.${name} and have the same findings` };
}
