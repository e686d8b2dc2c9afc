import { gzipSync } from 'node:zlib';
import { settingsAddress } from '../records/field.ts';
import { rules } from '../rules/index.ts';
import { levelInWords } from '../rules/level-in-words.ts';
import type { Rule } from '../rules/rule.ts';
import type { ManifestVerdict, Verdict } from '../verdict/finding.ts';
import { passes } from '../verdict/judge.ts';
import { plain } from './escape.ts';
import { clip, everyFinding, explain, type Told } from './explain.ts';
import { jsonText } from './json.ts';
import { remarks } from './remarks.ts';
import { withinLimit } from './within-limit.ts';

const schema = 'https://docs.oasis-open.org/sarif/sarif/v2.1.0/errata01/os/schemas/sarif-schema-2.1.0.json';

/** What a code scanning host takes: 25 000 results, 10 MB compressed; anything over is refused whole. */
const resultsTaken = 25_000;
const bytesTaken = 10_000_000;

const levels = { block: 'error', warn: 'warning', note: 'note' } as const;

/** SARIF 2.1.0 (OASIS, Errata 01) with every rule's reason and remedy; the same verdict gives the same bytes. */
export function sarifReport(verdict: Verdict, version: string): string {
  const told = everyFinding(verdict);
  const render = (shown: readonly Told[]) =>
    jsonText(log(verdict, version, [...shown].sort(byPlace), told.length - shown.length));
  return withinLimit(told.slice(0, resultsTaken), render, bytesTaken, compressed);
}

/** The size when compressed; a text that is short enough as it is need not be. */
function compressed(report: string): number {
  const bytes = Buffer.byteLength(report);
  return bytes <= bytesTaken ? bytes : gzipSync(report).length;
}

function log(verdict: Verdict, version: string, told: readonly Told[], left: number) {
  const records = new Set(verdict.manifests.flatMap((manifest) => manifest.records.map(({ id }) => id)));
  const compared = verdict.base !== null;
  const notices = [
    ...remarks(verdict),
    ...(left === 0 ? [] : [`${left} further findings are left out: a host would refuse the file.`]),
  ];
  return {
    $schema: schema,
    version: '2.1.0',
    runs: [
      {
        tool: { driver: { name: 'stoplog', semanticVersion: version, rules: rules.map(descriptor) } },
        automationDetails: { id: 'stoplog/' },
        originalUriBaseIds: { SRCROOT: { description: { text: 'The top of the repository' } } },
        columnKind: 'utf16CodeUnits',
        invocations: [{ executionSuccessful: true, toolExecutionNotifications: notices.map(notification) }],
        results: told.map((one) => result(one, records, compared)),
        properties: { verdict: verdict.verdict, studies: verdict.manifests.map(study) },
      },
    ],
  };
}

function study({ path, phase, departures, cured }: ManifestVerdict) {
  return { path, phase, departures, cured };
}

function notification(text: string) {
  return { level: 'warning', message: { text: noLink(clip(plain(text), 3000)) } };
}

const placeOf = new Map(rules.map(({ id }, index) => [id, index]));

function descriptor(rule: Rule) {
  const level = rule.from === 'warn' ? 'warning' : 'error';
  return {
    id: rule.id,
    shortDescription: { text: clip(rule.statement, 1024) },
    fullDescription: { text: clip(rule.why, 1024) },
    help: { text: `${rule.clear}\n\nBy default it ${levelInWords(rule)}. Source: ${rule.source.citation}` },
    defaultConfiguration: { level },
    properties: { tags: [rule.id.split('.')[0] ?? ''], 'problem.severity': level, precision: 'high' },
  };
}

function result({ finding, identity }: Told, records: ReadonlySet<string>, compared: boolean) {
  const { rule, level, file, line, column, standing, trail } = finding;
  const answered = passes(finding);
  const root = trail.at(-1);
  const isOtherFile = root !== undefined && root !== file && root !== settingsAddress && !records.has(root);
  return {
    ruleId: rule,
    ruleIndex: placeOf.get(rule),
    // Hosts pay no heed to suppressions, so what somebody answers for must not weigh as an error.
    level: answered === null ? levels[level] : 'note',
    message: { text: noLink(`${plain(finding.record)}: ${explain(finding).join('\n')}`) },
    locations: [location(file, { startLine: line, startColumn: column })],
    relatedLocations: isOtherFile && !leavesTop.test(root) ? [location(root)] : undefined,
    partialFingerprints: { primaryLocationLineHash: `${identity}:1`, 'stoplog/v1': identity },
    baselineState: compared ? (standing ? 'unchanged' : 'new') : undefined,
    suppressions:
      answered === null
        ? undefined
        : [{ kind: 'external', status: 'accepted', justification: clip(plain(answered), 1000) }],
  };
}

/** A seals file that somebody wrote by hand may name such a path. */
const leavesTop = /^\/|(?:^|\/)\.\.(?:\/|$)/;

function location(path: string, region?: object) {
  return {
    physicalLocation: {
      artifactLocation: { uri: uriOf(path), uriBaseId: 'SRCROOT' },
      region,
    },
  };
}

/** SARIF 3.11.6 makes links of `[text](target)`; a stranger's text must make none. */
function noLink(text: string): string {
  return text.replaceAll('](', '] (');
}

/** RFC 3986: a relative reference, every other byte percent-encoded. */
function uriOf(path: string): string {
  return path
    .split('/')
    .map((part) => encodeURIComponent(Buffer.from(part).toString()))
    .join('/');
}

function byPlace(a: Told, b: Told): number {
  const [left, right] = [a.finding, b.finding];
  if (left.file !== right.file) return left.file < right.file ? -1 : 1;
  if (left.line !== right.line) return left.line - right.line;
  const [x, y] = [`${left.rule}\0${a.identity}`, `${right.rule}\0${b.identity}`];
  return x < y ? -1 : x > y ? 1 : 0;
}
