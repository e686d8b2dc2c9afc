import { workOut } from '../facts/work-out.ts';
import { Failure } from '../failure.ts';
import { plain } from '../reports/escape.ts';
import { partsIn, type Sharing } from '../repository/memory-folders.ts';
import { type Part, parsePart, partName } from '../repository/part.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { choose } from './only.ts';
import { readStudies, type Study, type Unread, withoutManifest } from './studies.ts';

/** The options that say how work is shared, and those that they do not go with. */
export interface SharingOptions {
  readonly part?: string;
  readonly gather?: boolean;
  readonly report?: readonly string[];
  readonly cache: boolean;
}

/** Reads `--part` and `--gather`. */
export function readSharing({ part, gather = false, report, cache }: SharingOptions): Sharing | undefined {
  if (part === undefined && !gather) return undefined;
  if (!cache)
    throw notTogether(
      gather ? '--gather' : '--part',
      '--no-cache',
      'what parts leave for others is a memory',
    );
  if (part === undefined) return 'gather';
  if (gather) throw notTogether('--part', '--gather', 'the parts come first, in runs of their own');
  if (report !== undefined) throw notTogether('--part', '--report', 'one part alone gives no verdict');
  return readPart(part);
}

function notTogether(one: string, other: string, why: string): Failure {
  return new Failure(
    'usage',
    `\`${one}\` and \`${other}\` do not go together: ${why}.`,
    'Run `stoplog check --part 1of8`, `--part 2of8` and so on, each with the same `--at`, `--base` and `--only`; when all are done, `stoplog check --gather` with these and with `--report`.',
  );
}

function readPart(given: string): Part {
  const part = parsePart(given);
  if (part !== null) return part;
  throw new Failure(
    'usage',
    `\`--part ${given}\` is no part of a whole.`,
    'Write which part, and of how many: `--part 2of8` is the second of eight; there may be up to 256.',
  );
}

/** Works out one part of what a check of a state takes, and of its base; closing them keeps it. Nothing is judged. */
export async function workOnPart(
  snapshot: Snapshot,
  base: Snapshot | null,
  only: string | undefined,
): Promise<void> {
  await workOn(choose(await readStudies(snapshot), only).studies, snapshot);
  if (base !== null) await workOn(await readStudies(base).catch(withoutManifest), base);
}

async function workOn(studies: readonly (Study | Unread)[], snapshot: Snapshot): Promise<void> {
  for (const study of studies) if (!('problems' in study)) await workOut(study.records, snapshot);
}

/** What a run that did its part says; `folder` is where its work lies. */
export function partDone({ number, of }: Part, { label }: Snapshot, folder: string): string {
  return `stoplog   part ${number} of ${of} of the work on ${label} is done and lies in ${plain(folder)} for \`stoplog check --gather\`\n`;
}

/** What `--gather` says where parts are missing: their work is done anew, so the verdict is the same. Null where none is. */
export async function missingParts(commonDirectory: string): Promise<string | null> {
  const parts = await partsIn(commonDirectory);
  /** Of another number some may have stayed from an earlier time. */
  const ofOneNumber = (of: number) => parts.filter((part) => part.of === of).length;
  const [of] = parts.map((part) => part.of).sort((one, other) => ofOneNumber(other) - ofOneNumber(one));
  if (of === undefined)
    return 'no part of the work was left here, so all of it is done now. `stoplog check --part 1of2` and so on leave it in .git/stoplog/parts.';
  const all = Array.from({ length: of }, (_, place) => partName({ number: place + 1, of }));
  const names = new Set(parts.map(partName));
  const missing = all.filter((name) => !names.has(name));
  return missing.length === 0
    ? null
    : `${missing.join(', ')} left no work here, so that part of it is done now.`;
}
