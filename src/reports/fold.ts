import type { Finding } from '../verdict/finding.ts';

export type Group = readonly [record: string, findings: readonly Finding[]];

/** Findings by record, in the order in which records first appear. */
export function groupByRecord(findings: readonly Finding[]): readonly Group[] {
  const groups = new Map<string, Finding[]>();
  for (const finding of findings)
    groups.set(finding.record, [...(groups.get(finding.record) ?? []), finding]);
  return [...groups];
}

/**
 * Where one cause makes more than `listed` records stale, the rest are counted under the cause, so that three
 * hundred gauges above one file do not hide what happened to it.
 */
export function foldStale(
  groups: readonly Group[],
  listed: number,
): { readonly shown: readonly Group[]; readonly folded: ReadonlyMap<string, readonly string[]> } {
  const shown: Group[] = [];
  const byCause = new Map<string, string[]>();
  for (const group of groups) {
    const [record, findings] = group;
    const [only] = findings;
    const inherited = findings.length === 1 && only !== undefined && only.trail.length > 2;
    const cause = inherited ? (only.trail.at(-1) ?? '') : '';
    const same = byCause.get(cause) ?? [];
    if (inherited) byCause.set(cause, [...same, record]);
    if (!inherited || same.length < listed) shown.push(group);
  }
  const folded = [...byCause]
    .map(([cause, records]) => [cause, records.slice(listed)] as const)
    .filter(([, records]) => records.length > 0);
  return { shown, folded: new Map(folded) };
}
