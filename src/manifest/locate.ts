import { isAlias, isMap, isSeq, type Node, type Pair, type YAMLMap } from 'yaml';
import type { FieldPath } from './manifest.ts';
import { type AliasTargets, keyText } from './to-data.ts';

/** Where a field stands in the tree. */
export interface Located {
  /** The key's node for a mapping entry; null for a list entry and for the top. */
  readonly key: Node | null;
  readonly value: Node | null;
  /** How much of the field's path exists. Less than all where the field is absent. */
  readonly depth: number;
}

export type Locate = (field: FieldPath) => Located;

/** Finds fields in a tree; through aliases, in what they repeat. For an absent field, its nearest existing ancestor. */
export function locator(root: Node, targets: AliasTargets): Locate {
  const indexes = new Map<YAMLMap, Map<string, Pair>>();
  const follow = (node: Node | null): Node | null => (isAlias(node) ? (targets.get(node) ?? null) : node);

  function entry(map: YAMLMap, key: string): Pair | undefined {
    let index = indexes.get(map);
    if (index === undefined) {
      index = new Map();
      for (const pair of map.items) {
        const text = keyText(pair.key as Node | null);
        if (text !== undefined && !index.has(text)) index.set(text, pair);
      }
      indexes.set(map, index);
    }
    return index.get(key);
  }

  return (field) => {
    let located: Located = { key: null, value: root, depth: 0 };
    for (const part of field) {
      const parent = follow(located.value);
      const depth = located.depth + 1;
      if (isMap(parent)) {
        const pair = entry(parent, String(part));
        if (pair === undefined) return located;
        located = { key: pair.key as Node, value: pair.value as Node | null, depth };
      } else {
        const item = isSeq(parent) && typeof part === 'number' ? parent.items[part] : undefined;
        if (item === undefined) return located;
        located = { key: null, value: item as Node, depth };
      }
    }
    return located;
  };
}
