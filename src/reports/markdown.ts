import type { Finding, ManifestVerdict, Verdict } from '../verdict/finding.ts';
import { isUnread } from '../verdict/judge.ts';
import { caution } from './caution.ts';
import { plain } from './escape.ts';
import {
  clip,
  everyFinding,
  explain,
  isLoosening,
  statedAndFound,
  type Told,
  type Weight,
} from './explain.ts';
import { remarks } from './remarks.ts';
import { count, soundOf, tally, unread } from './tally.ts';
import { withinLimit } from './within-limit.ts';

/** A comment on GitHub holds 65 536 characters. */
export const commentBytes = 65_000;

/** A job summary on GitHub holds 1 MiB per step. */
export const summaryBytes = 1_000_000;

/** The most lines of a list that is an aside. */
const listed = 20;

const headings: readonly (readonly [Weight, string])[] = [
  ['block', 'To clear'],
  ['warn', 'Warnings'],
  ['note', 'Notes'],
  ['standing', 'Standing: the base revision had these already'],
  ['answered', 'Passes by somebody’s word'],
];

/** The verdict as Markdown for a comment on a change, or for a job's summary, in at most so many bytes. */
export function markdownReport(verdict: Verdict, bytes = commentBytes): string {
  const render = (shown: readonly Told[], left: number): string => {
    const others = shown.filter(({ finding }) => !isLoosening(finding));
    return [
      '<!-- stoplog -->',
      ...opening(verdict),
      ...open(
        'This change asks for less',
        shown.filter(({ finding }) => isLoosening(finding)),
      ),
      ...changes(verdict, others),
      ...headings.flatMap(([weight, heading]) => {
        const told = others.filter((one) => one.weight === weight);
        return weight === 'block' ? open(heading, told) : folded(heading, told.map(item));
      }),
      ...folded('Cured by this change', cured(verdict).slice(0, listed)),
      ...(left === 0 ? [] : ['', `... and ${count(left, 'more finding')} for which there is no room here.`]),
      ...(verdict.verdict === 'pass' ? ['', caution] : []),
      '',
    ].join('\n');
  };
  const report = withinLimit(everyFinding(verdict), render, bytes);
  return Buffer.byteLength(report) <= bytes ? report : brief(verdict);
}

/** Where names and reasons alone are longer than a host takes. */
function brief(verdict: Verdict): string {
  return `<!-- stoplog -->\n${title(verdict)}\n\n${tally(verdict)}. There is no room here for more.\n`;
}

function title({ verdict }: Verdict): string {
  return `## Stoplog: ${verdict}`;
}

function opening(verdict: Verdict): readonly string[] {
  const { at, base, manifests } = verdict;
  return [
    title(verdict),
    '',
    `${tally(verdict)}. Checked: ${literal(at)}${base === null ? '' : `, against ${literal(base)}`}.`,
    ...remarks(verdict)
      .slice(0, listed)
      .flatMap((remark) => ['', `**${literal(clip(remark, 600))}**`]),
    '',
    ...manifests.slice(0, listed).map(study),
    ...manifests.flatMap(departures).slice(0, listed),
  ];
}

function study(manifest: ManifestVerdict): string {
  const { path, study, phase } = manifest;
  const about = isUnread(manifest) ? unread : `phase ${short(phase)}: ${soundOf(manifest)}`;
  return `- **${short(study ?? path)}** (${short(path)}), ${about}`;
}

function departures(manifest: ManifestVerdict): readonly string[] {
  return manifest.departures.map(({ of, now, because, loosens }) => {
    const less = loosens ? ', less than the default asks for' : '';
    return `- departed: ${short(of)} now ${short(now)}${less}: ${short(because)}`;
  });
}

function cured({ manifests }: Verdict): readonly string[] {
  return manifests
    .flatMap((manifest) => manifest.cured)
    .map(({ rule, record, message }) => `- **${short(record)}** (${short(rule)})<br>${short(message)}`);
}

/** At a glance: data and figures that moved since the base, that differ from what was sealed, or that are not those of the files. */
function changes({ manifests }: Verdict, told: readonly Told[]): readonly string[] {
  const records = new Set(manifests.flatMap((manifest) => manifest.records.map(({ id }) => id)));
  const isOpen = ({ weight }: Told) => weight !== 'standing' && weight !== 'answered';
  const rows = [
    ...manifests.flatMap((manifest) => manifest.changed),
    ...told.filter(isOpen).map(({ finding }) => ({
      record: finding.record,
      what: [...statedAndFound(finding), ...dataDifference(finding, records)],
    })),
  ]
    .filter(({ what }) => what.length > 0)
    .map(({ record, what }) => `| ${short(record)} | ${literal(clip(what.join('; '), 1000))} |`);
  if (rows.length === 0) return [];
  const left = rows.length - listed;
  return [
    '',
    '### What changed in data and figures',
    '',
    '| record | difference |',
    '|---|---|',
    ...rows.slice(0, listed),
    ...(left > 0 ? [`| ... | and ${left} more |`] : []),
  ];
}

/** The first line of what differs, where a record itself changed and not only what it rests on. */
function dataDifference({ rule, trail, detail }: Finding, records: ReadonlySet<string>): readonly string[] {
  const own = trail.length === 2 && !records.has(trail[1] ?? '');
  return rule === 'seal.stale' && own ? detail.slice(0, 1) : [];
}

function open(heading: string, told: readonly Told[]): readonly string[] {
  return told.length === 0 ? [] : ['', `### ${heading}`, '', ...told.map(item)];
}

function folded(heading: string, items: readonly string[]): readonly string[] {
  if (items.length === 0) return [];
  return ['', `<details><summary>${heading} (${items.length})</summary>`, '', ...items, '', '</details>'];
}

/** One line each, so that no text of a stranger begins a line. */
function item({ finding }: { readonly finding: Finding }): string {
  const { record, file, line, rule } = finding;
  const title = `- **${literal(record)}** (${literal(rule)}), ${literal(`${file}:${line}`)}`;
  return [title, ...explain(finding).map(literal)].join('<br>');
}

const entities: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;' };

function short(text: string): string {
  return literal(clip(text, 200));
}

/** Text that Markdown shows as it is: no markup, no HTML, nobody called by an @. */
function literal(text: string): string {
  return plain(text)
    .replace(/[\\`*_[\]|~$#!]/g, '\\$&')
    .replace(/[&<>]/g, (sign) => entities[sign] ?? sign)
    .replace(/(?<!\w)@/g, '@\u200c');
}
