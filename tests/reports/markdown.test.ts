import { describe, expect, it } from 'vitest';
import { commentBytes, markdownReport, summaryBytes } from '../../src/reports/markdown.ts';
import { finding } from '../harness/finding.ts';
import { everyVerdict, faulty, hostile, large, verdictOf } from './verdicts.ts';

const verdicts = await everyVerdict();

describe('a comment on a change', () => {
  it.each(verdicts)('keeps within what hosts take, and begins every line itself: %s', (_name, verdict) => {
    for (const limit of [commentBytes, summaryBytes]) {
      const report = markdownReport(verdict, limit);
      expect(Buffer.byteLength(report)).toBeLessThanOrEqual(limit);
      for (const line of report.split('\n'))
        expect(line).toMatch(
          /^(<!-- stoplog -->|#{2,3} |- |\| |\|---|<details><summary>|<\/details>|\d+ findings? to clear, |\.\.\. and|A pass|\*\*|$)/,
        );
    }
  });

  it('says what is over the limit', () => {
    expect(markdownReport(large)).toMatch(
      /\n\.\.\. and \d+ more findings for which there is no room here\.\n$/,
    );
    expect(markdownReport(large)).toContain('1000 findings to clear');
  });

  it('shows what changed in data and figures at a glance, then what to clear', async () => {
    const report = markdownReport(
      verdictOf([
        finding(),
        finding({ record: 'evaluation.outlet', stated: 0.8, found: 0.7, unit: '1', detail: [] }),
      ]),
    );
    expect(report).toContain(
      '| inputs.rainfall | 14 of 5 113 values differ; total 11 402 -&gt; 11 655 mm (+2.2 %) |',
    );
    expect(report).toContain('| evaluation.outlet | stated 0.8, found 0.7 1 |');
    expect(report.indexOf('What changed')).toBeLessThan(report.indexOf('### To clear'));
    expect(markdownReport(await faulty)).toMatch(/### To clear\n\n- \*\*/);
  });

  it('shows what moved and was sealed anew, and no way as a difference', () => {
    const what = ['14 of 5 113 values differ', 'calibration.nse 0.78 -> 0.8'];
    const rests = { record: 'runs.a', trail: ['runs.a', 'model'], detail: ['also rests on inputs.rainfall'] };
    const report = markdownReport(verdictOf([finding(rests)], { changed: [{ record: 'runs.b', what }] }));
    expect(report).toContain('| runs.b | 14 of 5 113 values differ; calibration.nse 0.78 -&gt; 0.8 |');
    expect(report).not.toContain('| runs.a |');
  });

  it('is short where names alone would be too long', () => {
    const long = '&'.repeat(5000);
    const departures = Array.from({ length: 30 }, () => ({
      of: long,
      now: long,
      because: long,
      loosens: true,
    }));
    const report = markdownReport(verdictOf([finding()], { departures }));
    expect(Buffer.byteLength(report)).toBeLessThanOrEqual(commentBytes);
    expect(report).toMatch(/^## Stoplog: blocked\n\n1 finding to clear/m);
  });

  it('says first what the change loosens, and lists what stands, is answered for and is cured', () => {
    const report = markdownReport(
      verdictOf(
        [
          finding({ level: 'warn', rule: 'manifest.loosened', record: 'manifest', fingerprint: 'a' }),
          finding({ standing: true, fingerprint: 'b' }),
          finding({ waived: 'gauge moved (A, until 2030-01-01)', fingerprint: 'c' }),
        ],
        {
          cured: [{ rule: 'seal.stale', record: 'periods', message: 'Was stale.', fingerprint: 'd' }],
          departures: [{ of: 'seal.stale', now: 'warn', because: 'a young study', loosens: true }],
        },
        { asked: 'main', strict: false, unavailable: 'The base is not here.', notes: [] },
      ),
    );
    const order = [
      '0 findings to clear, 1 warning, 0 notes; 1 standing, 1 cured; 1 waived, 0 accepted',
      'The base is not here.',
      'departed: seal.stale now warn, less than the default asks for: a young study',
      '### This change asks for less',
      '<summary>Standing: the base revision had these already (1)',
      '<summary>Passes by somebody’s word (1)',
      'Waived: gauge moved (A, until 2030-01-01)',
      '<summary>Cured by this change (1)',
      'A pass means',
    ].map((text) => report.indexOf(text));
    expect(order).toEqual([...order].sort((a, b) => a - b));
    expect(order[0]).toBeGreaterThan(0);
  });

  it('shows a stranger’s text as it is', () => {
    const report = markdownReport(hostile, summaryBytes);
    // Left over: our own marks only.
    const bare = report
      .replace(/\\[\\`*_[\]|~$#!]/g, '')
      .replace(/^<!-- stoplog -->$|<\/?details>|<\/?summary>|<br>|^\| |^\|---\|---\|$| \|$|^#{2,3} /gm, '')
      .replace(/^(record|\.\.\.|inputs\..*?) \| /gm, '$1')
      .replace(/^(- )?\*\*(.*?)\*\*/gm, '$2');
    expect(bare.match(/[`*_[\]|~$<>]/g)).toBeNull();
    expect(bare).not.toMatch(/(?<!\w)@\w/);
    expect(bare).not.toContain('\u001b');
  });
});
