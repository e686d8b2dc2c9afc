import { resolve } from 'node:path';
import { Failure } from '../failure.ts';
import { githubReport } from '../reports/github.ts';
import { gitlabReport } from '../reports/gitlab.ts';
import { jsonReport } from '../reports/json.ts';
import { junitReport } from '../reports/junit.ts';
import { markdownReport } from '../reports/markdown.ts';
import { sarifReport } from '../reports/sarif.ts';
import { textReport } from '../reports/text.ts';
import { openSnapshot } from '../repository/open-snapshot.ts';
import { openRepository } from '../repository/repository.ts';
import type { At, Snapshot } from '../repository/snapshot.ts';
import type { Phase } from '../rules/rule.ts';
import type { Verdict } from '../verdict/finding.ts';
import { openBase } from './base.ts';
import type { Context, ExitStatus } from './command.ts';
import { type Against, examine } from './examine.ts';
import { stoplogFiles } from './studies.ts';
import { tellGithub } from './tell-github.ts';
import { touchesGoverned } from './touched.ts';
import { version } from './version.ts';
import { writeFileSafely } from './write-file.ts';

export interface CheckOptions {
  readonly at: string;
  readonly base?: string;
  readonly strict?: boolean;
  readonly ifTouched?: boolean;
  readonly only?: string;
  readonly phase?: Phase;
  readonly report?: readonly string[];
  readonly cache: boolean;
  readonly quiet?: boolean;
  readonly color?: boolean;
}

export const kinds = ['text', 'json', 'sarif', 'junit', 'github', 'gitlab', 'markdown'] as const;
type Kind = (typeof kinds)[number];

interface Report {
  readonly kind: Kind;
  /** `-` for standard output, else a path. */
  readonly to: string;
}

/** `stoplog check`: 0 when nothing blocks, 1 when something does. */
export async function checkCommand(context: Context, options: CheckOptions): Promise<ExitStatus> {
  const reports = (options.report ?? ['text']).map(readReport);
  const repository = await openRepository(context.cwd, context.environment);
  const snapshot = await openSnapshot(repository, readAt(options.at), {
    alsoUntracked: stoplogFiles,
    remember: options.cache,
  });
  let against: Against | undefined;
  try {
    const { base: asked, strict = false, cache } = options;
    if (asked !== undefined) {
      against = { asked, strict, ...(await openBase(repository, asked, snapshot, cache)) };
    }
    const comparable = against === undefined || against.base !== null;
    const base = against?.base ?? null;
    if (options.ifTouched && comparable && !(await touchesGoverned(repository, snapshot, base))) {
      if (!options.quiet) context.write(untouched(snapshot, base));
      return 0;
    }
    const { only, phase } = options;
    const verdict = await examine(snapshot, { today: context.today, only, phase, against });
    for (const { kind, to } of reports) {
      const text = write(kind, verdict, options, to === '-' && context.color);
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
export function readAt(at: string): At {
  return at === 'worktree' || at === 'index' ? { kind: at } : { kind: 'revision', revision: at };
}

function write(kind: Kind, verdict: Verdict, options: CheckOptions, color: boolean): string {
  switch (kind) {
    case 'text':
      return textReport(verdict, { color: options.color ?? color, quiet: options.quiet ?? false });
    case 'json':
      return jsonReport(verdict);
    case 'sarif':
      return sarifReport(verdict, version);
    case 'junit':
      return junitReport(verdict);
    case 'github':
      return githubReport(verdict);
    case 'gitlab':
      return gitlabReport(verdict);
    case 'markdown':
      return markdownReport(verdict);
  }
}

function readReport(given: string): Report {
  const [kind, ...path] = given.split('=');
  const known = kinds.find((one) => one === kind);
  if (known === undefined) {
    throw new Failure(
      'usage',
      `\`--report ${given}\` asks for a kind of report that does not exist.`,
      `Kinds: ${kinds.join(', ')}; as \`--report json=findings.json\`, or \`--report json\` for standard output.`,
    );
  }
  return { kind: known, to: path.length === 0 ? '-' : path.join('=') };
}
