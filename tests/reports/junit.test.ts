import { describe, expect, it } from 'vitest';
import { junitReport } from '../../src/reports/junit.ts';
import { finding } from '../harness/finding.ts';
import { junitJudge, junitSchema } from './validators.ts';
import { everyVerdict, hostile, large, verdictOf } from './verdicts.ts';

const verdicts = await everyVerdict();

/** Names of the cases, with the suite's, as a host tells them apart. */
const names = (report: string) =>
  [...report.matchAll(/<testcase classname="([^"]*)" name="([^"]*)"/g)].map(
    ([, of, name]) => `${of} ${name}`,
  );

describe('JUnit XML by the schema of Jenkins', () => {
  const because = junitSchema.reason;

  it.skipIf(because !== '')(`is accepted for every verdict, and no broken copy ${because}`, async () => {
    const faultsIn = await junitJudge();
    for (const [name, verdict] of verdicts) expect.soft(faultsIn(junitReport(verdict)), name).toEqual([]);
    const good = junitReport(hostile);
    for (const bad of [
      good.replace('<failure ', '<failing '),
      good.replace(' name="stoplog"', ' skipped="1"'),
      good.replace('</failure>', ''),
      good.replace('&lt;script&gt;', '<script>'),
      good.replace('::error', '\u0001').replace('&#58;:error', '\u0001'),
    ]) {
      expect(bad).not.toBe(good);
      expect(faultsIn(bad)).not.toEqual([]);
    }
  });
});

describe('a JUnit report', () => {
  it.each(verdicts)('tells every case from every other: %s', (_name, verdict) => {
    const report = junitReport(verdict);
    const all = names(report);
    expect(new Set(all).size).toBe(all.length);
    expect(report).toMatch(new RegExp(`<testsuites name="stoplog" tests="${all.length}"`));
    expect(report.match(/<failure /g)?.length ?? 0).toBe(verdict.totals.block);
  });

  it('fails what blocks, skips what stands or is answered for, passes the rest', () => {
    const report = junitReport(
      verdictOf(
        [
          finding(),
          finding({ level: 'warn', record: 'periods', fingerprint: 'b' }),
          finding({ standing: true, record: 'setup', fingerprint: 'c' }),
          finding({ waived: 'gauge moved (A, until 2030-01-01)', record: 'runs.a', fingerprint: 'd' }),
        ],
        {
          departures: [{ of: 'seal.stale', now: 'warn', because: 'a <reason>', loosens: true }],
          cured: [{ rule: 'seal.stale', record: 'model', message: 'Was stale.', fingerprint: 'e' }],
        },
        { asked: 'main', strict: false, unavailable: null, notes: [] },
      ),
    );
    const inside = (name: string) =>
      report.match(new RegExp(`name="${name}" file="stoplog.yaml"(?:/|><([a-z-]+))`))?.[1];
    expect(report).toContain('tests="5" failures="1" errors="0" skipped="2"');
    expect(inside('inputs.rainfall: seal.stale')).toBe('failure');
    expect(inside('periods: seal.stale')).toBe('system-out');
    expect(inside('setup: seal.stale')).toBe('skipped');
    expect(inside('runs.a: seal.stale')).toBe('skipped');
    expect(report).toMatch(/name="model" file="stoplog.yaml"\/>/);
    expect(report).toContain('Waived: gauge moved (A, until 2030-01-01)');
    expect(report).toContain('value="seal.stale now warn: a &lt;reason&gt;"');
    expect(report).toContain('name="cured" value="model: seal.stale: Was stale."');
  });

  it('fails what stands, too, where that was asked for', () => {
    const strict = { asked: 'main', strict: true, unavailable: null, notes: [] };
    expect(junitReport(verdictOf([finding({ standing: true })], {}, strict))).toContain('<failure ');
  });

  it('says all in the element’s text, which is what GitLab shows', () => {
    const [, text = ''] = junitReport(verdictOf([finding()])).match(/<failure [^>]*>([^<]*)</) ?? [];
    expect(text.split('\n')).toEqual([
      'data/rain/upper.csv is not the file that was sealed on 2020-03-02.',
      '14 of 5 113 values differ; total 11 402 -&gt; 11 655 mm (+2.2 %)',
      'To clear: Check the new data, then: stoplog seal inputs.rainfall',
      'At stoplog.yaml:41',
    ]);
  });

  it('shows no sign that hides or reorders text, but in the path that a host looks up', () => {
    const shown = junitReport(hostile).replace(/ (?:file|classname)="[^"]*"/g, '');
    expect(shown.match(/[\p{Cf}\p{Zl}\p{Zp}]/gu)).toBeNull();
    expect(shown).toContain('\\u{202e}back');
  });

  it('is the same for the same verdict', () => {
    expect(junitReport(large)).toBe(junitReport(structuredClone(large)));
  });

  it('stays within the 30 MB of one file that GitLab reads', () => {
    const long = 'x'.repeat(3000);
    const many = Array.from({ length: 12_000 }, (_, index) =>
      finding({ message: long, fingerprint: `${index}` }),
    );
    const report = junitReport(verdictOf(many));
    expect(Buffer.byteLength(report)).toBeLessThanOrEqual(30_000_000);
    expect(report).toMatch(/<!-- \d+ further findings are left out/);
  });
});
