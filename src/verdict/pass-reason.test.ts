import { describe, expect, it } from 'vitest';
import { studyFacts } from '../../tests/harness/study.ts';
import { type Draft, rule } from '../rules/rule.ts';
import { acceptanceFor, waiverFor } from './pass-reason.ts';

const poorFit = rule({
  id: 'evaluation.single-score',
  scope: 'evaluation',
  from: 'validation',
  means: null,
  acceptable: true,
  statement: 'A stand-in for a rule whose findings can be accepted.',
  why: 'For this test.',
  source: { basis: 'house', citation: 'For this test.' },
  clear: 'For this test.',
  check: () => [],
});
const draft: Draft = { record: 'evaluation.outlet-flow', message: 'Too low.', subject: 'validation' };

describe('a waiver', () => {
  const whole = {
    rule: poorFit.id,
    record: draft.record,
    because: 'survey reissued',
    by: 'Eastmoor Rivers Office',
    until: '2021-03-01',
  };
  const reason = 'survey reissued (Eastmoor Rivers Office, until 2021-03-01)';
  const { record: _, ...anyRecord } = whole;
  it.each([
    ['whole, on its last day', whole, reason],
    ['for the subject', { ...whole, subject: 'validation' }, reason],
    ['for every record', anyRecord, reason],
    ['for another subject', { ...whole, subject: 'calibration' }, null],
    ['for another record', { ...whole, record: 'inputs.rainfall' }, null],
    ['for another rule', { ...whole, rule: 'seal.stale' }, null],
    ['past its day', { ...whole, until: '2021-02-28' }, null],
    ['without a day', { ...whole, until: undefined }, null],
    ['signed by a stand-in', { ...whole, by: '?' }, null],
    ['with a stand-in for a reason', { ...whole, because: 'tbd' }, null],
  ])('%s', async (_name, waiver, passes) => {
    const facts = await studyFacts({ set: { waivers: [waiver] } });
    expect(waiverFor(poorFit, draft, facts)).toBe(passes);
  });

  it('never reaches a manifest or seals that can’t be read', async () => {
    const facts = await studyFacts({ set: { waivers: [{ ...whole, rule: 'seal.unreadable' }] } });
    expect(waiverFor({ ...poorFit, id: 'seal.unreadable' }, draft, facts)).toBeNull();
  });
});

describe('an acceptance', () => {
  const whole = { rule: poorFit.id, because: 'one dry year', by: 'Eastmoor Rivers Office', on: '2021-01-20' };
  const reason = 'one dry year (Eastmoor Rivers Office, 2021-01-20)';
  it.each([
    ['whole', whole, reason],
    ['for the driver', { ...whole, driver: 'validation' }, reason],
    ['for another driver', { ...whole, driver: 'rain' }, null],
    ['of another rule', { ...whole, rule: 'seal.stale' }, null],
    ['without a date', { ...whole, on: undefined }, null],
    ['signed by a stand-in', { ...whole, by: 'n/a' }, null],
  ])('%s', async (_name, acceptance, passes) => {
    const facts = await studyFacts({ set: { 'evaluation.outlet-flow.accepts': [acceptance] } });
    expect(acceptanceFor(poorFit, draft, facts)).toBe(passes);
  });

  it('falls when what the record states changes', async () => {
    const facts = await studyFacts({ set: { 'evaluation.outlet-flow.accepts': [whole] } });
    const standing = facts.standings.get(draft.record);
    const fallen = new Map(standing && [[draft.record, { ...standing, fallen: [0] }]]);
    expect(acceptanceFor(poorFit, draft, { ...facts, standings: fallen })).toBeNull();
  });

  it('does not answer for a false statement', async () => {
    const facts = await studyFacts({ set: { 'evaluation.outlet-flow.accepts': [whole] } });
    const { acceptable: _acceptable, ...never } = poorFit;
    expect(acceptanceFor(never, draft, facts)).toBeNull();
  });
});
