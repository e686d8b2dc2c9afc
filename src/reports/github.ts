import type { Verdict } from '../verdict/finding.ts';
import { plain } from './escape.ts';
import { clip, everyFinding, explain, type Told, type Weight } from './explain.ts';
import { remarks } from './remarks.ts';
import { tally } from './tally.ts';

const commands = ['error', 'warning', 'notice'] as const;
type Command = (typeof commands)[number];

const commandOf: Readonly<Record<Weight, Command>> = {
  block: 'error',
  warn: 'warning',
  note: 'notice',
  standing: 'notice',
  answered: 'notice',
};

/** GitHub shows ten annotations of each kind from one step; the rest vanish without a word. */
const shownOfEach = 10;

/** The verdict as annotations that GitHub Actions reads from a step's output, worst first, and a last line with the tally. */
export function githubReport(verdict: Verdict): string {
  const told = everyFinding(verdict);
  const about = remarks(verdict).map(plain).join('\n');
  const lines = commands.flatMap((command) =>
    annotations(
      command,
      told.filter(({ weight }) => commandOf[weight] === command),
      command === 'warning' ? clip(about, 3000) : '',
    ),
  );
  return [...lines, `stoplog: ${verdict.verdict}: ${tally(verdict)}`, ''].join('\n');
}

/** What a later step can ask of this one, as lines of the file that GITHUB_OUTPUT names: the verdict and every total. */
export function githubOutputs({ verdict, totals }: Verdict): string {
  return [['verdict', verdict], ...Object.entries(totals)]
    .map(([name, value]) => `${name}=${value}\n`)
    .join('');
}

/** `about` is said first and takes one of the places, where it is not empty. */
function annotations(command: Command, told: readonly Told[], about: string): readonly string[] {
  const places = shownOfEach - (about === '' ? 0 : 1);
  const shown = told.length > places ? told.slice(0, places - 1) : told;
  const left = told.length - shown.length;
  const own = (text: string) => `::${command} title=stoplog::${data(text)}`;
  return [
    ...(about === '' ? [] : [own(about)]),
    ...shown.map((one) => annotation(command, one)),
    ...(left === 0 ? [] : [own(`... and ${left} more; the job summary lists them.`)]),
  ];
}

const prefixes: Partial<Record<Weight, string>> = { standing: 'standing: ', answered: 'answered for: ' };

function annotation(command: Command, { finding, weight }: Told): string {
  const { file, line, column, record, rule } = finding;
  const title = clip(plain(`${prefixes[weight] ?? ''}${record} (${rule})`), 200);
  const where = `title=${property(title)},file=${property(file)},line=${line},col=${column}`;
  return `::${command} ${where}::${data(explain(finding).join('\n'))}`;
}

/** GitHub's toolkit escapes `%` first, then line breaks; in properties also `:` and `,`. */
function data(text: string): string {
  return text.replaceAll('%', '%25').replaceAll('\r', '%0D').replaceAll('\n', '%0A');
}

function property(text: string): string {
  return data(text).replaceAll(':', '%3A').replaceAll(',', '%2C');
}
