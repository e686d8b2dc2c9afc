import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { coveredDays, coveredTogether } from '../../src/facts/profiles/covered-days.ts';
import { profilesOf } from '../../src/facts/profiles.ts';
import { isDefined } from '../../src/hydrology/paired.ts';
import { readManifest } from '../../src/manifest/read.ts';
import { buildRecords } from '../../src/records/build.ts';
import { snapshotFromMemory } from '../../src/repository/memory.ts';
import { calendarYears } from '../../src/series/hydrological-year.ts';
import { daily, monthly, yearly } from '../../src/series/step.ts';

const paths = [
  'rain/fennock-bridge',
  'rain/high-tarrow',
  'rain/sallow-rigg',
  'check/lowfold',
  'flow/old-mill',
];
const texts = Object.fromEntries(
  paths.map((path) => [
    `data/${path}.csv`,
    readFileSync(new URL(`../../example-project/data/${path}.csv`, import.meta.url), 'utf8'),
  ]),
);
const gauges = Object.keys(texts).filter((path) => path.startsWith('data/rain/'));

async function profilesIn(inputs: string, files: Record<string, string> = texts) {
  const text = `stoplog: 1\nperiods: {year_begins: "10-01"}\ninputs:\n${inputs}`;
  const { manifest, problems } = readManifest('stoplog.yaml', text);
  if (manifest === null) throw new Error(JSON.stringify(problems));
  const snapshot = snapshotFromMemory(files);
  return profilesOf(await buildRecords(manifest, snapshot), snapshot);
}

const rain = `  rainfall:
    role: precipitation
    files: [data/rain/*.csv]
    combine: mean
    series: {time: date, values: rain_mm, unit: mm/d, step: P1D, missing: ["", -9.9]}
    compare_with: {input: check-gauge}
  check-gauge:
    role: precipitation
    files: [data/check/lowfold.csv]
    series: {time: date, values: rain_mm, unit: mm/d, step: P1D, missing: [""]}
`;

/** A second, plain reading of a file: dates and numbers by splitting text; null for what is missing. */
function plainly(path: string): readonly { readonly date: string; readonly value: number | null }[] {
  const lines = (texts[path] ?? '').trim().split('\n').slice(1);
  return lines.map((line) => {
    const [date = '', text = ''] = line.split(',');
    const value = text === '' || text === 'NA' ? null : Number(text);
    return { date, value: value === -9.9 ? null : value };
  });
}

const present = (values: readonly (number | null)[]): readonly number[] =>
  values.filter((value) => value !== null);
const sum = (values: readonly number[]): number => values.reduce((one, other) => one + other, 0);

function plainCorrelation(one: readonly number[], other: readonly number[]): number {
  const [meanOne, meanOther] = [sum(one) / one.length, sum(other) / other.length];
  const product = sum(one.map((value, index) => (value - meanOne) * ((other[index] ?? 0) - meanOther)));
  const square = (values: readonly number[], mean: number) => sum(values.map((value) => (value - mean) ** 2));
  return product / Math.sqrt(square(one, meanOne) * square(other, meanOther));
}

/** Lengths of the stretches of neighbours for which a text is the same. */
function plainRuns(keys: readonly string[]): readonly { readonly key: string; readonly length: number }[] {
  const runs: { key: string; length: number }[] = [];
  for (const key of keys) {
    const last = runs.at(-1);
    if (last?.key === key) last.length++;
    else runs.push({ key, length: 1 });
  }
  return runs;
}

