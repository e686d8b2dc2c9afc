import { describe, expect, it } from 'vitest';
import { Failure } from '../failure.ts';
import { rules } from '../rules/index.ts';
import type { Context } from './command.ts';
import { rulesCommand } from './rules.ts';

async function said(id?: string): Promise<string> {
  const written: string[] = [];
  const context: Context = {
    cwd: '.',
    environment: {},
    today: '2021-03-01',
    color: false,
    write: (text) => void written.push(text),
    tell: () => {},
    progress: () => {},
  };
  expect(await rulesCommand(context, id)).toBe(0);
  return written.join('');
}

describe('stoplog rules', () => {
  it('lists every rule', async () => {
    const text = await said();
    expect(rules.filter(({ id }) => !text.includes(`${id} `))).toEqual([]);
    expect(text.split('\n').filter((line) => line.length > 100)).toEqual([]);
  });

  it('explains one', async () => {
    const text = await said('periods.warm-up-short');
    expect(text).toMatch(/^periods\.warm-up-short\n/);
    expect(text).toMatch(/fires when {3}.*\n/);
    expect(text).toContain('why');
    expect(text).toContain('to clear');
    expect(text).toContain('periods.warm_up_days: 365 d.');
  });

  it('tells from when a rule blocks, and what kind of source it has', async () => {
    expect(await said('seal.stale')).toContain('blocks from calibration, warns before');
    expect(await said('seal.stale')).toContain('Follows from the words.');
    expect(await said('waiver.unused')).toContain('warns');
    expect(await said('study.purpose-missing')).toContain('EPA QA/G-5M');
  });

  it('offers the nearest for an id that no rule has', async () => {
    await expect(said('seal.stael')).rejects.toThrow(Failure);
    await expect(said('seal.stael')).rejects.toMatchObject({
      code: 'usage',
      next: expect.stringContaining('stoplog rules seal.stale'),
    });
    await expect(said('weather')).rejects.toMatchObject({ next: expect.stringContaining('lists them all') });
  });
});
