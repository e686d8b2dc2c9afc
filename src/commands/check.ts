import { resolve } from 'node:path';
import { openMemories } from '../repository/memories.ts';
import { partFolder } from '../repository/memory-folders.ts';
import { openSnapshot } from '../repository/open-snapshot.ts';
import { openRepository } from '../repository/repository.ts';
import type { At, Snapshot } from '../repository/snapshot.ts';
import type { Phase } from '../rules/rule.ts';
import { openBase } from './base.ts';
import type { Context, ExitStatus } from './command.ts';
import type { Against } from './comparison.ts';
import { examine } from './examine.ts';
import { onlyFromTop } from './only.ts';
import { missingParts, partDone, readSharing, type SharingOptions, workOnPart } from './part.ts';
import { readReport, reportOf } from './report-kinds.ts';
import { stoplogFiles } from './studies.ts';
import { tellGithub } from './tell-github.ts';
import { touchesGoverned } from './touched.ts';
import { writeFileSafely } from './write-file.ts';

export interface CheckOptions extends SharingOptions {
  readonly at: string;
  readonly base?: string;
  readonly strict?: boolean;
  readonly ifTouched?: boolean;
  readonly only?: string;
  readonly phase?: Phase;
  readonly quiet?: boolean;
  readonly brief?: boolean;
  readonly color?: boolean;
}

/** `stoplog check`: 0 when nothing blocks, 1 when something does. */
export async function checkCommand(context: Context, options: CheckOptions): Promise<ExitStatus> {
  const reports = (options.report ?? ['text']).map(readReport);
  const sharing = readSharing(options);
  const repository = await openRepository(context.cwd, context.environment);
  const { progress } = context;
  const memories = await openMemories(repository, { remember: options.cache, sharing, progress });
  const opening = { memories, progress };
  const snapshot = await openSnapshot(repository, readAt(options.at), {
    ...opening,
    alsoUntracked: stoplogFiles,
  });
  let against: Against | undefined;
  try {
    const { base: asked, strict = false } = options;
    if (asked !== undefined) {
      against = { asked, strict, ...(await openBase(repository, asked, snapshot, opening)) };
    }
    const comparable = against === undefined || against.base !== null;
    const base = against?.base ?? null;
    if (options.ifTouched && comparable && !(await touchesGoverned(repository, snapshot, base))) {
      if (!options.quiet) context.write(untouched(snapshot, base));
      return 0;
    }
    const { phase, quiet = false } = options;
    const only = onlyFromTop(options.only, repository.here, snapshot);
    if (typeof sharing === 'object') {
      await workOnPart(snapshot, base, only);
      if (!quiet) context.write(partDone(sharing, snapshot, partFolder(repository.commonDirectory, sharing)));
      return 0;
    }
    const missing = sharing === 'gather' ? await missingParts(repository.commonDirectory) : null;
    if (missing !== null && !quiet) context.tell(`${missing}\n`);
    const verdict = await examine(snapshot, { today: context.today, only, phase, against });
    const extent = quiet ? 'quiet' : options.brief ? 'brief' : 'whole';
    for (const { kind, to } of reports) {
      const color = options.color ?? (to === '-' && context.color);
      const text = reportOf(kind, verdict, { color, extent });
      if (to === '-') context.write(text, kind === 'github' ? 'command' : undefined);
      else await writeFileSafely(resolve(context.cwd, to), text);
      if (kind === 'github') await tellGithub(context, verdict);
    }
    return verdict.verdict === 'pass' ? 0 : 1;
  } finally {
    await against?.base?.close();
    await snapshot.close();
  }
}

function untouched({ at, label }: Snapshot, base: Snapshot | null): string {
  return base === null
    ? `stoplog   ${at.kind === 'index' ? 'what is ' : ''}${label} holds no manifest, so there is nothing to check\n`
    : `stoplog   nothing that a manifest governs differs between ${base.label} and ${label}\n`;
}

/** `worktree`, `index`, or anything else as a revision. */
function readAt(at: string): At {
  return at === 'worktree' || at === 'index' ? { kind: at } : { kind: 'revision', revision: at };
}