describe('the profile of a file, against a plain second computation', async () => {
  const profile = (await profilesIn(rain)).get('rainfall');

  it.each(gauges)('%s', (path) => {
    const file = profile?.files.find((one) => one.path === path);
    const column = file?.columns[0];
    const rows = plainly(path);
    const values = rows.map(({ value }) => value);
    const there = present(values);
    expect(file).toMatchObject({ rows: rows.length, usualSeconds: 86_400, longestSeconds: 86_400 });
    expect(column).toMatchObject({
      name: 'rain_mm',
      values: there.length,
      missing: rows.length - there.length,
      absent: 0,
    });
    expect(column?.total).toBeCloseTo(sum(there), 8);
    const most = Math.max(...there);
    const place = values.indexOf(most);
    expect(column?.highest).toEqual({ value: most, line: place + 2, time: rows[place]?.date });
    expect(column?.rain?.day).toMatchObject({ mm: expect.closeTo(most, 9), first: { line: place + 2 } });
    const years = values.map((_, last) => sum(present(values.slice(Math.max(0, last - 365), last + 1))));
    expect(column?.rain?.year?.mm).toBeCloseTo(Math.max(...years), 6);
    const runs = plainRuns(values.map(String));
    const dry = runs
      .filter(({ key }) => key === '0')
      .map(({ length }) => length)
      .sort((a, b) => b - a);
    expect([column?.drySpells?.longest.steps, column?.drySpells?.nextSteps]).toEqual(dry.slice(0, 2));
    const equal = runs.filter(({ key, length }) => key !== '0' && key !== 'null' && length >= 3);
    expect(column?.equalRuns.map(({ steps }) => steps)).toEqual(
      equal
        .map(({ length }) => length)
        .sort((a, b) => b - a)
        .slice(0, 5),
    );
    expect(column?.negative.total).toBe(0);
  });

  it('holds the mean of the gauges against the check gauge on the days that all have', () => {
    const outcome = profile?.comparisons[0]?.outcome;
    if (outcome === undefined || !isDefined(outcome)) throw new Error('not compared');
    const check = plainly('data/check/lowfold.csv');
    const all = gauges.map((path) => plainly(path).map(({ value }) => value));
    const days = check.flatMap(({ date, value: reference }, day) => {
      const values = present(all.map((gauge) => gauge[day] ?? null));
      if (values.length < gauges.length || reference === null) return [];
      return [{ date, reference, checked: sum(values) / gauges.length }];
    });
    const { value } = outcome;
    expect(value.pairs).toBe(days.length);
    expect(value.totals?.checked).toBeCloseTo(sum(days.map(({ checked }) => checked)), 6);
    expect(value.totals?.reference).toBeCloseTo(sum(days.map(({ reference }) => reference)), 6);

    // Hydrological years from October, labelled by their end, with nine days in ten.
    const yearOf = (date: string) => Number(date.slice(0, 4)) + (Number(date.slice(5, 7)) >= 10 ? 1 : 0);
    const byYear = grouped(days, ({ date }) => yearOf(date));
    const whole = [...byYear].filter(([year, some]) => some.length / (year % 4 === 0 ? 366 : 365) >= 0.9);
    expect(value.years).toEqual(whole.map(([year]) => String(year)));
    const [checked, reference] = (['checked', 'reference'] as const).map((side) =>
      whole.map(([, some]) => sum(some.map((day) => day[side]))),
    );
    expect(value.biasPercent).toEqual({
      value: expect.closeTo(100 * (sum(checked ?? []) / sum(reference ?? []) - 1), 8),
    });
    expect(value.annualCorrelation).toEqual({
      value: expect.closeTo(plainCorrelation(reference ?? [], checked ?? []), 10),
    });
    // A day late or early: pairs of neighbouring days only.
    const lagged = (lag: number) => {
      const pairs = days.flatMap((day, index) => {
        const other = days[index + lag];
        const apart = other === undefined ? 0 : (Date.parse(other.date) - Date.parse(day.date)) / 86_400_000;
        return other !== undefined && apart === lag ? [[day.reference, other.checked] as const] : [];
      });
      return plainCorrelation(
        pairs.map(([one]) => one),
        pairs.map(([, other]) => other),
      );
    };
    expect(value.dayShift).toMatchObject({
      value: {
        sameDay: expect.closeTo(lagged(0), 10),
        oneDayLate: expect.closeTo(lagged(1), 10),
        oneDayEarly: expect.closeTo(lagged(-1), 10),
        days: 0,
      },
    });
  });

  it('gives the mean annual depth of the mean of the gauges', () => {
    const all = gauges.flatMap((path) => present(plainly(path).map(({ value }) => value)));
    expect(profile?.annualMm).toBeCloseTo((sum(all) / all.length) * 365.2425, 6);
  });
});

function grouped<T>(list: readonly T[], key: (one: T) => number): Map<number, T[]> {
  const groups = new Map<number, T[]>();
  for (const one of list) groups.set(key(one), [...(groups.get(key(one)) ?? []), one]);
  return groups;
}

