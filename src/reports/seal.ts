import type { FollowedMoves } from '../records/follow-moves.ts';
import type { HealedRecord } from '../records/heal.ts';
import type { Sealed, SealPlan } from '../records/make-seals.ts';
import { shellPath } from '../records/paths.ts';
import { plain } from './escape.ts';
import { count } from './tally.ts';
import { wrap } from './wrap.ts';

export interface WrittenFigure {
  readonly field: string;
  readonly before: string;
  readonly after: string;
}

/** What a sealed record states and the files do not bear out. */
export interface Contradiction {
  readonly record: string;
  /** The first one, in words. */
  readonly message: string;
  /** How many there are besides. */
  readonly others: number;
  /** Whether `--figures` would write what the files give. */
  readonly writable: boolean;
}

export interface SealOutcome {
  /** The manifest, where the repository holds others too. */
  readonly of: string | null;
  /** Whether nothing else was asked for than to follow what was renamed. */
  readonly onlyMoves: boolean;
  readonly plan: SealPlan;
  readonly healed: readonly HealedRecord[];
  readonly moved: FollowedMoves;
  readonly figures: readonly WrittenFigure[];
  /** Records without a score, and why none can be computed: by record id. */
  readonly unscored: ReadonlyMap<string, string>;
  readonly contradictions: readonly Contradiction[];
  /** Paths that were written, from the top of the repository. */
  readonly written: readonly string[];
  readonly person: string;
  readonly today: string;
}

const width = 100;
const indent = ' '.repeat(5);

const noMove =
  'no sealed record names its files, unchanged, by other paths than before.\nAfter renaming a file, write its new path in the manifest first.';

/** What a `seal` did, what it refused and why, and what to stage. */
export function sealReport(outcome: SealOutcome): string {
  const { of, onlyMoves, plan, healed, moved, figures, unscored, contradictions, written, person, today } =
    outcome;
  const lines = [
    ...titled('HEALED after a merge', healed.map(healedLine)),
    ...titled('MOVED, with who sealed it and when', [
      ...moved.records.map(({ from, to }) => `${from} is now ${to}`),
      ...moved.files.map(({ record, from, to }) => `${record}   ${from} -> ${to}`),
    ]),
    ...titled(
      'NOT MOVED, since nobody can tell which is which',
      moved.ambiguous.map(({ record, from, to }) => `${record}   ${from.join(', ')} -> ${to.join(', ')}`),
    ),
    ...titled(
      'FIGURES written into the manifest',
      figures.map(({ field, before, after }) => `${field}   ${before} -> ${after}`),
    ),
    ...titled(
      'NO SCORES could be computed',
      [...unscored].flatMap(([record, why]) => [record, ...indented(`${why}.`)]),
    ),
    ...titled(`SEALED by ${person} on ${today}`, plan.sealed.flatMap(sealedLines)),
    ...titled(
      'SEALED, BUT what is stated and what the files hold do not agree',
      contradictions.flatMap(contradictionLines),
    ),
    ...titled('DROPPED, since their records are gone', plan.dropped),
    ...titled(
      'LEFT AS THEY ARE, though these entries can’t be read: look at each record and seal it by name',
      [...plan.unreadable.keys()],
    ),
    ...titled(
      'NOT SEALED',
      plan.refused.flatMap(({ record, message, next }) => [record, ...indented(message), ...indented(next)]),
    ),
  ];
  const head = of === null ? '' : `Records of ${plain(of)}\n\n`;
  if (lines.length === 0 && written.length > 0)
    lines.push('HEALED after a merge', '  both sides hold the same seals for what is merged');
  if (lines.length === 0)
    return `${head}Nothing to do: ${onlyMoves ? noMove : 'what was asked for is sealed, and unchanged since.'}\n`;
  if (written.length > 0) lines.push('', `To stage   git add ${written.map(shellPath).join(' ')}`);
  return `${head}${lines.slice(lines[0] === '' ? 1 : 0).join('\n')}\n`;
}

function titled(title: string, items: readonly string[]): readonly string[] {
  return items.length === 0 ? [] : ['', plain(title), ...items.map((item) => `  ${plain(item)}`)];
}

function sealedLines(sealed: Sealed): readonly string[] {
  const { record, seal, along, unverified } = sealed;
  const how = howSealed(sealed);
  return [
    `${record}   ${how}${along ? ', since what was asked for rests on it' : ''}`,
    ...(seal.because === null ? [] : [`   though it did not change: ${seal.because}`]),
    ...(unverified.length === 0
      ? []
      : [`   ${count(unverified.length, 'file')} could not be verified: ${unverified.join(', ')}`]),
  ];
}

function howSealed({ seal, before, replacesUnreadable }: Sealed): string {
  if (replacesUnreadable) return 'its entry could not be read';
  if (before === null) return 'first seal';
  return before.digest === seal.digest ? 'sealed again' : 'was stale';
}

function contradictionLines({ record, message, others, writable }: Contradiction): readonly string[] {
  const more = others === 0 ? '' : ` And ${others} more, which \`stoplog check\` lists.`;
  return [
    record,
    ...indented(`${message}${more}`),
    ...(writable
      ? ['   Correct the file; or, to state what it gives:', `   stoplog seal --figures ${record}`]
      : ['   Correct what is wrong, the statement or the file, and seal again.']),
  ];
}

function indented(text: string): readonly string[] {
  return wrap(text, width - indent.length).map((line) => `   ${line}`);
}

function healedLine({ record, kept, seal, fits, rerunDropped }: HealedRecord): string {
  const side = { ours: 'this branch’s', theirs: 'the other branch’s', base: 'the older', both: 'the' }[kept];
  const state = fits ? 'fits what is merged' : 'does not fit what is merged, so the record is stale';
  return `${record}   ${side} seal is kept (${seal.sealed_by}, ${seal.sealed_on}): it ${state}${rerunDropped ? '; it no longer proves a rerun' : ''}`;
}
