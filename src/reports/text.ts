import { Chalk, type ChalkInstance } from 'chalk';
import type { Cured, Finding, Level, ManifestVerdict, Verdict } from '../verdict/finding.ts';
import { counts, isUnread, passes } from '../verdict/judge.ts';
import { caution } from './caution.ts';
import { inert, plain } from './escape.ts';
import { statedAndFound, way } from './explain.ts';
import { fold, type Group, groupByRecord } from './fold.ts';
import { remarks } from './remarks.ts';
import { count, soundOf, tally, unread } from './tally.ts';
import { wrap } from './wrap.ts';

export interface TextOptions {
  readonly color: boolean;
  /**
   * `brief` tells in full only what blocks or asks for less, with a line for each record that warns, and counts all else; `quiet`
   * tells only what blocks, and nothing at all on a pass.
   */
  readonly extent: 'whole' | 'brief' | 'quiet';
}

const width = 100;
const indent = ' '.repeat(5);
const headings: Readonly<Record<Level, string>> = { block: 'BLOCKED', warn: 'WARNED', note: 'NOTED' };

/** The verdict for a terminal: what is held back and why, what to do, then the tally. */
export function textReport(verdict: Verdict, { color, extent }: TextOptions): string {
  const [brief, quiet] = [extent === 'brief', extent === 'quiet'];
  if (quiet && verdict.verdict === 'pass') return '';
  const paint = new Chalk({ level: color ? 1 : 0 });
  const isShown = (one: Finding): boolean =>
    one.level === 'block' || extent === 'whole' || (brief && loosens(one));
  const lines = verdict.manifests.flatMap((manifest, index) => [
    ...(index > 0 ? [''] : []),
    ...opening(verdict, manifest, index === 0 ? paint.bold('stoplog') : ' '.repeat(7)),
    ...sections(verdict, manifest, isShown, paint),
    ...(brief ? warned(verdict, manifest) : []),
    ...(quiet || brief ? [] : [...standing(verdict, manifest), ...cured(verdict, manifest)]),
    ...(quiet ? [] : answered(manifest)),
  ]);
  const pass = verdict.verdict === 'pass';
  lines.push(...remarks(verdict).flatMap((remark) => ['', ...wrap(plain(remark), width)]));
  lines.push('', `${pass ? paint.green.bold('PASS') : paint.red.bold('BLOCKED')}   ${tally(verdict)}`);
  const { warn, note } = verdict.totals;
  if (brief && warn + note > 0) lines.push('`stoplog check` prints warnings and notes in full.');
  if (pass) lines.push('', ...wrap(caution, width).map((line) => paint.dim(line)));
  return inert(`${lines.join('\n')}\n`);
}

function opening(verdict: Verdict, manifest: ManifestVerdict, name: string): readonly string[] {
  const study = plain(manifest.study ?? manifest.path);
  const column = Math.min(Math.max(study.length, 28), width / 2);
  const where = verdict.base === null ? verdict.at : `${verdict.at}, against ${verdict.base}`;
  const isOneOfSeveral = verdict.manifests.length > 1 && manifest.study !== null;
  return [
    `${name}   ${study.padEnd(column)}    ${plain(where)}`,
    ...(isOneOfSeveral ? [' '.repeat(10) + plain(manifest.path)] : []),
    ' '.repeat(10) +
      (isUnread(manifest) ? unread : `${`phase ${manifest.phase}`.padEnd(column)}    ${soundOf(manifest)}`),
  ];
}

function loosens({ rule }: Finding): boolean {
  return rule === 'manifest.loosened';
}

/** What the change asks less for comes first, then the levels. */
function sections(
  { comparison }: Verdict,
  manifest: ManifestVerdict,
  isShown: (finding: Finding) => boolean,
  paint: ChalkInstance,
): readonly string[] {
  const tints = { block: paint.red.bold, warn: paint.yellow.bold, note: paint.bold };
  const shown = manifest.findings.filter((one) => isShown(one) && counts(one, comparison));
  const less = shown.filter(loosens);
  return [
    ...section(
      less,
      () => paint.yellow.bold(`ASKS FOR LESS   ${count(less.length, 'change')}`),
      manifest,
      paint,
    ),
    ...(['block', 'warn', 'note'] as const).flatMap((level) =>
      section(
        shown.filter((one) => one.level === level && !loosens(one)),
        (records) => tints[level](`${headings[level]}   ${count(records, 'record')}`),
        manifest,
        paint,
      ),
    ),
  ];
}

