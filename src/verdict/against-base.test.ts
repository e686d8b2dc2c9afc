import { describe, expect, it } from 'vitest';
import { againstBase, type Judged } from './against-base.ts';
import type { Finding } from './finding.ts';
import { concludeVerdict } from './judge.ts';

function finding(over: Partial<Finding>): Finding {
  return {
    ...{
      rule: 'inputs.step-differs',
      level: 'block',
      record: 'inputs.rainfall',
      message: 'A day is missing.',
    },
    ...{
      file: 'stoplog.yaml',
      line: 4,
      column: 1,
      stated: null,
      found: null,
      unit: null,
      trail: [],
      detail: [],
    },
    ...{ source: 'definition', clear: 'Fill it.', standing: false, waived: null, accepted: null },
    fingerprint: 'aa',
    ...over,
  };
}

const judged = (findings: readonly Finding[], digest = 'old'): Judged => ({
  verdict: {
    ...{
      path: 'stoplog.yaml',
      study: null,
      phase: 'calibration',
      records: [],
      departures: [],
      cured: [],
      changed: [],
    },
    findings,
  },
  digests: new Map([['inputs.rainfall', digest]]),
});
const all = () => true;
const standing = (now: Judged, base: Judged) =>
  againstBase(now, base, all).findings.map((one) => one.standing);

describe('a finding stands', () => {
  it('where the base had it, whatever its wording and place', () => {
    const now = judged([finding({ message: 'Two days are missing.', line: 9 })]);
    expect(standing(now, judged([finding({})]))).toEqual([true]);
    expect(standing(now, judged([finding({ fingerprint: 'bb' })]))).toEqual([false]);
    expect(standing(now, judged([]))).toEqual([false]);
  });

  it('only while its record is the base’s', () => {
    expect(standing(judged([finding({})], 'new'), judged([finding({})]))).toEqual([false]);
    const gone = { ...judged([finding({})]), digests: new Map() };
    expect(standing(gone, judged([finding({})]))).toEqual([false]);
    expect(standing(gone, gone)).toEqual([true]);
  });

  it('only while it weighs no more than it did', () => {
    const [note, block] = [judged([finding({ level: 'note' })]), judged([finding({})])];
    expect(standing(block, note)).toEqual([false]);
    expect(standing(note, block)).toEqual([true]);
  });

  it('as often as the base had it', () => {
    const [once, twice] = [judged([finding({})]), judged([finding({}), finding({})])];
    expect(standing(twice, once)).toEqual([true, false]);
    expect(standing(twice, twice)).toEqual([true, true]);
    expect(againstBase(once, twice, all).cured).toHaveLength(1);
  });

  it.each(['manifest.unreadable', 'seal.unreadable', 'waiver.expired', 'manifest.loosened'])(
    'never: %s',
    (rule) => {
      const same = judged([finding({ rule, record: 'manifest' })]);
      expect(standing(same, same)).toEqual([false]);
    },
  );
});

describe('a finding that is gone', () => {
  it('is cured, but for what was said of the base’s own change, or of records not asked about', () => {
    const base = judged([
      finding({}),
      finding({ rule: 'manifest.loosened', record: 'manifest', fingerprint: 'bb' }),
      finding({ record: 'model', fingerprint: 'cc' }),
    ]);
    const { cured } = againstBase(judged([]), base, (record) => record !== 'model');
    expect(cured).toEqual([
      {
        rule: 'inputs.step-differs',
        record: 'inputs.rainfall',
        message: 'A day is missing.',
        fingerprint: 'aa',
      },
    ]);
  });
});

describe('the verdict', () => {
  const { verdict } = judged([finding({ standing: true }), finding({ standing: true, level: 'warn' })]);
  const comparison = { asked: 'main', strict: false, unavailable: null, notes: [] };

  it('is a pass over what stands, and blocked where that blocks too', () => {
    const passed = concludeVerdict('5a5a5a5', '4b4b4b4', [verdict], comparison);
    expect(passed).toMatchObject({ verdict: 'pass', totals: { block: 0, warn: 0, standing: 2 } });
    const strict = concludeVerdict('5a5a5a5', '4b4b4b4', [verdict], { ...comparison, strict: true });
    expect(strict).toMatchObject({ verdict: 'blocked', totals: { block: 1, warn: 1, standing: 2 } });
  });
});
