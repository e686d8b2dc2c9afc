import type { Finding } from '../../src/verdict/finding.ts';

/** An invented finding. */
export function finding(over: Partial<Finding> = {}): Finding {
  return {
    rule: 'seal.stale',
    level: 'block',
    record: 'inputs.rainfall',
    message: 'data/rain/upper.csv is not the file that was sealed on 2020-03-02.',
    file: 'stoplog.yaml',
    line: 41,
    column: 3,
    stated: null,
    found: null,
    unit: null,
    trail: ['inputs.rainfall', 'data/rain/upper.csv'],
    detail: ['14 of 5 113 values differ; total 11 402 -> 11 655 mm (+2.2 %)'],
    source: 'definition',
    clear: 'Check the new data, then: stoplog seal inputs.rainfall',
    standing: false,
    waived: null,
    accepted: null,
    fingerprint: 'f00d',
    ...over,
  };
}
