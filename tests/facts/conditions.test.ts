import { describe, expect, it } from 'vitest';
import { evidenceFor } from '../../src/facts/evidence.ts';
import { figuresToWrite } from '../../src/facts/figures.ts';
import { isDefined } from '../../src/hydrology/paired.ts';
import { fieldName } from '../../src/manifest/manifest.ts';
import { snapshotFromMemory } from '../../src/repository/memory.ts';
import { soundFiles } from '../harness/sound-files.ts';
import { manifestText, type StudyEdits, studyFacts } from '../harness/study.ts';

const files = soundFiles();

/** Sums of a column by hydrological year (October to September), read in the plainest way. */
function yearSums(path: string, column: string, months: readonly number[], first: number, last: number) {
  const [head = '', ...rows] = (files[path] ?? '').trimEnd().split('\n');
  const place = head.split(',').indexOf(column);
  const sums = new Map<number, number>();
  for (const row of rows) {
    const [year = 0, month = 0] = row.slice(0, 7).split('-').map(Number);
    const label = month >= 10 ? year + 1 : year;
    if (!months.includes(month) || label < first || label > last) continue;
    sums.set(label, (sums.get(label) ?? 0) + Number(row.split(',')[place]));
  }
  return sums;
}

const all = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12];

async function condition(name: string, edits: StudyEdits = {}) {
  const { scenarios } = await studyFacts(edits);
  const figures = scenarios.conditions.get(name)?.figures;
  if (figures === undefined || !isDefined(figures)) throw new Error(JSON.stringify(figures));
  return figures.value;
}

describe('calibrated conditions', () => {
  it('are the totals of the years of the calibration', async () => {
    const found = await condition('annual_rainfall');
    const sums = yearSums('data/rain.csv', 'rain_mm', all, 2004, 2007);
    expect(found.labels).toEqual([...sums.keys()].map(String));
    for (const [place, sum] of [...sums.values()].entries()) expect(found.values[place]).toBeCloseTo(sum, 8);
    expect([found.lowest, found.highest]).toEqual([Math.min(...found.values), Math.max(...found.values)]);
  });

  it.each([
    ['a summer', [4, 9]],
    ['a winter, over the turn of the year', [11, 2]],
  ])('of %s', async (_, [from = 0, to = 0]) => {
    const months = all.filter((month) =>
      from <= to ? month >= from && month <= to : month >= from || month <= to,
    );
    const found = await condition('annual_rainfall', {
      set: { 'scenarios.conditions.annual_rainfall.months': [from, to] },
    });
    const sums = yearSums('data/rain.csv', 'rain_mm', months, 2004, 2007);
    expect(found.values.map((value) => value.toFixed(6))).toEqual(
      [...sums.values()].map((sum) => sum.toFixed(6)),
    );
  });

  it('by the month and by the step', async () => {
    const monthly = await condition('annual_rainfall', {
      set: { 'scenarios.conditions.annual_rainfall.by': 'month' },
    });
    expect(monthly.labels).toHaveLength(48);
    expect(monthly.labels[0]).toBe('2003-10');
    const daily = await condition('annual_rainfall', {
      set: { 'scenarios.conditions.annual_rainfall.by': 'step' },
    });
    // Four years, one of them with a leap day.
    expect(daily.values).toHaveLength(4 * 365 + 1);
    // The 90th percentile (type 7) of a series that is dry on three of four days.
    const sorted = daily.values.toSorted((a, b) => a - b);
    const at = 0.9 * (sorted.length - 1);
    const [below = 0, above = 0] = [sorted[Math.floor(at)], sorted[Math.ceil(at)]];
    expect(daily.p90).toBeCloseTo(below + (at - Math.floor(at)) * (above - below), 9);
  });

  it('in the unit that is stated, through the length of each step', async () => {
    const inches = await condition('annual_rainfall', {
      set: { 'scenarios.conditions.annual_rainfall.unit': 'in' },
    });
    const mm = await condition('annual_rainfall');
    expect(inches.mean * 25.4).toBeCloseTo(mm.mean, 8);
  });

  it('leave out years that are not whole, and say how many', async () => {
    const found = await condition('annual_rainfall', {
      files: { 'data/rain.csv': (old) => old.replace(/^2005-05-05,.*\n/m, '') },
    });
    expect(found.labels).toEqual(['2004', '2006', '2007']);
    expect(found.incomplete).toBe(1);
  });

  it('keep a mean with a few days missing', async () => {
    const found = await condition('annual_rainfall', {
      set: {
        'scenarios.conditions.annual_rainfall.total': false,
        'scenarios.conditions.annual_rainfall.unit': 'mm/d',
      },
      files: { 'data/rain.csv': (old) => old.replace(/^2005-05-05,.*\n/m, '') },
    });
    expect(found.labels).toHaveLength(4);
    expect(found.values[0]).toBeCloseTo(
      (yearSums('data/rain.csv', 'rain_mm', all, 2004, 2004).get(2004) ?? 0) / 366,
      8,
    );
  });

  it('over windows with years between', async () => {
    const found = await condition('annual_rainfall', {
      set: { 'periods.calibration': ['2003-10-01/2005-09-30', '2006-10-01/2007-09-30'] },
    });
    expect(found.labels).toEqual(['2004', '2005', '2007']);
  });
});

