import { createHash } from 'node:crypto';
import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { sarifReport } from '../../src/reports/sarif.ts';
import type { Verdict } from '../../src/verdict/finding.ts';
import { finding } from '../harness/finding.ts';
import { multitool, saidByMultitool } from './multitool.ts';
import { sarifJudge, sarifSchema } from './validators.ts';
import { everyVerdict, hostile, large, verdictOf } from './verdicts.ts';

/** What the tests ask of a log. */
interface Log {
  readonly runs: readonly [
    {
      readonly tool: { readonly driver: { readonly rules: readonly Rule[] } };
      readonly invocations: readonly [{ readonly toolExecutionNotifications: readonly unknown[] }];
      readonly results: readonly Result[];
    },
  ];
}
interface Rule {
  readonly id: string;
  readonly shortDescription: { readonly text: string };
  readonly fullDescription: { readonly text: string };
  readonly help: { readonly text: string };
  readonly properties: { readonly tags: readonly string[] };
}
interface Result {
  readonly ruleId: string;
  readonly ruleIndex: number;
  readonly level: string;
  readonly message: { readonly text: string };
  readonly locations: readonly [Location];
  readonly relatedLocations?: readonly Location[];
  readonly partialFingerprints: { readonly primaryLocationLineHash: string };
  readonly baselineState?: string;
  readonly suppressions?: readonly { readonly justification: string }[];
}
interface Location {
  readonly physicalLocation: {
    readonly artifactLocation: { readonly uri: string };
    readonly region?: { readonly startLine: number };
  };
}

const logOf = (verdict: Verdict): Log => JSON.parse(sarifReport(verdict, '1.2.3'));
const resultsOf = (verdict: Verdict) => logOf(verdict).runs[0].results;
const place = (result: Result | undefined) => result?.locations[0].physicalLocation;
const verdicts = await everyVerdict();

describe('the SARIF schema 2.1.0 (release candidate 5 as Microsoft ships it)', () => {
  it.skipIf(!sarifSchema.available)(`accepts every report, and no broken one ${sarifSchema.reason}`, () => {
    const faultsIn = sarifJudge();
    for (const [name, verdict] of verdicts)
      expect.soft(faultsIn(sarifReport(verdict, '1.2.3')), name).toEqual([]);
    const broken = [
      (text: string) => text.replace('"level": "error"', '"level": "fatal"'),
      (text: string) => text.replace('"message": {', '"messages": {'),
      (text: string) => text.replace('"startLine": ', '"startLine": -'),
      (text: string) => text.replace('"version": "2.1.0"', '"version": "2.2.0"'),
    ];
    for (const breaking of broken) {
      const [good, bad] = [sarifReport(large, '1.2.3'), breaking(sarifReport(large, '1.2.3'))];
      expect(bad).not.toBe(good);
      expect(faultsIn(bad)).not.toEqual([]);
    }
  });
});

describe('the rules by which GitHub takes files in, as Microsoft’s program has them', () => {
  const because = multitool.reason;
  // The project has no address of its own to name.
  const homeless = 'SARIF2005 Warning_ProvideToolnformationUri runs[0].tool.driver stoplog';

  // Of thousands of findings it takes long; those of a whole run are held against it beside the other reports.
  it.skipIf(!multitool.available).each(verdicts.filter(([, verdict]) => verdict !== large))(
    `pass %s ${because}`,
    { timeout: 300_000 },
    async (_, verdict) => {
      expect(await saidByMultitool(sarifReport(verdict, '1.2.3'))).toEqual([homeless]);
    },
  );

  it.skipIf(!multitool.available)(
    `find every fault that is put in ${because}`,
    { timeout: 300_000 },
    async () => {
      const findings = ['a', 'b', 'c', 'd', 'e'].map((fingerprint) => finding({ fingerprint }));
      const log = JSON.parse(sarifReport(verdictOf(findings), '1.2.3'));
      const [{ results, tool }] = log.runs;
      const [first, ...others] = tool.driver.rules;
      for (const part of ['shortDescription', 'fullDescription', 'help']) delete first[part];
      tool.driver.rules = [first, ...others];
      const uri = (index: number, given: string) => {
        results[index].locations[0].physicalLocation.artifactLocation.uri = given;
      };
      results[0].locations = [];
      results[1].ruleIndex = 5000;
      uri(2, '/data/rain.csv');
      uri(3, 'data/rain gauge.csv');
      uri(4, 'data\\rain.csv');
      const said = (await saidByMultitool(JSON.stringify(log))).join('\n');
      for (const fault of [
        /GH1015 .*results\[0\]/,
        /GH2012 Error_MissingShortDescription .*rules\[0\]/,
        /GH2012 Error_MissingFullDescription .*rules\[0\]/,
        /GH2012 Error_MissingHelp .*rules\[0\]/,
        /SARIF1009 .*results\[1\] /,
        /SARIF1004 .*results\[2\]/,
        /SARIF1002 .*results\[3\]/,
        /SARIF1002 .*results\[4\]/,
      ]) {
        expect.soft(said).toMatch(fault);
      }
    },
  );
});

