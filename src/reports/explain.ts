import type { Comparison, Finding, Verdict } from '../verdict/finding.ts';
import { fingerprint } from '../verdict/fingerprint.ts';
import { counts, passes } from '../verdict/judge.ts';
import { plain } from './escape.ts';

/** How a finding counts here, worst first: open ones by their level, then what the base had, then what somebody answers for. */
const weights = ['block', 'warn', 'note', 'standing', 'answered'] as const;
export type Weight = (typeof weights)[number];

function weightOf(finding: Finding, comparison: Comparison | null): Weight {
  if (passes(finding) !== null) return 'answered';
  return counts(finding, comparison) ? finding.level : 'standing';
}

/** The longest texts that a report carries of one finding: what was found, and the next step. */
const longest = { found: 3000, step: 1000 };

/** All that a report says of a finding, a line each; safe to print, and bounded. */
export function explain(finding: Finding): readonly string[] {
  const { message, detail, clear, standing, waived, accepted } = finding;
  const found = [plain(message), ...statedAndFound(finding), ...way(finding), ...detail.map(plain)].join(
    '\n',
  );
  return [
    ...clip(found, longest.found).split('\n'),
    ...(standing ? ['Standing: the base revision had it already.'] : []),
    ...(waived === null ? [] : [`Waived: ${clip(plain(waived), longest.step)}`]),
    ...(accepted === null ? [] : [`Accepted: ${clip(plain(accepted), longest.step)}`]),
    `To clear: ${clip(plain(clear), longest.step)}`,
  ];
}

/** What was stated and what was found, where both are there. */
export function statedAndFound({ stated, found, unit }: Finding): readonly string[] {
  if (stated === null || found === null) return [];
  return [plain(`stated ${stated}, found ${found}${unit === null ? '' : ` ${unit}`}`)];
}

/** From the record down to what made it stale, unless the message says so. */
export function way({ trail, message }: Finding): readonly string[] {
  const told = trail.length < 2 || message.includes(trail.at(-1) ?? '');
  return told ? [] : [`rests on ${trail.slice(1).map(plain).join(' <- ')}`];
}

/** A text of at most so many characters; three dots say that there was more. */
export function clip(text: string, length: number): string {
  if (text.length <= length) return text;
  return `${text.slice(0, length - 4).replace(/[\ud800-\udbff]$/, '')} ...`;
}

/** A finding with what tells it from all others of a verdict. */
export interface Told {
  readonly finding: Finding;
  readonly manifest: string;
  readonly weight: Weight;
  /** 16 hexadecimal digits that stay while wording, figures and lines change. */
  readonly identity: string;
}

/** Every finding of a verdict: what the change loosens first, then worst first, else in the verdict's order. */
export function everyFinding({ manifests, comparison }: Verdict): readonly Told[] {
  const seen = new Map<string, number>();
  const told = manifests.flatMap(({ path, findings }) =>
    findings.map((finding) => {
      const name = `${path}\0${finding.fingerprint}`;
      const nth = (seen.get(name) ?? 0) + 1;
      seen.set(name, nth);
      const identity = fingerprint(finding.rule, name, String(nth));
      return { finding, manifest: path, weight: weightOf(finding, comparison), identity };
    }),
  );
  return told.sort((a, b) => rank(a) - rank(b));
}

function rank({ finding, weight }: Told): number {
  return isLoosening(finding) ? -1 : weights.indexOf(weight);
}

export function isLoosening({ rule }: Finding): boolean {
  return rule === 'manifest.loosened';
}