describe('drivers of a scenario', () => {
  it('are those of its own run, its warm-up kept out', async () => {
    const { scenarios } = await studyFacts();
    const driver = scenarios.cases.get('scenarios.dry')?.drivers.get('annual_rainfall');
    if (driver === undefined || !isDefined(driver.figures)) throw new Error('no figures');
    const sums = yearSums('data/dry-rain.csv', 'rain_mm', all, 2044, 2050);
    expect(driver.figures.value.labels).toEqual([...sums.keys()].map(String));
    expect(driver.figures.value.mean).toBeCloseTo([...sums.values()].reduce((a, b) => a + b, 0) / 7, 8);
    expect(driver.envelope).toMatchObject({ value: { stepsAboveHigh: 0 } });
  });

  it('say so where content is not here', async () => {
    const { scenarios } = await studyFacts({
      files: {
        'data/dry-rain.csv': `version https://git-lfs.github.com/spec/v1\noid sha256:${'a'.repeat(64)}\nsize 12\n`,
      },
    });
    expect(scenarios.cases.get('scenarios.dry')?.drivers.get('annual_rainfall')).toMatchObject({
      away: 'not-fetched',
    });
  });
});

describe('figures of conditions and drivers', () => {
  const place = 'scenarios.conditions.annual_rainfall.stated';

  it('are written where they are stated otherwise, or not at all', async () => {
    const written = async (edits: StudyEdits) =>
      Object.fromEntries(
        figuresToWrite(await studyFacts(edits))
          .filter(({ record }) => record === 'scenarios.dry')
          .map(({ field, found }) => [fieldName(field), found]),
      );
    // 1 050 mm; the summer's 428.652 mm with four digits that count
    expect(await written({})).toMatchObject({
      [`${place}.mean`]: 1050,
      'scenarios.conditions.summer_evapotranspiration.stated.mean': 428.7,
      'scenarios.cases.dry.drivers.annual_rainfall.stated.lowest': 987,
    });
    const some = await written({ set: { [place]: { mean: 1049.5, lowest: 981 } } });
    expect(Object.keys(some).filter((field) => field.startsWith(place))).toEqual([`${place}.mean`]);
  });

  it('make a scenario recomputed where all that are stated hold', async () => {
    const grade = async (mean: number) => {
      const set = { [place]: { mean } };
      const { records, standings, manifest } = await studyFacts({ set });
      const snapshot = snapshotFromMemory({ ...files, 'stoplog.yaml': manifestText({ set }) });
      return (await evidenceFor({ records, standings, manifest }, snapshot)).get('scenarios.dry');
    };
    expect(await grade(1050)).toMatchObject({
      grade: 'recomputed',
      facts: { 'condition annual_rainfall.mean': { value: 1050 } },
    });
    expect((await grade(1051))?.grade).toBe('sealed');
  });
});
