import { describe, expect, it } from 'vitest';
import { recordsOf, sealing } from '../../tests/records/in-memory.ts';
import { smallFiles, smallStudy } from '../../tests/records/small-study.ts';
import type { Seal } from './seal.ts';
import { isUnmoved } from './unmoved.ts';

const changedData = { ...smallFiles, 'data/future.csv': 'future 2' };
const { seals } = sealing(await recordsOf(smallStudy, smallFiles));
const before = seals.get('runs.dry') as Seal;
const sealedOver = async (
  files: Record<string, string>,
  from: ReadonlyMap<string, Seal>,
  because: string | null = null,
) => sealing(await recordsOf(smallStudy, files), from, { because }).seals.get('runs.dry') as Seal;

describe('a run whose outputs did not move', () => {
  it('shows when its seal was taken out and made anew', async () => {
    const without = new Map([...seals].filter(([id]) => id !== 'runs.dry'));
    const anew = await sealedOver(changedData, without);
    expect(anew.unmoved).toEqual([]);
    expect(isUnmoved(anew)).toBe(false);
    expect(isUnmoved(anew, before)).toBe(true);
  });

  it('shows when the rerun that spoke for it no longer counts', async () => {
    const rerun = { ...before, grade: 'rerun' as const, unmoved: ['inputs.future'] };
    expect(isUnmoved(rerun)).toBe(false);
    expect(isUnmoved({ ...rerun, grade: 'sealed' })).toBe(true);
  });

  it('is in order with a reason', async () => {
    const explained = await sealedOver(changedData, seals, 'Only the header changed.');
    expect(isUnmoved(explained, before)).toBe(false);
    expect(isUnmoved({ ...explained, because: null })).toBe(true);
  });

  it('is in order where the outputs moved, and where nothing changed', async () => {
    const moved = await sealedOver({ ...changedData, 'runs/dry/daily.csv': 'dry daily 2' }, seals);
    expect(isUnmoved(moved, before)).toBe(false);
    expect(isUnmoved(before, before)).toBe(false);
    expect(isUnmoved(seals.get('inputs.future') as Seal, before)).toBe(false);
  });

  it('is none where only the paths of data and outputs changed', async () => {
    const { 'data/future.csv': data = '', 'runs/dry/daily.csv': daily = '', ...rest } = smallFiles;
    const text = smallStudy
      .replaceAll('data/future.csv', 'data/storyline.csv')
      .replaceAll('runs/dry/', 'runs/dry-2050/');
    const files = { ...rest, 'data/storyline.csv': data, 'runs/dry-2050/daily.csv': daily };
    const { seals: after, refused } = sealing(await recordsOf(text, files), seals);
    expect(refused).toEqual([]);
    expect(isUnmoved(after.get('runs.dry') as Seal, before)).toBe(false);
  });
});
