import { describe, expect, it } from 'vitest';
import { blocks, told } from '../harness/check-in-memory.ts';
import { above, check, example } from './fennock.ts';
import { type PlantedFault, plant, plantedFaults } from './plant.ts';

const faults = plantedFaults();

/** Rules about seals themselves say nothing any more once all is sealed anew. */
const isOfSeals = ({ rule }: PlantedFault) => rule.startsWith('seal.');
const changed = ({ changed, record }: PlantedFault) => changed ?? record;

describe('the sound example', () => {
  it('has no finding that blocks', async () => {
    expect(told((await check.findingsIn(example)).filter(blocks))).toEqual([]);
  });
});

describe('a planted fault is found with its rule and record, though all was sealed anew', () => {
  it('of at least forty faults', () => {
    expect(faults.length).toBeGreaterThanOrEqual(40);
    expect(new Set(faults.map(({ fault }) => fault)).size).toBe(faults.length);
  });

  it.each(faults)('$fault', async (fault) => {
    const planted = plant(fault, example);
    const found = await check.findingsIn(isOfSeals(fault) ? planted : await check.sealedAnew(planted));
    const named = found.filter(
      (one) =>
        one.rule === fault.rule &&
        one.record === fault.record &&
        told([one])
          .join()
          .includes(fault.says ?? ''),
    );
    expect(named, told(found).join('\n')).not.toEqual([]);
    expect(named.map(({ level }) => level)).toEqual(named.map(() => fault.level ?? 'block'));
    for (const { file, line, message, clear } of named) {
      expect(`${message} ${clear}`).toMatch(/^.{20,}[.?] \S.{10,}$/s);
      expect((planted[file] ?? '').split('\n').length, `lines of ${file}`).toBeGreaterThanOrEqual(line);
    }
    if (isOfSeals(fault)) return;
    const concerned = above([fault.record, changed(fault)]).add('manifest');
    expect(told(found.filter((one) => blocks(one) && !concerned.has(one.record)))).toEqual([]);
  });
});

describe('a file with a planted fault makes its record stale until that is sealed anew', () => {
  const inFiles = faults.filter((fault) => !fault.in.startsWith('stoplog.') && fault.text === undefined);

  it.each(inFiles)('$fault', async (fault) => {
    const found = await check.findingsIn(plant(fault, example));
    const stale = found.filter(({ rule, record }) => rule === 'seal.stale' && record === changed(fault));
    expect(stale).toMatchObject([{ level: 'block', message: expect.stringContaining(fault.in) }]);
  });
});
