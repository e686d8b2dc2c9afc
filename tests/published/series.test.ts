import { createReadStream, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { isDefined } from '../../src/hydrology/paired.ts';
import { type Aggregation, aggregate, type Completeness, type Group } from '../../src/series/aggregate.ts';
import { formatDate, parseDate, secondsOfDay, windowDays } from '../../src/series/calendar.ts';
import { convertSeries } from '../../src/series/convert-series.ts';
import { gapsOf } from '../../src/series/gaps.ts';
import { pairByDate } from '../../src/series/pair.ts';
import { readSeries } from '../../src/series/read.ts';
import { columnOf, type Series } from '../../src/series/series.ts';
import { daily } from '../../src/series/step.ts';
import { plain } from './columns.ts';

interface Case {
  readonly id: string;
  readonly source: string;
  readonly input: never;
  readonly expect: never;
}

const published = JSON.parse(readFileSync('tests/published/series-cases.json', 'utf8')) as {
  readonly removed_days: readonly string[];
  readonly cases: readonly Case[];
};

const seattleFile = 'node_modules/vega-datasets/data/seattle-weather.csv';

async function seattle(column: string, removed: readonly string[] = []): Promise<Series> {
  const layout = { time: 'date', values: column, unit: 'mm', step: 'P1D', missing: ['-'] };
  const table = await readSeries(createReadStream(seattleFile), layout, seattleFile);
  expect(table.problems.total).toBe(0);
  const series = columnOf(table);
  const away = new Set(removed.map((date) => (parseDate(date) ?? Number.NaN) * secondsOfDay));
  const stays = (_: number, row: number) => !away.has(series.timeSeconds[row] ?? Number.NaN);
  return {
    ...series,
    timeSeconds: series.timeSeconds.filter(stays),
    values: series.values.filter(stays),
  };
}

const waterYears = { month: 10, day: 1 };
const figureOf = ({ value }: Group) => plain(value);

function windowOf([first, last]: readonly [string, string]) {
  return { firstDay: parseDate(first) ?? Number.NaN, lastDay: parseDate(last) ?? Number.NaN };
}

async function months(input: { readonly column: string }, how: Aggregation['how']): Promise<unknown> {
  const series = await seattle(input.column, published.removed_days);
  const by = (completeness: Completeness) =>
    aggregate(series, { by: 'month', how, completeness }).slice(0, 7);
  const [any, strict, elevenFive, threeFive] = [
    by('any'),
    by('every-step'),
    by('eleven-five'),
    by('three-five'),
  ];
  return any.map((group, month) => ({
    month: group.label,
    days: group.steps,
    missing: group.missing,
    longest_gap: group.longestGap,
    value_of_present_days: figureOf(group),
    strict: figureOf(strict[month] as Group),
    wmo_11_5: figureOf(elevenFive[month] as Group),
    wmo_3_5: figureOf(threeFive[month] as Group),
  }));
}

/** Days of a window, rows of the daily record in it that pair with themselves, and leap days. */
async function window(input: { readonly window: readonly [string, string] }): Promise<unknown> {
  const file = 'tests/published/data/rr-daily.csv';
  const layout = { time: 'date', values: 'sim_m3s', step: 'P1D' };
  const series = columnOf(await readSeries(createReadStream(file), layout, file));
  const days = windowOf(input.window);
  const paired = pairByDate({ observed: series, simulated: series, windows: [days] });
  const dates = Array.from({ length: windowDays(days) }, (_, day) => formatDate(days.firstDay + day));
  return {
    days: windowDays(days),
    rows: isDefined(paired) ? paired.value.observed.length : null,
    leap_days: dates.filter((date) => date.endsWith('-02-29')).length,
  };
}

const answers: Readonly<Record<string, (input: never) => unknown>> = {
  'dates/warmup': window,
  'dates/cal': window,
  'dates/val': window,
  'dates/leap': (input: { readonly windows: readonly (readonly [string, string])[] }) =>
    input.windows.map((ends) => ({ days: windowDays(windowOf(ends)) })),
  'aggregate/water-years': async () => {
    const rain = await seattle('precipitation');
    const strict = { by: 'year', how: 'total', completeness: 'every-step', yearBegins: waterYears } as const;
    return aggregate(rain, strict).map((group) => ({
      water_year: Number(group.label),
      expected_days: group.steps,
      present_days: group.steps - group.missing,
      total: group.presentSum,
      complete: isDefined(group.value),
    }));
  },
  'aggregate/calendar-years': async () => {
    const rain = await seattle('precipitation');
    return aggregate(rain, { by: 'year', how: 'total', completeness: 'every-step' }).map((group) => ({
      year: Number(group.label),
      days: group.steps,
      total: figureOf(group),
    }));
  },
  'aggregate/incomplete-months-total': (input: { readonly column: string }) => months(input, 'total'),
  'aggregate/incomplete-months-mean': (input: { readonly column: string }) => months(input, 'mean'),
  'aggregate/gaps': async (input: { readonly column: string }) => {
    const series = await seattle(input.column, published.removed_days);
    return gapsOf(series).map(({ firstSeconds, lastSeconds, steps }) => [
      formatDate(firstSeconds / secondsOfDay),
      formatDate(lastSeconds / secondsOfDay),
      steps,
    ]);
  },
  'units/m3s-to-mm': (input: { readonly area_km2: number; readonly flow_m3s: readonly number[] }) => {
    const values = Float64Array.from(input.flow_m3s);
    const timeSeconds = values.map((_, day) => day * secondsOfDay);
    const depth = convertSeries({ unit: 'm3/s', step: daily, timeSeconds, values }, 'mm/d', {
      areaKm2: input.area_km2,
    });
    return isDefined(depth) ? [...depth.value.values] : null;
  },
};

describe('dates, aggregates and units as libraries have them', () => {
  it('covers every case', () => {
    expect(Object.keys(answers).sort()).toEqual(published.cases.map(({ id }) => id).sort());
  });

  for (const { id, source, input, expect: expected } of published.cases)
    it(`${id} (${source})`, async () => {
      agree(await answers[id]?.(input), expected, id);
    });
});

function agree(actual: unknown, expected: unknown, where: string): void {
  if (typeof expected === 'number') {
    expect(actual, where).toBeTypeOf('number');
    const slack = Number.isInteger(expected) && !where.endsWith('total') ? 0 : 1e-9 * Math.abs(expected);
    expect(Math.abs(Number(actual) - expected), `${where}: ${actual}, not ${expected}`).toBeLessThanOrEqual(
      slack,
    );
  } else if (typeof expected === 'object' && expected !== null) {
    expect(Object.keys(Object(actual)).sort(), where).toEqual(Object.keys(expected).sort());
    for (const [key, part] of Object.entries(expected))
      agree((actual as Readonly<Record<string, unknown>>)[key], part, `${where} ${key}`);
  } else expect(actual, where).toBe(expected);
}

describe("Seattle's daily rain, from the package's own file", () => {
  it('is read whole, and its totals are those of a plain second computation', async () => {
    const rain = await seattle('precipitation');
    const lines = readFileSync(seattleFile, 'utf8').trim().split(/\r?\n/).slice(1);
    const cells = lines.map((line) => line.split(','));
    expect([...rain.timeSeconds]).toEqual(cells.map(([date]) => Date.parse(String(date)) / 1000));
    expect([...rain.values]).toEqual(cells.map(([, millimetres]) => Number(millimetres)));
    expect(rain.values.length).toBe(1461);
    const totals = new Map<string, number>();
    for (const [date = '', millimetres] of cells) {
      const month = date.slice(0, 7);
      totals.set(month, (totals.get(month) ?? 0) + Number(millimetres));
    }
    const ours = aggregate(rain, { by: 'month', how: 'total', completeness: 'every-step' });
    expect(ours.map((group) => [group.label, figureOf(group)])).toEqual([...totals]);
  });
});
