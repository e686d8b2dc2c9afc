import { runCommandLine } from '../../src/commands/command-line.ts';
import { Failure } from '../../src/failure.ts';
import type { Finding, State, Verdict } from '../../src/verdict/finding.ts';
import { counts } from '../../src/verdict/judge.ts';
import { cleanEnvironment } from './repository.ts';

/** What a command line printed and how it ended, as main.ts would end it. */
export interface Ran {
  readonly status: number;
  readonly text: string;
  readonly failure: Failure | null;
}

/** The invented day on which the tests play. */
export const someDay = '2021-03-01';

/** Runs a command line in this process, in a folder, as a person would on that day; `more` are further variables. */
export async function stoplog(
  folder: string,
  words: readonly string[],
  today = someDay,
  more: NodeJS.ProcessEnv = {},
): Promise<Ran> {
  let text = '';
  const context = {
    cwd: folder,
    environment: cleanEnvironment(more),
    today,
    color: false,
    write: (more: string) => {
      text += more;
    },
    tell: (more: string) => {
      text += more;
    },
    progress: () => {},
  };
  try {
    return { status: await runCommandLine(words, context), text, failure: null };
  } catch (error) {
    if (error instanceof Failure) return { status: 2, text, failure: error };
    throw error;
  }
}

/** The verdict of `stoplog check`, with ways to ask it. */
export interface Checked {
  readonly status: number;
  readonly verdict: Verdict;
  /** `rule record` of every finding that blocks: not answered for, and not of the base. */
  readonly blocking: readonly string[];
  /** `rule record` of every finding. */
  readonly found: readonly string[];
  finding(rule: string, record: string): Finding;
  state(record: string): State | undefined;
}

export async function check(folder: string, ...words: readonly string[]): Promise<Checked> {
  const ran = await stoplog(folder, ['check', '--report', 'json', ...words]);
  if (ran.failure !== null) throw ran.failure;
  const verdict = JSON.parse(ran.text) as Verdict;
  const findings = verdict.manifests.flatMap((manifest) => manifest.findings);
  const named = (of: readonly Finding[]) => of.map(({ rule, record }) => `${rule} ${record}`);
  return {
    status: ran.status,
    verdict,
    blocking: named(findings.filter((one) => one.level === 'block' && counts(one, verdict.comparison))),
    found: named(findings),
    finding(rule, record) {
      const found = findings.find((one) => one.rule === rule && one.record === record);
      if (found === undefined) throw new Error(`no ${rule} on ${record}, but ${named(findings).join(', ')}`);
      return found;
    },
    state: (record) =>
      verdict.manifests.flatMap((manifest) => manifest.records).find(({ id }) => id === record)?.state,
  };
}
