import { isScalar } from 'yaml';
import type { ManifestData } from './data.generated.ts';
import { folderOf } from './discover.ts';
import { type Fault, toProblem } from './fault.ts';
import { locator } from './locate.ts';
import type { Manifest, Problem, ReadManifest } from './manifest.ts';
import { schemaFaults } from './schema-faults.ts';
import { toData } from './to-data.ts';
import { parseYaml } from './yaml-text.ts';

/**
 * The manifest that a text holds, or all its problems at once: those of the YAML, and past them, where YAML could
 * go on, those against the schema. `path` is from the top of the repository.
 */
export function readManifest(path: string, text: string): ReadManifest {
  const { root, faults, lines } = parseYaml(text);
  if (root === null)
    return { manifest: null, problems: sorted(faults.map((fault) => toProblem(fault, lines))) };

  const { data, faults: dataFaults, targets } = toData(root, lines);
  const locate = locator(root, targets);
  const located = (some: readonly Fault[]) => some.map((fault) => toProblem(fault, lines));
  const syntax = located(faults);
  const grounds = [...syntax, ...located(dataFaults)];
  // What YAML misread, and what it cut off on the line before, says nothing about the schema.
  const misread = new Set([...grounds.map(({ line }) => line), ...syntax.map(({ line }) => line - 1)]);
  const against = located(schemaFaults(data, locate)).filter(({ line }) => !misread.has(line));
  const problems = [...grounds, ...against];
  if (problems.length > 0) return { manifest: null, problems: sorted(problems) };

  const manifest: Manifest = {
    path,
    folder: folderOf(path),
    text,
    data: data as ManifestData,
    position(field) {
      const { key, value } = locate(field);
      const { line, col: column } = lines.linePos((key ?? value ?? root).range?.[0] ?? 0);
      return { line, column };
    },
    source(field) {
      const { value, depth } = locate(field);
      return depth === field.length && isScalar(value) ? (value.source ?? null) : null;
    },
  };
  return { manifest, problems: [] };
}

function sorted(problems: readonly Problem[]): readonly Problem[] {
  return [...problems].sort((a, b) => a.line - b.line || a.column - b.column);
}