describe('the profile of an input', () => {
  it('compares each file alone where each is a series of its own', async () => {
    const profiles = await profilesIn(rain.replace('combine: mean', 'combine: each'));
    const held = profiles.get('rainfall')?.comparisons ?? [];
    expect(held.map(({ file }) => file)).toEqual(gauges);
    const bias = held.map(({ outcome }) => isDefined(outcome) && outcome.value.biasPercent);
    expect(new Set(bias.map((one) => JSON.stringify(one))).size).toBe(3);
  });

  it('compares weighted gauges as their weights say', async () => {
    const weights = `{weights: {${gauges.map((path, index) => `${path}: ${index === 0 ? 1 : 0}`).join(', ')}}}`;
    const weighted = (await profilesIn(rain.replace('combine: mean', `combine: ${weights}`))).get('rainfall');
    const alone = (await profilesIn(rain.replace('data/rain/*.csv', gauges[0] ?? ''))).get('rainfall');
    expect(weighted?.comparisons[0]).toEqual(alone?.comparisons[0]);
    // And each gauge alone, since one of them may have a fault that the mean hides.
    expect(weighted?.comparisons.map(({ file }) => file)).toEqual([null, ...gauges]);
  });

  it('tells runoff over the catchment', async () => {
    const flow = `  flow:
    role: streamflow
    files: [data/flow/old-mill.csv]
    series: {time: date, values: flow_m3s, unit: m3/s, step: P1D, missing: [NA]}
catchment: {area: {value: 14800, unit: ha}}
`;
    const values = present(plainly('data/flow/old-mill.csv').map(({ value }) => value));
    const mm = (sum(values) / values.length) * (86.4 / 148) * 365.2425;
    expect((await profilesIn(flow)).get('flow')?.annualMm).toBeCloseTo(mm, 6);
  });

  it('says what is incomplete, and leaves out inputs that hold no series here', async () => {
    const inputs = `  a: {role: precipitation, files: [data/rain/high-tarrow.csv, {path: away.csv, sha256: "${'0'.repeat(64)}"}], stored: elsewhere, series: {time: date, values: rain_mm}}
  b: {role: terrain, files: [data/check/lowfold.csv]}
  c: {role: precipitation, files: [none.csv], series: {time: date, values: rain_mm}}
`;
    const profiles = await profilesIn(inputs);
    expect([...profiles.keys()]).toEqual(['a']);
    expect(profiles.get('a')).toMatchObject({ isComplete: false, step: null });
  });
});

describe('the days that a file covers', () => {
  const day = 86_400;
  const file = (first: number, last: number) => ({ firstSeconds: first, lastSeconds: last }) as never;
  it.each([
    ['days', daily, file(0, 9 * day), { firstDay: 0, lastDay: 9 }],
    ['months, the last to its end', monthly, file(0, 31 * day), { firstDay: 0, lastDay: 58 }],
    ['calendar years', yearly, file(0, 365 * day), { firstDay: 0, lastDay: 729 }],
    ['samples', null, file(0.5 * day, 9.5 * day), { firstDay: 0, lastDay: 9 }],
    [
      'hours labelled by their begin',
      { kind: 'seconds', length: 3600 },
      file(0, day - 3600),
      { firstDay: 0, lastDay: 0 },
    ],
    [
      'hours labelled by their end',
      { kind: 'seconds', length: 3600 },
      file(3600, day),
      { firstDay: 0, lastDay: 0 },
    ],
  ] as const)('%s', (_, step, of, days) => expect(coveredDays(of, step, calendarYears)).toEqual(days));

  it('hydrological years by the year they end in', () => {
    // 1971 from October 1970 (day 273) to September 1971 (day 637).
    expect(coveredDays(file(365 * day, 365 * day), yearly, { month: 10, day: 1 })).toEqual({
      firstDay: 273,
      lastDay: 637,
    });
  });

  it('of several files: those of all for a mean, first to last else', () => {
    const files = [
      { firstDay: 0, lastDay: 9 },
      { firstDay: 5, lastDay: 20 },
    ];
    expect(coveredTogether(files, 'mean')).toEqual({ firstDay: 5, lastDay: 9 });
    expect(coveredTogether(files, undefined)).toEqual({ firstDay: 0, lastDay: 20 });
    expect(coveredTogether([...files, { firstDay: 30, lastDay: 31 }], 'sum')).toBeNull();
  });
});
