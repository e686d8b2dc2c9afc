import { createHash } from 'node:crypto';

/** The state before `stoplog hook add`. It stands in the hook itself, so `remove` needs no memory elsewhere. */
export interface Before {
  /** What was in this place. An earlier hook was moved aside in the same folder, to the name given. */
  readonly was: 'nothing' | 'the lines below' | `the hook ${string}`;
  /** How many folders, from the innermost outwards, were made for it. */
  readonly foldersMade: number;
}

/** What a hook of ours compares with; null where it checks the whole state. */
const compared = / --base '([^'\n]+)'/;

/** Our part of a hook: the lines between two marks, with a checksum that shows whether someone changed them. */
export interface Block extends Before {
  /** The revision that it compares with; null where it checks the whole state. */
  readonly base: string | null;
  /** The content without our part. */
  readonly rest: string;
  readonly changed: boolean;
}

const begins = '# stoplog hook begins: written by "stoplog hook add", taken away by "stoplog hook remove".\n';
const before = /^# Before it: (nothing|the lines below|the hook \S+)\. Folders made for it: (\d+)\.\n/;
const ends = /^# stoplog hook ends. SHA-256 of these lines: ([0-9a-f]{64})\n/m;

/** Puts our part into the rest of a hook: after its `#!` line, else first. Content is latin1, a byte a character. */
export function withBlock(rest: string, script: string, { was, foldersMade }: Before): string {
  const text = `${begins}# Before it: ${was}. Folders made for it: ${foldersMade}.\n${script}`;
  const block = `${text}# stoplog hook ends. SHA-256 of these lines: ${digest(text)}\n`;
  const first = /^#!.*\n/.exec(rest)?.[0] ?? '';
  return first + block + rest.slice(first.length);
}

/** Our part of a hook's content; null where it has none. */
export function findBlock(content: string): Block | null {
  const start = content.indexOf(begins);
  if (start < 0) return null;
  const ours = content.slice(start);
  const state = before.exec(ours.slice(begins.length));
  const end = ends.exec(ours);
  const whole = end !== null && digest(ours.slice(0, end.index)) === end[1];
  return {
    rest: whole ? content.slice(0, start) + ours.slice(end.index + end[0].length) : content,
    base: compared.exec(ours.slice(0, end?.index))?.[1] ?? null,
    changed: !whole || state === null,
    was: (state?.[1] ?? 'nothing') as Before['was'],
    foldersMade: Number(state?.[2] ?? 0),
  };
}

/** The name that an earlier hook was moved to. */
export function earlierName(before: Before): string | null {
  return before.was.startsWith('the hook ') ? before.was.slice('the hook '.length) : null;
}

function digest(text: string): string {
  return createHash('sha256').update(text, 'latin1').digest('hex');
}
