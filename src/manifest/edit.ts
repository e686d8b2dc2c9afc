import { isMap, isScalar, isSeq, type Node, type Pair, type Scalar, type YAMLMap } from 'yaml';
import { Failure } from '../failure.ts';
import { locator } from './locate.ts';
import { type FieldPath, fieldName, type Manifest } from './manifest.ts';
import { type Rounded, type ScalarValue, scalarText, writtenKey } from './scalar-text.ts';
import { parseYaml } from './yaml-text.ts';

export interface ScalarEdit {
  readonly field: FieldPath;
  readonly value: ScalarValue | Rounded;
}

/** New text for a part of the old. */
interface Splice {
  readonly start: number;
  readonly end: number;
  readonly text: string;
}

/** Keys that are missing below a node, with the maps between. */
type Missing = Map<string, ScalarEdit['value'] | Missing>;

/**
 * The manifest's text with other values in single fields. Every other byte stays: comments, order, blanks, line ends. A
 * value keeps its quoting, a number at least the decimals it was written with, a rounded one those it was rounded to. A key that is not there yet is put
 * after its siblings, with the maps that are missing between. Throws Failure 'cannot-seal' for a field that is a list or a map,
 * and for one that repeats another part of the manifest through an alias.
 */
export function replaceScalars(manifest: Manifest, edits: readonly ScalarEdit[]): string {
  const { text } = manifest;
  const { root } = parseYaml(text);
  if (root === null) return text;
  // Aliases are not followed: what changed behind one would change elsewhere too.
  const locate = locator(root, new Map());
  const splices: Splice[] = [];
  const missing = new Map<YAMLMap, Missing>();

  for (const { field, value } of edits) {
    const { value: node, depth } = locate(field);
    const below = field.slice(depth).map(String);
    if (below.length === 0 && isScalar(node)) splices.push(replaced(text, node, value));
    else if (below.length > 0 && isMap(node)) add(missing, node, below, value);
    else throw cannotWrite(manifest, field);
  }
  for (const [map, keys] of missing) splices.push(inserted(text, map, keys));
  return spliced(text, splices);
}

function add(
  missing: Map<YAMLMap, Missing>,
  map: YAMLMap,
  below: readonly string[],
  value: ScalarEdit['value'],
): void {
  let keys = missing.get(map) ?? new Map();
  missing.set(map, keys);
  for (const key of below.slice(0, -1)) {
    const deeper: Missing = keys.get(key) ?? new Map();
    keys.set(key, deeper);
    keys = deeper;
  }
  keys.set(below.at(-1) ?? '', value);
}

function replaced(text: string, scalar: Scalar, value: ScalarEdit['value']): Splice {
  const [start = 0, end = 0] = scalar.range ?? [];
  // A block text (`|`) ends with its line end, which the next key needs.
  const after = /\r?\n$/.exec(text.slice(start, end))?.[0] ?? '';
  return { start, end, text: scalarText(value, scalar) + after };
}

/** Keys put after the last one of a map, in the way the map is written. */
function inserted(text: string, map: YAMLMap, keys: Missing): Splice {
  const put = (at: number, written: string): Splice => ({ start: at, end: at, text: written });
  const [start = 0] = map.range ?? [];
  const last = map.items.at(-1) as Pair | undefined;
  if (last === undefined) return put(start + 1, entries(keys).join(', '));
  const end = lastOffset(last.value as Node);
  if (map.flow) return put(end, ['', ...entries(keys)].join(', '));

  const indent = ' '.repeat(start - (text.lastIndexOf('\n', start) + 1));
  const lineEnd = text.includes('\r\n') ? '\r\n' : '\n';
  const lines = entries(keys).map((entry) => indent + entry);
  // A block text (`|`) ends with its line end; after all else a comment may follow.
  const next = text[end - 1] === '\n' ? end : text.indexOf('\n', end) + 1;
  if (next === 0) return put(text.length, ['', ...lines].join(lineEnd));
  return put(next, [...lines, ''].join(lineEnd));
}

/** Where the text of a node ends; for a block map or list, where its last entry ends. */
function lastOffset(node: Node): number {
  if (isMap(node) && !node.flow) return lastOffset(node.items.at(-1)?.value as Node);
  if (isSeq(node) && !node.flow) return lastOffset(node.items.at(-1) as Node);
  return node.range?.[1] ?? 0;
}

function entries(keys: Missing): readonly string[] {
  return [...keys].map(
    ([key, value]) => `${writtenKey(key)}: ${value instanceof Map ? flowMap(value) : scalarText(value)}`,
  );
}

function flowMap(keys: Missing): string {
  return `{${entries(keys).join(', ')}}`;
}

function spliced(text: string, splices: readonly Splice[]): string {
  let out = '';
  let at = 0;
  for (const { start, end, text: written } of [...splices].sort((a, b) => a.start - b.start)) {
    out += text.slice(at, start) + written;
    at = end;
  }
  return out + text.slice(at);
}

function cannotWrite(manifest: Manifest, field: FieldPath): Failure {
  const { line } = manifest.position(field);
  return new Failure(
    'cannot-seal',
    `${manifest.path}:${line}: the figure of \`${fieldName(field)}\` can't be written: a list, a map or an alias (\`*name\`) stands there.`,
    'Write the figure there by hand, without an alias.',
  );
}