function section(
  findings: readonly Finding[],
  title: (records: number) => string,
  manifest: ManifestVerdict,
  paint: ChalkInstance,
): readonly string[] {
  const groups = groupByRecord(findings);
  if (groups.length === 0) return [];
  const { shown, folded } = fold(groups);
  return [
    '',
    title(groups.length),
    ...shown.flatMap((group) => recordLines(group, manifest, paint)),
    ...folded.flatMap(({ records, why }) => [
      '',
      `${indent}and ${count(records.length, 'more record')} that ${plain(why)}`,
    ]),
  ];
}

function recordLines(
  [record, findings]: Group,
  manifest: ManifestVerdict,
  paint: ChalkInstance,
): readonly string[] {
  const state = manifest.records.find(({ id }) => id === record)?.state;
  const [first] = findings;
  const title = `  ${plain(record)}${state === undefined || state === 'sound' ? '' : `   ${state}`}`;
  const place = first === undefined ? '' : `${plain(first.file)}:${first.line}`;
  const gap = ' '.repeat(Math.max(3, width - title.length - place.length));
  return [
    '',
    `${paint.bold(title)}${gap}${paint.dim(place)}`,
    ...findings.flatMap((finding) => findingLines(finding, place, paint)),
  ];
}

function findingLines(finding: Finding, placeOfRecord: string, paint: ChalkInstance): readonly string[] {
  const place = `${plain(finding.file)}:${finding.line}`;
  const hanging = `${indent}${' '.repeat(11)}`;
  const [step = '', ...more] = wrap(plain(finding.clear), width - hanging.length);
  return [
    ...wrap(plain(finding.message), width - indent.length).map((line) => indent + line),
    ...statedAndFound(finding).map((line) => indent + line),
    ...way(finding).flatMap((line) => wrap(line, width - indent.length).map((part) => indent + part)),
    ...finding.detail.map((line) => indent + plain(line)),
    ...(place === placeOfRecord ? [] : [indent + paint.dim(`at ${place}`)]),
    `${indent}${paint.cyan('to clear')}   ${step}`,
    ...more.map((line) => hanging + line),
    paint.dim(`${hanging}(${finding.rule})`),
  ];
}

const listedAtMost = 12;

/** What warns, in a line for each record. */
function warned({ comparison }: Verdict, { findings }: ManifestVerdict): readonly string[] {
  const open = findings.filter((one) => one.level === 'warn' && counts(one, comparison) && !loosens(one));
  return listing(`WARNED   ${count(open.length, 'finding')}`, open);
}

/** What the base had already, in a line for each record. */
function standing({ base, comparison }: Verdict, { findings }: ManifestVerdict): readonly string[] {
  const stood = findings.filter((one) => one.standing && !counts(one, comparison) && passes(one) === null);
  return listing(`STANDING   ${count(stood.length, 'finding')} that ${base} had already`, stood);
}

/** What the base had and is gone. */
function cured({ base }: Verdict, { cured: gone }: ManifestVerdict): readonly string[] {
  return listing(`CURED   ${count(gone.length, 'finding')} that ${base} had`, gone);
}

function listing(title: string, found: readonly (Finding | Cured)[]): readonly string[] {
  if (found.length === 0) return [];
  const records = [...new Set(found.map(({ record }) => record))];
  const rest = records.length - listedAtMost;
  const rulesOf = (id: string) => [
    ...new Set(found.filter(({ record }) => record === id).map(({ rule }) => rule)),
  ];
  return [
    '',
    title,
    ...records.slice(0, listedAtMost).flatMap((id) => hanging(`${id}: ${rulesOf(id).join(', ')}`)),
    ...(rest > 0 ? [`${indent}and those of ${count(rest, 'more record')}`] : []),
  ];
}

function hanging(line: string): readonly string[] {
  return wrap(plain(line), width - 2).map((part, index) => (index === 0 ? `  ${part}` : indent + part));
}

/** Findings that pass by somebody's signed word, and departures from the default levels: always said. */
function answered(manifest: ManifestVerdict): readonly string[] {
  const lines = [
    ...manifest.findings.flatMap((finding) => {
      const reason = passes(finding);
      const how = finding.waived === null ? 'accepted' : 'waived';
      return reason === null ? [] : [`${how}: ${finding.rule} on ${finding.record}: ${reason}`];
    }),
    ...manifest.departures.map(
      ({ of, now, because, loosens }) =>
        `departed: ${of} now ${now}${loosens ? ', less than the default asks for' : ''}: ${because}`,
    ),
  ];
  if (lines.length === 0) return [];
  // One word may stand for several findings, as for those of two windows.
  return ['', 'BY SOMEBODY’S WORD', ...[...new Set(lines)].flatMap(hanging)];
}
