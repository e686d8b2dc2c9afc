import { describe, expect, it } from 'vitest';
import { gitlabReport } from '../../src/reports/gitlab.ts';
import { finding } from '../harness/finding.ts';
import { gitlabJudge } from './validators.ts';
import { everyVerdict, verdictOf } from './verdicts.ts';

const verdicts = await everyVerdict();
const entriesOf = (report: string) => JSON.parse(report) as { fingerprint: string; severity: string }[];

describe('a code quality report', () => {
  it.each(verdicts)('is what GitLab documents: %s', (_name, verdict) => {
    const report = gitlabReport(verdict);
    expect(report.startsWith('[')).toBe(true);
    expect(gitlabJudge(report)).toEqual([]);
    const prints = entriesOf(report).map(({ fingerprint }) => fingerprint);
    expect(prints).toHaveLength(verdict.manifests.flatMap(({ findings }) => findings).length);
    expect(new Set(prints).size).toBe(prints.length);
  });

  it('would be told from a broken one', () => {
    const [entry] = entriesOf(gitlabReport(verdictOf([finding()])));
    expect(gitlabJudge(JSON.stringify([{ ...entry, severity: 'fatal' }]))).not.toEqual([]);
    expect(gitlabJudge(JSON.stringify([{ ...entry, fingerprint: undefined }]))).not.toEqual([]);
    expect(
      gitlabJudge(JSON.stringify([{ ...entry, location: { path: './stoplog.yaml', lines: { begin: 1 } } }])),
    ).not.toEqual([]);
  });

  it('is an empty list where nothing was found', () => {
    expect(gitlabReport(verdictOf([]))).toBe('[]\n');
  });

  it('puts what blocks first, and below it what stands or is answered for', () => {
    const comparison = { asked: 'main', strict: false, unavailable: null, notes: [] };
    const findings = [
      finding({ accepted: 'a dry year (A, 2020-01-01)' }),
      finding({ standing: true }),
      finding({ level: 'note' }),
      finding({ level: 'warn' }),
      finding(),
    ];
    const entries = entriesOf(gitlabReport(verdictOf(findings, {}, comparison)));
    expect(entries.map(({ severity }) => severity)).toEqual(['critical', 'minor', 'info', 'minor', 'info']);
    expect(entries[3]).toMatchObject({ description: expect.stringContaining('Standing:') });
    expect(entries[4]).toMatchObject({ description: expect.stringContaining('Accepted: a dry year') });
  });
});
