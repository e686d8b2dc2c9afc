import { describe, expect, it } from 'vitest';
import { fieldName } from '../../src/manifest/manifest.ts';
import { readManifest } from '../../src/manifest/read.ts';
import { rules } from '../../src/rules/index.ts';
import type { Draft, Rule } from '../../src/rules/rule.ts';
import { runFileRules, runRules } from '../../src/rules/run.ts';
import type { Level } from '../../src/verdict/finding.ts';
import { levelOf } from '../../src/verdict/level.ts';
import { manifestText, type StudyEdits, studyFacts } from './study.ts';

/** What a finding must be; what is left out may be anything. */
export interface Expected extends Partial<Omit<Draft, 'field' | 'message' | 'clear'>> {
  /** As in messages: `inputs.rainfall.files[0]`. */
  readonly field?: string;
  /** A part of the message, and of the next step. */
  readonly message?: string | RegExp;
  readonly clear?: string | RegExp;
  /** In the phase of the case, without departures. */
  readonly level?: Level;
}

export interface SilentCase extends StudyEdits {
  readonly name: string;
}

export interface FiringCase extends SilentCase {
  /** One finding, or all of them in order. */
  readonly finds: Expected | readonly Expected[];
}

export interface RuleCases {
  readonly fires: readonly FiringCase[];
  readonly silent: readonly SilentCase[];
}

/** The tests of one rule: studies, made from the sound one, on which it fires, and those on which it is silent. */
export function ruleCases(rule: Rule, { fires, silent }: RuleCases): void {
  if (fires.length === 0 || silent.length === 0) throw new Error(`${rule.id} needs cases of both kinds`);
  describe(rule.id, () => {
    it.each([...fires])('fires: $name', async ({ finds, name: _, ...edits }) => {
      const found = (await findingsOf(rule, edits)).map(({ draft, level }) => comparable(rule, draft, level));
      const wanted = (Array.isArray(finds) ? finds : [finds]) as readonly Expected[];
      expect(found, 'number of findings').toHaveLength(wanted.length);
      for (const [index, expected] of wanted.entries())
        expect(found[index]).toMatchObject(matchers(expected));
    });
    it.each([{ name: 'the sound study' }, ...silent])('is silent: $name', async ({ name: _, ...edits }) => {
      expect((await findingsOf(rule, edits)).map(({ draft }) => draft.message)).toEqual([]);
    });
  });
}

async function findingsOf(rule: Rule, edits: StudyEdits): Promise<readonly { draft: Draft; level: Level }[]> {
  if (rule.scope === 'file') {
    const path = 'stoplog.yaml';
    const { manifest, problems } = readManifest(path, edits.text ?? manifestText(edits));
    const raised = manifest === null ? runFileRules([rule], { path, problems }) : [];
    return raised.map(({ draft }) => ({ draft, level: 'block' }));
  }
  const facts = await studyFacts(edits);
  return runRules(rule.second ? rules : [rule], facts)
    .filter((raised) => raised.rule === rule)
    .map(({ draft }) => ({ draft, level: levelOf(rule, draft, facts.phase as never, undefined) }));
}

function comparable({ clear }: Rule, { field, ...draft }: Draft, level: Level) {
  return { clear, ...draft, level, ...(field === undefined ? {} : { field: fieldName(field) }) };
}

function matchers({ message, clear, ...exact }: Expected) {
  const holding = (text: string | RegExp) =>
    expect.stringMatching(typeof text === 'string' ? escaped(text) : text);
  return {
    ...exact,
    ...(message === undefined ? {} : { message: holding(message) }),
    ...(clear === undefined ? {} : { clear: holding(clear) }),
  };
}

function escaped(text: string): RegExp {
  return new RegExp(text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&'));
}
