import { describe, expect, it } from 'vitest';
import type { Finding } from '../../src/verdict/finding.ts';
import { blocks, told } from '../harness/check-in-memory.ts';
import { above, check, example } from './fennock.ts';
import { type PlantedFault, plant, plantedFaults } from './plant.ts';

const faults = plantedFaults();
const changed = ({ changed, record }: PlantedFault) => changed ?? record;
/** The findings that name the fault. */
const naming = (found: readonly Finding[], { rule, record, says = '' }: PlantedFault) =>
  found.filter((one) => one.rule === rule && one.record === record && one.message.includes(says));
const isOfSeals = ({ rule }: { readonly rule: string }) => rule.startsWith('seal.');

describe('the sound example', () => {
  it('has no finding that blocks', async () => {
    expect(told((await check.findingsIn(example)).filter(blocks))).toEqual([]);
  });
});

describe('a planted fault is found with its rule and record', () => {
  it('of at least forty faults', () => {
    expect(faults.length).toBeGreaterThanOrEqual(40);
    expect(new Set(faults.map(({ fault }) => fault)).size).toBe(faults.length);
  });

  it.each(faults)('$fault', async (fault) => {
    const planted = plant(fault, example);
    const found = await check.findingsIn(planted);
    const named = naming(found, fault);
    expect(named, told(found).join('\n')).not.toEqual([]);
    expect(named.map(({ level }) => level)).toEqual(named.map(() => fault.level ?? 'block'));
    for (const { file, line, message, clear } of named) {
      expect(`${message} ${clear}`).toMatch(/^.{20,}[.?] \S.{10,}$/s);
      expect((planted[file] ?? '').split('\n').length, `lines of ${file}`).toBeGreaterThanOrEqual(line);
    }
    const concerned = above([fault.record, changed(fault)]).add('manifest');
    expect(told(found.filter((one) => blocks(one) && !isOfSeals(one) && !concerned.has(one.record)))).toEqual(
      [],
    );
    if (fault.in.startsWith('stoplog.') || fault.text !== undefined) return;
    const stale = found.filter(({ rule, record }) => rule === 'seal.stale' && record === changed(fault));
    expect(stale).toMatchObject([{ level: 'block', message: expect.stringContaining(fault.in) }]);
  });
});

describe('a fault does not go away by sealing it', () => {
  const ofEachRule = new Map(faults.filter((fault) => !isOfSeals(fault)).map((fault) => [fault.rule, fault]));

  it.each([...ofEachRule.values()])('$rule: $fault', async (fault) => {
    const found = await check.findingsIn(await check.sealedAnew(plant(fault, example)));
    expect(naming(found, fault), told(found).join('\n')).not.toEqual([]);
  });
});