describe('what a code scanning host asks beyond the schema', () => {
  it.each(verdicts)('%s', (_name, verdict) => {
    const [{ tool, results }] = logOf(verdict).runs;
    const { rules } = tool.driver;
    for (const { ruleId, ruleIndex, message, locations } of results) {
      expect(rules[ruleIndex]?.id).toBe(ruleId);
      expect(message.text).not.toBe('');
      expect(locations[0].physicalLocation.region?.startLine).toBeGreaterThan(0);
    }
    for (const { shortDescription, fullDescription, help, properties } of rules) {
      for (const { text } of [shortDescription, fullDescription, help]) expect(text).not.toBe('');
      expect(fullDescription.text.length).toBeLessThanOrEqual(1024);
      expect(properties.tags.length).toBeLessThanOrEqual(20);
    }
    const hashes = results.map((one) => one.partialFingerprints.primaryLocationLineHash);
    expect(hashes.every((hash) => /^[0-9a-f]{16}:1$/.test(hash))).toBe(true);
    expect(new Set(hashes).size).toBe(hashes.length);
  });

  it('gets relative references in which nothing but letters stands for itself', () => {
    for (const uri of resultsOf(hostile).map((one) => place(one)?.artifactLocation.uri ?? '')) {
      expect(uri).toMatch(/^data\/[\w.~!*'()%/-]+$/);
      expect(new URL(uri, 'http://base.example/').href).toBe(`http://base.example/${uri}`);
    }
    const [one] = resultsOf(verdictOf([finding({ file: 'data/rain gauge 50%.csv' })]));
    expect(place(one)?.artifactLocation.uri).toBe('data/rain%20gauge%2050%25.csv');
  });

  it('gets 25 000 results at most, the worst ones, and is told of the others', () => {
    const many = Array.from({ length: 25_002 }, (_, index) =>
      finding({ level: index < 2 ? 'note' : 'block', fingerprint: `${index}`, detail: [], trail: [] }),
    );
    const [{ results, invocations }] = logOf(verdictOf(many)).runs;
    expect(results).toHaveLength(25_000);
    expect(results.every(({ level }) => level === 'error')).toBe(true);
    expect(JSON.stringify(invocations)).toContain('2 further findings are left out');
  });

  it('gets 10 MB at most when compressed', () => {
    const noise = (index: number) =>
      Array.from({ length: 34 }, (_, turn) =>
        createHash('sha512').update(`${index} ${turn}`).digest('base64'),
      ).join('');
    const many = Array.from({ length: 5_500 }, (_, index) =>
      finding({ message: noise(index), fingerprint: `${index}` }),
    );
    const report = sarifReport(verdictOf(many), '1.2.3');
    expect(gzipSync(report).length).toBeLessThanOrEqual(10_000_000);
    expect(report).toContain('further findings are left out');
  });
});

describe('a result', () => {
  it('keeps its fingerprint when wording, figures and lines change', () => {
    const hash = (over: object) =>
      resultsOf(verdictOf([finding(over)]))[0]?.partialFingerprints.primaryLocationLineHash;
    expect(hash({ message: 'Other words.', line: 7, found: 3 })).toBe(hash({}));
    expect(hash({ fingerprint: 'beef' })).not.toBe(hash({}));
  });

  it('says what stands, what is new and what somebody answers for', () => {
    const told = verdictOf(
      [
        finding(),
        finding({ standing: true, fingerprint: 'b' }),
        finding({ accepted: 'dry (A, 2020-01-01)' }),
      ],
      {},
      { asked: 'main', strict: false, unavailable: null, notes: [] },
    );
    const results = resultsOf(told);
    expect(results.map(({ baselineState }) => baselineState).sort()).toEqual(['new', 'new', 'unchanged']);
    expect(results.find(({ suppressions }) => suppressions)).toMatchObject({
      level: 'note',
      suppressions: [{ justification: 'dry (A, 2020-01-01)' }],
    });
    expect(resultsOf(verdictOf([finding()]))[0]).not.toHaveProperty('baselineState');
  });

  it('names the file whose bytes changed beside the line of the manifest', () => {
    const [one] = resultsOf(verdictOf([finding()]));
    expect(place(one)).toMatchObject({
      artifactLocation: { uri: 'stoplog.yaml' },
      region: { startLine: 41 },
    });
    expect(one?.relatedLocations).toMatchObject([
      { physicalLocation: { artifactLocation: { uri: 'data/rain/upper.csv' } } },
    ]);
  });

  it.each(['/etc/hosts', '../rain.csv', 'data/../../rain.csv'])('names no file outside: %s', (path) => {
    const [one] = resultsOf(verdictOf([finding({ trail: ['inputs.rainfall', path] })]));
    expect(one).toBeDefined();
    expect(one).not.toHaveProperty('relatedLocations');
  });

  it('makes no link of a stranger’s text', () => {
    for (const { message } of resultsOf(hostile)) expect(message.text).not.toContain('](');
  });
});

it('is the same for the same verdict, by place', () => {
  expect(sarifReport(large, '1')).toBe(sarifReport(structuredClone(large), '1'));
  const files = resultsOf(large).map((one) => place(one)?.artifactLocation.uri ?? '');
  const decoded = files.map(decodeURIComponent);
  expect(decoded).toEqual([...decoded].sort());
});
