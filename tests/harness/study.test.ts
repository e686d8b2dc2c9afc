import { describe, expect, it } from 'vitest';
import { rules } from '../../src/rules/index.ts';
import { runRules } from '../../src/rules/run.ts';
import { manifestText, studyFacts } from './study.ts';

describe('the sound study of the tests', () => {
  it('has nothing that any rule finds', async () => {
    const raised = runRules(rules, await studyFacts());
    expect(raised.map(({ rule, draft }) => `${rule.id} ${draft.record}: ${draft.message}`)).toEqual([]);
  });
});

describe('editing it', () => {
  it('sets and removes fields, also in lists', () => {
    const text = manifestText({
      set: { 'model.version': 'dev', 'parameters.values.0.value': 77 },
      remove: ['study.purpose'],
    });
    expect(text).toContain('version: dev');
    expect(text).toContain('value: 77');
    expect(text).not.toContain('purpose:');
  });

  it('refuses to remove what is not there, and manifests that can’t be read', async () => {
    expect(() => manifestText({ remove: ['study.purpos'] })).toThrow('no study.purpos');
    await expect(studyFacts({ set: { 'study.phase': 'later' } })).rejects.toThrow('line');
  });

  it('seals as it stands, as it stood, or not at all', async () => {
    const states = async (seals: 'now' | 'sound' | 'none') => {
      const facts = await studyFacts({ seals, set: { 'model.release': '2.2.0' } });
      return [facts.standings.get('model')?.state, facts.standings.get('study')?.state];
    };
    expect(await states('now')).toEqual(['sealed', 'sealed']);
    expect(await states('sound')).toEqual(['stale', 'sealed']);
    expect(await states('none')).toEqual(['unsealed', 'unsealed']);
  });

  it('keeps the old content of changed files readable', async () => {
    const facts = await studyFacts({
      seals: 'sound',
      files: { 'data/rain.csv': (old) => old.replace(',6.0000', ',9.0000') },
    });
    expect(facts.differences.get('data/rain.csv')).toMatchObject({
      changed: 1,
      first: '2001-10-01',
      last: '2001-10-01',
      unit: 'mm/d',
    });
  });
});
