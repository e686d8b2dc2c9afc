import type { ManifestVerdict, Verdict } from '../verdict/finding.ts';
import { isUnread } from '../verdict/judge.ts';
import { obeyedAnywhere, plain } from './escape.ts';
import { clip, everyFinding, explain, type Told } from './explain.ts';
import { remarks } from './remarks.ts';
import { withinLimit } from './within-limit.ts';

/** GitLab reads 30 MB of one file. */
const bytesRead = 30_000_000;

/**
 * JUnit XML in the dialect that CI hosts read: a suite per manifest, a case per finding, and one per record of which nothing
 * was found. What blocks is a failure; what passes by somebody's word or was there before is skipped with the reason.
 */
export function junitReport(verdict: Verdict): string {
  const about = remarks(verdict);
  const render = (shown: readonly Told[], left: number): string => {
    const suites = verdict.manifests.map((manifest) =>
      suite(
        manifest,
        about,
        shown.filter((one) => one.manifest === manifest.path),
      ),
    );
    const total = (what: 'tests' | 'failures') => suites.reduce((sum, one) => sum + one[what], 0);
    return [
      '<?xml version="1.0" encoding="UTF-8"?>',
      ...(left === 0 ? [] : [`<!-- ${left} further findings are left out: the file would be too large. -->`]),
      `<testsuites name="stoplog" tests="${total('tests')}" failures="${total('failures')}" errors="0">`,
      ...suites.flatMap(({ lines }) => lines),
      '</testsuites>',
      '',
    ].join('\n');
  };
  return withinLimit(everyFinding(verdict), render, bytesRead);
}

function suite(manifest: ManifestVerdict, about: readonly string[], told: readonly Told[]) {
  const spoken = new Set(manifest.findings.map(({ record }) => record));
  const silent = manifest.records.filter(({ id }) => !spoken.has(id));
  const names = new Map<string, number>();
  const cases = told.map((one) => {
    const name = `${one.finding.record}: ${one.finding.rule}`;
    const nth = (names.get(name) ?? 0) + 1;
    names.set(name, nth);
    return testCase(one, nth === 1 ? name : `${name} (${nth})`);
  });
  const tests = cases.length + silent.length;
  const failures = told.filter(({ weight }) => weight === 'block').length;
  const skipped = told.filter(({ weight }) => weight === 'standing' || weight === 'answered').length;
  const properties = [
    ...(isUnread(manifest) ? [] : [['phase', manifest.phase] as const]),
    ...about.map((remark) => ['comparison', remark] as const),
    ...manifest.departures.map(
      ({ of, now, because }) => ['departure', `${of} now ${now}: ${because}`] as const,
    ),
    ...manifest.cured.map(
      ({ rule, record, message }) => ['cured', `${record}: ${rule}: ${clip(message, 300)}`] as const,
    ),
  ].map(([name, value]) => `      <property name="${name}" value="${xml(plain(value))}"/>`);
  const lines = [
    `  <testsuite name="${xml(manifest.path)}" tests="${tests}" failures="${failures}" errors="0" skipped="${skipped}">`,
    // The schema wants no empty list.
    ...(properties.length === 0 ? [] : ['    <properties>', ...properties, '    </properties>']),
    ...cases,
    ...silent.map(
      ({ id }) =>
        `    <testcase classname="${xml(manifest.path)}" name="${xml(plain(id))}" file="${xml(manifest.path)}"/>`,
    ),
    '  </testsuite>',
  ];
  return { tests, failures, lines };
}

function testCase({ finding, manifest, weight }: Told, name: string): string {
  const text = xml([...explain(finding), `At ${plain(finding.file)}:${finding.line}`].join('\n'));
  const inside =
    weight === 'block'
      ? `<failure type="${xml(finding.rule)}" message="${xml(clip(plain(finding.message), 300))}">${text}</failure>`
      : weight === 'standing' || weight === 'answered'
        ? `<skipped>${text}</skipped>`
        : `<system-out>${text}</system-out>`;
  return `    <testcase classname="${xml(manifest)}" name="${xml(plain(name))}" file="${xml(finding.file)}">${inside}</testcase>`;
}

const entities: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };

/** Text for XML 1.0; what it can't hold at all becomes U+FFFD, and no line begins with what a CI host would obey. */
function xml(text: string): string {
  return text
    .replace(
      /[^\t\n\r\u{20}-\u{7e}\u{a0}-\u{2027}\u{202a}-\u{d7ff}\u{e000}-\u{fffd}\u{10000}-\u{10ffff}]/gu,
      '\ufffd',
    )
    .replace(/[&<>"]/g, (sign) => entities[sign] ?? sign)
    .replace(/^(\s*):/gm, '$1&#58;')
    .replace(obeyedAnywhere, '&#35;');
}
