import { posix } from 'node:path';
import { areas } from '../../records/record.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import type { Framework, FrameworkElement } from './framework.ts';

const ending = '.framework.json';
const largestBytes = 2 ** 20;

/**
 * The frameworks that a group keeps beside its manifest: every file `*.framework.json` in the manifest's folder, of the shape of
 * `Framework`. One that can't be read stands in the crosswalk without elements, and its note says why.
 */
export async function ownFrameworks(snapshot: Snapshot, folder: string): Promise<readonly Framework[]> {
  const paths = [...snapshot.entries.keys()].filter(
    (path) => path.endsWith(ending) && posix.dirname(path) === (folder === '' ? '.' : folder),
  );
  return Promise.all(
    paths.map(async (path) => {
      const bytes = await snapshot.read(path, largestBytes);
      return readFramework(path, bytes === null ? '' : new TextDecoder().decode(bytes));
    }),
  );
}

export function readFramework(path: string, text: string): Framework {
  const unread = (why: string): Framework => ({
    name: path,
    source: path,
    note: `Not read: ${why}.`,
    elements: [],
  });
  let given: unknown;
  try {
    given = JSON.parse(text);
  } catch {
    return unread('it is no JSON');
  }
  const { name, source, note, elements } = (given ?? {}) as Record<string, unknown>;
  if (typeof name !== 'string') return unread('`name` is no text');
  if (typeof source !== 'string') return unread('`source` is no text');
  if (!Array.isArray(elements)) return unread('`elements` is no list');
  for (const [place, element] of elements.entries()) {
    const fault = faultOf(element);
    if (fault !== null) return unread(`\`elements[${place}]\`: ${fault}`);
  }
  return {
    name,
    source,
    ...(typeof note === 'string' ? { note } : {}),
    elements: elements as FrameworkElement[],
  };
}

function faultOf(element: unknown): string | null {
  const { id, title, answered_by: fields } = (element ?? {}) as Record<string, unknown>;
  if (typeof id !== 'string') return '`id` is no text';
  if (typeof title !== 'string') return '`title` is no text';
  if (!Array.isArray(fields)) return '`answered_by` is no list of fields';
  const unknown = fields.find(
    (field) => typeof field !== 'string' || !areas.some((area) => area === field.split('.')[0]),
  );
  return unknown === undefined
    ? null
    : `\`${unknown}\` begins with no area of a manifest (${areas.join(', ')})`;
}
