import { parse as parseToml } from 'smol-toml';
import { isAlias, isMap, isSeq, LineCounter, type Node, parseDocument } from 'yaml';
import type { Taken } from './take.ts';

const largest = 2 ** 20;

/**
 * The value that a JSON Pointer (RFC 6901) leads to in a JSON, YAML or TOML file, told apart by the file's ending; or what
 * stands in the way. YAML aliases are followed one step at a time and never expanded.
 */
export function takePointer(text: string, pointer: string, file: string): Taken | string {
  if (text.length > largest) return `${file} is larger than ${largest} characters`;
  if (pointer !== '' && !pointer.startsWith('/'))
    return `the pointer \`${pointer}\` does not begin with \`/\``;
  const keys = pointer
    .split('/')
    .slice(1)
    .map((key) => key.replaceAll('~1', '/').replaceAll('~0', '~'));
  const nowhere = `${file} holds nothing at \`${pointer}\``;
  const format = /\.(json|ya?ml|toml)$/i.exec(file)?.[1]?.toLowerCase();
  if (format === undefined) return `a pointer reads .json, .yaml and .toml files, and ${file} is none`;
  const found = format === 'toml' ? inToml(text, keys) : inYaml(text, keys);
  if (typeof found === 'string') return `${file} can’t be read as ${format.toUpperCase()}: ${found}`;
  if (found === undefined) return nowhere;
  const { value, line } = found;
  if (value instanceof Date) return { value: value.toISOString(), line };
  if (typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean')
    return { value, line };
  return `${nowhere} that is one value`;
}

type Found = { readonly value: unknown; readonly line: number | null } | string | undefined;

function inToml(text: string, keys: readonly string[]): Found {
  let value: unknown;
  try {
    value = parseToml(text);
  } catch (error) {
    return firstLine(error);
  }
  for (const key of keys) {
    if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return undefined;
    value = (value as Record<string, unknown>)[key];
  }
  return { value, line: null };
}

function inYaml(text: string, keys: readonly string[]): Found {
  const lineCounter = new LineCounter();
  const document = parseDocument(text, { lineCounter, logLevel: 'silent' });
  const [error] = document.errors;
  if (error !== undefined) return firstLine(error);
  let node: Node | null | undefined = document.contents;
  for (const key of keys) {
    if (isAlias(node)) node = node.resolve(document);
    if (isSeq<Node>(node)) node = /^(?:0|[1-9]\d*)$/.test(key) ? node.items[Number(key)] : undefined;
    else if (isMap<{ toString(): string }, Node | null>(node)) {
      node = node.items.find((pair) => String(pair.key) === key)?.value;
    } else return undefined;
  }
  if (isAlias(node)) node = node.resolve(document);
  if (!node) return undefined;
  const value = 'value' in node ? node.value : node;
  return { value, line: lineCounter.linePos(node.range?.[0] ?? 0).line };
}

function firstLine(error: unknown): string {
  return (error instanceof Error ? error.message : String(error)).split('\n', 1)[0] ?? '';
}
