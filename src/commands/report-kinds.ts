import { Failure } from '../failure.ts';
import { githubReport } from '../reports/github.ts';
import { gitlabReport } from '../reports/gitlab.ts';
import { jsonReport } from '../reports/json.ts';
import { junitReport } from '../reports/junit.ts';
import { markdownReport } from '../reports/markdown.ts';
import { sarifReport } from '../reports/sarif.ts';
import { type TextOptions, textReport } from '../reports/text.ts';
import type { Verdict } from '../verdict/finding.ts';
import { version } from '../version.ts';

export const kinds = ['text', 'json', 'sarif', 'junit', 'github', 'gitlab', 'markdown'] as const;
type Kind = (typeof kinds)[number];

interface Report {
  readonly kind: Kind;
  /** `-` for standard output, else a path. */
  readonly to: string;
}

/** Reads `--report`. */
export function readReport(given: string): Report {
  const [kind, ...path] = given.split('=');
  const known = kinds.find((one) => one === kind);
  if (known === undefined) {
    throw new Failure(
      'usage',
      `\`--report ${given}\` asks for a kind of report that does not exist.`,
      `Kinds: ${kinds.join(', ')}; as \`--report json=findings.json\`, or \`--report json\` for standard output.`,
    );
  }
  const to = path.length === 0 ? '-' : path.join('=');
  if (to === '')
    throw new Failure(
      'usage',
      `\`--report ${given}\` names no file after the equals sign.`,
      `Write \`--report ${kind}=PATH\`, or \`--report ${kind}\` for standard output.`,
    );
  return { kind: known, to };
}

/** A verdict in one of these kinds; `options` are for text. */
export function reportOf(kind: Kind, verdict: Verdict, options: TextOptions): string {
  switch (kind) {
    case 'text':
      return textReport(verdict, options);
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
