import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { CheckInMemory, type Files } from '../harness/check-in-memory.ts';

const project = join(import.meta.dirname, '../../example-project');

/** The example project, by path from its folder, without what is kept outside git. */
export const example: Files = Object.fromEntries(
  readdirSync(project, { recursive: true, encoding: 'utf8' })
    .filter((path) => !path.startsWith('radar') && statSync(join(project, path)).isFile())
    .map((path) => [path.replaceAll('\\', '/'), readFileSync(join(project, path), 'utf8')]),
);

/** Checks copies of the example a few weeks after it was sealed. */
export const check = new CheckInMemory(example, '2025-04-01');

const sound = await check.studyIn(example);

/** Records, and all that rest on them, as the sound example has it. */
export function above(records: readonly string[]): Set<string> {
  const all = new Set(records);
  for (const below of all)
    for (const { id, restsOn } of sound?.records.nodes.values() ?? [])
      if (restsOn.some((one) => one === below || one.startsWith(`${below}.`))) all.add(id);
  return all;
}
