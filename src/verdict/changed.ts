import type { Facts } from '../facts/facts.ts';
import type { FigureChange, Resealed } from '../facts/resealed.ts';
import { figure } from '../rules/figures.ts';
import { type FileChange, fileChange } from '../rules/seal/file-change.ts';
import type { Changed } from './finding.ts';

const shownAtMost = 24;

/** Records that were sealed anew since the base, where their data or figures moved; in the order of the records. */
export function changedIn(
  { records }: Facts,
  { standings, differences, figures }: Resealed,
): readonly Changed[] {
  return [...records.nodes.values()].flatMap((record) => {
    const changes = standings.get(record.id)?.changes ?? [];
    const files = changes.filter((change): change is FileChange => change.kind === 'file');
    const what = [
      ...files.flatMap((change) => fileChange(change, files.length > 1, record, { differences })),
      ...(figures.get(record.id) ?? []).flatMap(moved),
    ];
    const more = what.length - shownAtMost;
    const shown = more > 0 ? [...what.slice(0, shownAtMost), `and ${more} more`] : what;
    return what.length === 0 ? [] : [{ record: record.id, what: shown }];
  });
}

/** Nothing where nobody could see a difference, nor of a text: it is a fingerprint (of a review, of a graph). */
function moved({ name, before, now }: FigureChange): readonly string[] {
  if (typeof before === 'string' || typeof now === 'string') return [];
  return figure(before) === figure(now) ? [] : [`${name} ${figure(before)} -> ${figure(now)}`];
}
