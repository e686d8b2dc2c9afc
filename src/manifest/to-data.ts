import {
  type Alias,
  isAlias,
  isMap,
  isScalar,
  type LineCounter,
  type Node,
  type Pair,
  type YAMLMap,
  type YAMLSeq,
} from 'yaml';
import { type Fault, quoted } from './fault.ts';
import type { FieldPath } from './manifest.ts';

/** Nodes that aliases may repeat: enough for shared source and layout blocks, too few to blow up. */
const mostRepeated = 20_000;

export interface Data {
  /** Maps have no prototype, so that a name such as `constructor` is a name like any other. */
  readonly data: unknown;
  readonly faults: readonly Fault[];
  readonly targets: AliasTargets;
}

/** What each alias repeats. */
export type AliasTargets = ReadonlyMap<Alias, Node>;

/** The plain data of a tree. Of keys that stand twice the first counts; what can't be followed is null. */
export function toData(root: YAMLMap, lines: LineCounter): Data {
  const faults: Fault[] = [];
  const anchors = new Map<string, Node>();
  const targets = new Map<Alias, Node>();
  const open = new Set<Node>();
  let repeated = 0;

  const fault = (node: Node, field: FieldPath, message: string, expected: string, found: string): null => {
    faults.push({ offset: node.range?.[0] ?? 0, field, message, expected, found });
    return null;
  };

  function convert(node: Node | null, field: FieldPath, inAlias: boolean): unknown {
    if (node === null) return null;
    if (inAlias && ++repeated > mostRepeated) return null;
    if (isAlias(node)) return followed(node, field);
    const { anchor, tag } = node as { anchor?: string; tag?: string };
    if (anchor !== undefined) anchors.set(anchor, node);
    if (tag !== undefined) {
      const message = `A tag (\`!\`) stands before this value; write the value plainly, and in quotes if it is a text.`;
      return fault(node, field, message, 'a value without a tag', quoted(tag));
    }
    if (isScalar(node)) return node.value;
    open.add(node);
    const data = isMap(node) ? fromMap(node, field, inAlias) : fromList(node as YAMLSeq, field, inAlias);
    open.delete(node);
    return data;
  }

  function fromMap(map: YAMLMap, field: FieldPath, inAlias: boolean): unknown {
    const data: Record<string, unknown> = Object.create(null);
    const first = new Map<string, Node>();
    for (const pair of map.items as Pair<Node, Node | null>[]) {
      const { key: keyNode, value } = pair;
      const key = keyText(keyNode);
      if (key === undefined) {
        const message = 'A key is empty, or is itself a list or a map; a key is a plain text.';
        fault(keyNode, field, message, 'a plain text', 'none');
        continue;
      }
      const here = [...field, key];
      const before = first.get(key);
      if (before === undefined) {
        first.set(key, keyNode);
        data[key] = convert(value, here, inAlias);
      } else if (!inAlias) {
        const { line } = lines.linePos(before.range?.[0] ?? 0);
        const message = `\`${key}\` stands twice in one map, first in line ${line}; merge the two, or rename one.`;
        fault(keyNode, here, message, 'each key once', `a second \`${key}\``);
      }
    }
    return data;
  }

  function fromList(list: YAMLSeq, field: FieldPath, inAlias: boolean): unknown {
    return (list.items as Node[]).map((item, place) => convert(item, [...field, place], inAlias));
  }

  function followed(alias: Alias, field: FieldPath): unknown {
    const target = anchors.get(alias.source);
    if (target === undefined) {
      const inQuotes = `"*${alias.source}"`;
      const message = `A value that begins with \`*\` must stand in quotes: write ${inQuotes}.`;
      return fault(alias, field, message, inQuotes, `*${alias.source} without quotes`);
    }
    if (open.has(target)) {
      const message = `\`*${alias.source}\` repeats the very part that it stands in; write that value out.`;
      return fault(alias, field, message, 'an alias outside what it repeats', `*${alias.source}`);
    }
    targets.set(alias, target);
    return convert(target, field, true);
  }

  const data = convert(root, [], false);
  if (repeated > mostRepeated) {
    const message =
      'Aliases (`*name`) repeat too much; write shared parts once, in a table file or with `each`.';
    fault(root, [], message, `at most ${mostRepeated} repeated values`, 'more');
  }
  return { data, faults, targets };
}

/** A key as written, also one that YAML reads as a number; undefined for a key that is no plain text. */
export function keyText(key: Node | null): string | undefined {
  return isScalar(key) && key.source !== undefined && key.source !== '' ? key.source : undefined;
}
