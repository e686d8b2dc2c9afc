import { execFileSync } from 'node:child_process';
import { cp, mkdtemp, readFile, realpath, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { gitIn } from '../harness/repository.ts';

// Another kind of study than the example: monthly loads at two gauges, a land-cover scenario, semicolons and decimal commas,
// outputs in fixed columns.
describe('monthly loads at two gauges', () => {
  let folder = '';
  beforeAll(async () => {
    folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-loads-')));
    await cp(join(import.meta.dirname, 'loads'), folder, { recursive: true });
    execFileSync(process.execPath, [join(folder, 'make.mjs'), folder]);
    const git = gitIn(folder);
    await git('init', '--quiet', '--initial-branch', 'main');
    await git('add', '--all');
    const { status, text, failure } = await stoplog(folder, ['seal', '--all'], '2012-03-25');
    if (status !== 0) throw failure ?? new Error(text);
    await git('add', '--all');
    await git('commit', '--quiet', '--message', 'Sealed');
  }, 60_000);
  afterAll(() => rm(folder, { recursive: true, force: true }));

  it('is sound: nothing blocks, and nothing is doubtful', async () => {
    const { status, found, verdict } = await check(folder);
    expect(found).toEqual(['scenarios.beyond-range scenarios.more-arable']);
    expect(status).toBe(0);
    const [study] = verdict.manifests;
    expect(study?.records.filter(({ state }) => state !== 'sound')).toEqual([]);
    const grades = new Map(study?.records.map(({ id, grade }) => [id, grade]));
    for (const id of [
      'inputs.rain',
      'inputs.sediment.lower',
      'evaluation.sediment-upper',
      'evaluation.phosphorus.lower',
      'balance.catchment',
      'scenarios.more-arable',
    ])
      expect.soft(grades.get(id), id).toBe('recomputed');
  });

  it('states scores that the formulas give, read in another way', async () => {
    const lines = async (path: string) => (await readFile(join(folder, path), 'utf8')).trimEnd().split('\n');
    const number = (text: string) => (text.trim() === '' ? Number.NaN : Number(text.replace(',', '.')));
    const observed = (await lines('data/sediment/lower.csv')).slice(1).map((row) => number(row.slice(8)));
    const simulated = (await lines('runs/present/lower.txt')).slice(2).map((row) => number(row.slice(8, 19)));
    // Validation from January 2007 on: 84 months after the first.
    const months = [...observed.keys()].filter((place) => place >= 84 && !Number.isNaN(observed[place]));
    const [o, s] = [observed, simulated].map((values) => months.map((place) => values[place] ?? 0));
    const sum = (values: readonly number[] = []) => values.reduce((total, value) => total + value, 0);
    const errors = (o ?? []).map((value, place) => value - (s?.[place] ?? 0));
    const mean = sum(o) / months.length;
    const nse = 1 - sum(errors.map((error) => error ** 2)) / sum(o?.map((value) => (value - mean) ** 2));
    const row = (await lines('evaluation/scores.csv')).find((one) =>
      one.startsWith('sediment-lower;validation'),
    );
    const comma = (value: number, decimals: number) => value.toFixed(decimals).replace('.', ',');
    // Nash & Sutcliffe 1970; PBIAS as in Moriasi et al. 2007, eq. 2
    expect(row?.split(';').slice(2, 4)).toEqual([comma(nse, 2), comma((100 * sum(errors)) / sum(o), 1)]);
  });
});
