import { LineCounter, parseDocument } from 'yaml';
import { canonicalJson } from './canonical.ts';
import { conflictLine, takeVersions } from './conflict.ts';
import { newest, schemes } from './schemes.ts';
import type { Seal, SealsFault, SealsFile } from './seal.ts';
import { checksumOf, faultyField, isMap } from './seal-entry.ts';

type Read = Pick<SealsFile, 'seals' | 'unreadable' | 'faults'>;

const nothing: Omit<Read, 'faults'> = { seals: new Map(), unreadable: new Map() };

/**
 * Reads a seals file; `text` is null where there is none. A fault hides only the entry that it is about: of a
 * file with conflict markers, the entries that are the same on both sides still count.
 */
export function readSealsFile(
  path: string,
  text: string | null,
  newestScheme = newest(schemes).number,
): SealsFile {
  if (text === null) return { path, exists: false, ...nothing, faults: [] };
  const line = conflictLine(text);
  return {
    path,
    exists: true,
    ...(line === null ? readText(text, newestScheme) : readConflict(text, line, newestScheme)),
  };
}

function readConflict(text: string, line: number, newestScheme: number): Read {
  const versions = takeVersions(text);
  const ours = readText(versions?.ours ?? '{}', newestScheme).seals;
  const theirs = readText(versions?.theirs ?? '{}', newestScheme).seals;
  const alike = [...ours].filter(([id, seal]) => theirs.get(id)?.checksum === seal.checksum);
  const message =
    'Git left a merge conflict in the seals, so where its sides differ nobody can tell what was reviewed.';
  return { ...nothing, seals: new Map(alike), faults: [{ kind: 'conflict', record: null, line, message }] };
}

function readText(text: string, newestScheme: number): Read {
  const { value, fault } = parseJson(text);
  if (fault !== null) return { ...nothing, faults: [fault] };
  if (!isMap(value) || !isMap(value.records)) {
    const message =
      'Expected a map with `scheme` and `records`, as `stoplog seal` writes it; none of it can be read.';
    return { ...nothing, faults: [{ kind: 'shape', record: null, line: 1, message }] };
  }
  const seals = new Map<string, Seal>();
  const unreadable = new Map<string, unknown>();
  const faults: SealsFault[] = [];
  for (const [record, entry] of Object.entries(value.records)) {
    const wrong = faultOf(entry, newestScheme);
    if (wrong === null) {
      seals.set(record, entry as Seal);
      continue;
    }
    unreadable.set(record, entry);
    faults.push({ ...wrong, record, line: lineOf(record, text) });
  }
  return { seals, unreadable, faults };
}

function faultOf(entry: unknown, newestScheme: number): Pick<SealsFault, 'kind' | 'message'> | null {
  if (!isMap(entry)) return { kind: 'shape', message: 'The entry is no seal, as `stoplog seal` writes it.' };
  if (typeof entry.scheme === 'number' && entry.scheme > newestScheme) {
    const message = `The record was sealed by a newer Stoplog (scheme ${entry.scheme}; this one knows ${newestScheme}), so its seal can't be judged here.`;
    return { kind: 'newer-scheme', message };
  }
  const field = faultyField(entry);
  if (field !== null) {
    return { kind: 'shape', message: `\`${field}\` of the entry is not as \`stoplog seal\` writes it.` };
  }
  if (entry.checksum === checksumOf(entry)) return null;
  return {
    kind: 'edited',
    message: 'The entry was changed by hand after it was sealed: its checksum does not fit.',
  };
}

function parseJson(text: string): { readonly value: unknown; readonly fault: SealsFault | null } {
  try {
    return { value: JSON.parse(text), fault: null };
  } catch (error) {
    const said = error instanceof Error ? error.message : String(error);
    const message = 'The file is no JSON from here on, so none of its seals can be read.';
    return { value: null, fault: { kind: 'not-json', record: null, line: lineOfFault(text, said), message } };
  }
}

/** Node names an offset for most faults; the YAML reader, which takes nearly all JSON, finds the line of the others. */
function lineOfFault(text: string, said: string): number {
  const offset = /at position (\d+)/.exec(said)?.[1];
  if (offset !== undefined) return text.slice(0, Number(offset)).split('\n').length;
  const [error] = parseDocument(text, { lineCounter: new LineCounter() }).errors;
  return error?.linePos?.[0].line ?? text.trimEnd().split('\n').length;
}

function lineOf(record: string, text: string): number {
  const name = JSON.stringify(record);
  const line = text
    .split('\n')
    .findIndex((one) => one.trimStart().startsWith(`${name}:`) && one.trimEnd().endsWith('{'));
  return Math.max(1, line + 1);
}

/** A seals file's text: the newest scheme in it first, then one record after another, all keys sorted; entries at fault keep what they say. */
export function writeSealsFile(
  seals: ReadonlyMap<string, Seal>,
  unreadable: SealsFile['unreadable'] = nothing.unreadable,
): string {
  const scheme = Math.max(1, ...[...seals.values()].map((seal) => seal.scheme));
  const records: unknown = JSON.parse(canonicalJson(Object.fromEntries([...unreadable, ...seals])));
  return `${JSON.stringify({ scheme, records }, null, 2)}\n`;
}
