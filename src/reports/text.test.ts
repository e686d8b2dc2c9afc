import { describe, expect, it } from 'vitest';
import { finding } from '../../tests/harness/finding.ts';
import type { Finding, ManifestVerdict, Verdict } from '../verdict/finding.ts';
import { concludeVerdict } from '../verdict/judge.ts';
import { jsonReport } from './json.ts';
import { textReport } from './text.ts';

const plainText = { color: false, extent: 'whole' } as const;

function verdictOf(findings: readonly Finding[], over: Partial<ManifestVerdict> = {}): Verdict {
  const ids = [...new Set(findings.map((one) => one.record))];
  return concludeVerdict('staged for commit', null, [
    {
      path: 'stoplog.yaml',
      study: 'Low-flow model',
      phase: 'application',
      records: ids.map((id) => ({
        id,
        state: 'stale',
        grade: 'stated',
        sealed_on: '2020-03-02',
        sealed_by: 'A <a@b.example>',
      })),
      findings,
      departures: [],
      cured: [],
      changed: [],
      ...over,
    },
  ]);
}

describe('the text report', () => {
  it('says what is held back, why, where, and what to do', () => {
    expect(
      textReport(verdictOf([finding()]), plainText),
    ).toBe(`stoplog   Low-flow model                  staged for commit
          phase application               0 of 1 record sound

BLOCKED   1 record

  inputs.rainfall   stale                                                            stoplog.yaml:41
     data/rain/upper.csv is not the file that was sealed on 2020-03-02.
     14 of 5 113 values differ; total 11 402 -> 11 655 mm (+2.2 %)
     to clear   Check the new data, then: stoplog seal inputs.rainfall
                (seal.stale)

BLOCKED   1 finding to clear, 0 warnings, 0 notes
`);
  });

  it('says on a pass what a pass is not', () => {
    const text = textReport(verdictOf([finding({ level: 'warn' })]), plainText);
    expect(text).toContain('PASS   0 findings to clear, 1 warning, 0 notes');
    expect(text).toContain('does not make a model fit');
  });

  it('is silent on a quiet pass and shows only what blocks on a quiet hold', () => {
    const quiet = { ...plainText, extent: 'quiet' } as const;
    expect(textReport(verdictOf([finding({ level: 'warn' })]), quiet)).toBe('');
    const text = textReport(verdictOf([finding(), finding({ level: 'note', record: 'study' })]), quiet);
    expect(text).toContain('inputs.rainfall');
    expect(text).not.toContain('study');
  });

  it('is brief where it is read at every commit: what blocks or asks for less, else a line and the tally', () => {
    const brief = { ...plainText, extent: 'brief' } as const;
    const doubts = [
      finding({ level: 'warn' }),
      finding({ level: 'warn', rule: 'inputs.day-unstated' }),
      finding({ level: 'note', record: 'study', rule: 'study.contact-missing' }),
    ];
    const passed = textReport(verdictOf(doubts), brief);
    expect(passed.split('\n').slice(3, 9)).toEqual([
      'WARNED   2 findings',
      '  inputs.rainfall: seal.stale, inputs.day-unstated',
      '',
      'PASS   0 findings to clear, 2 warnings, 1 note',
      '`stoplog check` prints warnings and notes in full.',
      '',
    ]);
    const less = finding({ level: 'warn', rule: 'manifest.loosened', record: 'manifest', message: 'Less.' });
    const held = textReport(verdictOf([finding(), less]), brief);
    expect(held).toContain('ASKS FOR LESS   1 change');
    expect(held).toContain('14 of 5 113 values differ');
    expect(held).not.toContain('WARNED');
    expect(textReport(verdictOf([]), brief)).not.toContain('in full');
  });

  it('says of a manifest that could not be read neither phase nor records', () => {
    const fault = finding({ rule: 'manifest.unreadable', record: 'manifest', trail: [], detail: [] });
    const text = textReport(verdictOf([fault], { study: null, phase: 'setup', records: [] }), plainText);
    expect(text.split('\n')[1]?.trim()).toBe('the manifest could not be read, so no record was checked');
    expect(text).not.toContain('phase');
  });

  it('names the cause once for many records that rest on it', () => {
    const many = Array.from({ length: 300 }, (_, index) =>
      finding({
        record: `evaluation.g${index}`,
        trail: [`evaluation.g${index}`, 'runs.all', 'data/rain/upper.csv'],
        detail: [],
      }),
    );
    const text = textReport(verdictOf([finding(), ...many]), plainText);
    expect(text).toContain('and 288 more records that rest on data/rain/upper.csv');
    expect(text.split('\n').length).toBeLessThan(100);
  });

  it('lets no stranger’s text steer the terminal', () => {
    const text = textReport(
      verdictOf([finding({ message: 'a\u001b[2Jb\u202ec', file: 'x\ny.csv' })]),
      plainText,
    );
    expect(text).toContain('a\\u{1b}[2Jb\\u{202e}c');
    expect(text).toContain('x\\u{a}y.csv');
  });

  it('prints waivers, acceptances and departures with their reasons', () => {
    const text = textReport(
      verdictOf([finding({ waived: 'survey reissued (A. Writer, until 2027-01-31)' })], {
        departures: [{ of: 'evaluation.drop', now: 'notes', because: 'short record', loosens: true }],
      }),
      plainText,
    );
    expect(text).toContain('PASS');
    expect(text).toContain(
      'waived: seal.stale on inputs.rainfall: survey reissued (A. Writer, until 2027-01-31)',
    );
    expect(text).toContain(
      'departed: evaluation.drop now notes, less than the default asks for: short record',
    );
  });

  it('prints one acceptance of two findings once', () => {
    const accepted = 'recessions alone are used (A. Writer, 2026-12-01)';
    const text = textReport(
      verdictOf([finding({ accepted }), finding({ accepted, message: 'As over calibration.' })]),
      plainText,
    );
    expect(text.match(/^ {2}accepted: /gm)).toHaveLength(1);
    expect(text).toContain('2 accepted');
  });

  it('colours only when asked', () => {
    const controlSequence = '\u001b[';
    expect(textReport(verdictOf([finding()]), plainText)).not.toContain(controlSequence);
    expect(textReport(verdictOf([finding()]), { ...plainText, color: true })).toContain(controlSequence);
  });
});

describe('the JSON report', () => {
  it('is the verdict, whole', () => {
    const verdict = verdictOf([finding()]);
    expect(JSON.parse(jsonReport(verdict))).toEqual(verdict);
    expect(verdict.format).toBe('stoplog-findings/1');
  });
});
