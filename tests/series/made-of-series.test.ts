import { describe, expect, it } from 'vitest';
import { isDefined, type Statistic } from '../../src/hydrology/paired.ts';
import { aggregate, aggregated } from '../../src/series/aggregate.ts';
import { combine } from '../../src/series/combine.ts';
import { convertSeries } from '../../src/series/convert-series.ts';
import { gapsOf } from '../../src/series/gaps.ts';
import { columnOf, joinSeries, type Series } from '../../src/series/series.ts';
import { daily, formatTime, irregular, monthly, parseStep, yearly } from '../../src/series/step.ts';
import { at, entriesOf, seriesOf } from './made.ts';
import { plain, read } from './told.ts';

const hourly = parseStep('PT1H') ?? irregular;
const entries = (series: Series) => entriesOf(series, (time) => formatTime(time, series.step));

function value<T>(statistic: Statistic<T>): T {
  if (!isDefined(statistic)) throw new Error(statistic.undefined);
  return statistic.value;
}

/** One value for each hour of some days. */
function hours(first: string, values: readonly (number | null)[], unit = 'mm'): Series {
  return {
    unit,
    step: hourly,
    timeSeconds: Float64Array.from(values, (_, hour) => at(first) + hour * 3600),
    values: Float64Array.from(values, (each) => each ?? Number.NaN),
  };
}

describe('aggregation', () => {
  it('says how much of a month is there', () => {
    const series = seriesOf(daily, { '2010-01-30': 1, '2010-01-31': 2, '2010-02-02': 4 });
    const groups = aggregate(series, { by: 'month', how: 'total', completeness: 'every-step' });
    expect(groups.map(({ label, value }) => [label, value])).toEqual([
      ['2010-01', { undefined: '2 of 31 values are there, and 29 in a row are missing' }],
      ['2010-02', { undefined: '1 of 28 values are there, and 26 in a row are missing' }],
    ]);
    expect(groups.map(({ presentSum }) => presentSum)).toEqual([3, 4]);
  });

  it('takes hours to days, and no mean of a day that lacks one', () => {
    const flows = [
      ...Array.from({ length: 24 }, (_, hour) => hour),
      ...Array.from({ length: 23 }, () => 1),
      null,
    ];
    expect(
      entries(aggregated(hours('2010-01-01', flows), { by: 'day', how: 'mean', completeness: 'every-step' })),
    ).toEqual({
      '2010-01-01': 11.5, // (0 + 1 + ... + 23) / 24
      '2010-01-02': null,
    });
  });

  it('takes months to hydrological years', () => {
    const months = Object.fromEntries(
      Array.from({ length: 24 }, (_, month) => [
        `${2010 + Math.floor((month + 9) / 12)}-${String(((month + 9) % 12) + 1).padStart(2, '0')}-01`,
        month < 12 ? 1 : 2,
      ]),
    );
    const years = aggregated(seriesOf(monthly, months), {
      by: 'year',
      how: 'total',
      completeness: 'every-step',
      yearBegins: { month: 10, day: 1 },
    });
    expect(entries(years)).toEqual({ 2011: 12, 2012: 24 });
    expect(years.step).toEqual(yearly);
  });

  it('counts only the months asked for, over the turn of the year too', () => {
    const months = Object.fromEntries(
      ['2009-11', '2009-12', '2010-01', '2010-02', '2010-03', '2010-10'].map((month, index) => [
        `${month}-01`,
        10 ** index,
      ]),
    );
    const of = (ends: readonly [number, number]) =>
      entries(
        aggregated(seriesOf(monthly, months), {
          by: 'year',
          how: 'total',
          completeness: 'every-step',
          yearBegins: { month: 10, day: 1 },
          months: ends,
        }),
      );
    expect(of([11, 2])).toEqual({ 2010: 1111, 2011: null });
    expect(of([3, 3])).toEqual({ 2010: 10_000, 2011: null });
  });

  it('takes means of samples, where any number suffices', () => {
    const samples = seriesOf(irregular, { '2010-01-05': 1, '2010-01-20T10': 2, '2010-03-01': 7 });
    expect(entries(aggregated(samples, { by: 'month', how: 'mean', completeness: 'any' }))).toEqual({
      '2010-01': 1.5,
      '2010-02': null,
      '2010-03': 7,
    });
  });

  it('has nothing of nothing', () => {
    expect(aggregate(seriesOf(daily, {}), { by: 'year', how: 'mean', completeness: 'any' })).toEqual([]);
  });
});

describe('several files', () => {
  const one = seriesOf(daily, { '2010-01-01': 1, '2010-01-02': 2, '2010-01-03': null, '2010-01-04': 4 });
  const other = seriesOf(daily, { '2010-01-01': 3, '2010-01-02': 6, '2010-01-03': 9, '2010-01-05': 15 });
  const parts = new Map([
    ['data/one.csv', one],
    ['data/other.csv', other],
  ]);

  it.each([
    ['mean' as const, { '2010-01-01': 2, '2010-01-02': 4 }],
    ['sum' as const, { '2010-01-01': 4, '2010-01-02': 8 }],
    [{ weights: { 'data/one.csv': 3, 'data/other.csv': 1 } }, { '2010-01-01': 1.5, '2010-01-02': 3 }],
  ])('make a %o of those steps that all of them have', (combination, both) => {
    expect(entries(value(combine(parts, combination)))).toEqual({
      ...both,
      '2010-01-03': null,
      '2010-01-04': null,
      '2010-01-05': null,
    });
  });

  it('leave out one whose weight is zero', () => {
    const alone = combine(parts, { weights: { 'data/one.csv': 0, 'data/other.csv': 2 } });
    expect(entries(value(alone))).toMatchObject({ '2010-01-03': 9, '2010-01-05': 15 });
  });

  it('follow one another where nothing is said, and a time that two hold has no value', () => {
    const early = seriesOf(daily, { '2009-12-30': 30, '2010-01-01': 31 });
    expect(
      entries(
        value(
          combine(
            new Map([
              ['later', one],
              ['early', early],
            ]),
            undefined,
          ),
        ),
      ),
    ).toEqual({
      '2009-12-30': 30,
      '2010-01-01': null,
      '2010-01-02': 2,
      '2010-01-03': null,
      '2010-01-04': 4,
    });
    expect(joinSeries([one])).toBe(one);
  });

  it('say why they make nothing', () => {
    const why = (combined: Statistic<Series>) => ('undefined' in combined ? combined.undefined : '');
    expect(why(combine(new Map(), 'mean'))).toBe('there is no series to combine');
    expect(why(combine(parts, { weights: { 'data/one.csv': 1 } }))).toBe('data/other.csv has no weight');
    expect(why(combine(parts, { weights: { 'data/one.csv': 0, 'data/other.csv': 0 } }))).toBe(
      'the weights add up to nothing',
    );
    expect(
      why(
        combine(
          new Map([
            ['a', one],
            ['b', seriesOf(monthly, {})],
          ]),
          'sum',
        ),
      ),
    ).toBe('b has the step P1M, others P1D');
    expect(
      why(
        combine(
          new Map([
            ['a', one],
            ['b', seriesOf(daily, {}, 'in')],
          ]),
          'sum',
        ),
      ),
    ).toBe('b is in in, others in mm');
  });
});

describe('series in other units', () => {
  const flow = seriesOf(daily, { '2010-01-01': 1, '2010-01-02': null, '2010-01-03': 4.8 }, 'm3/s');

  it('turn flow over an area into depth and back', () => {
    // mm/d = m3/s x 86.4 / km2
    const depth = value(convertSeries(flow, 'mm/d', { areaKm2: 250 }));
    expect(depth.unit).toBe('mm/d');
    expect(depth.values[0]).toBeCloseTo(0.3456, 12);
    expect(depth.values[1]).toBeNaN();
    const back = value(convertSeries(depth, 'm3 s-1', { areaKm2: 250 }));
    expect(back.values[2]).toBeCloseTo(4.8, 12);
  });

  it('turn a rate into the amount of each step', () => {
    expect(value(convertSeries(hours('2010-01-01', [24, 48], 'mm/d'), 'mm')).values).toEqual(
      Float64Array.of(1, 2),
    );
    expect(value(convertSeries(flow, 'mm', { areaKm2: 86.4 })).values[0]).toBeCloseTo(1, 12);
    expect(value(convertSeries(seriesOf(daily, { '2010-01-01': 5 }, 'mm'), 'mm/h')).values[0]).toBeCloseTo(
      5 / 24,
      12,
    );
  });

  it('give each month its own length', () => {
    const rain = seriesOf(monthly, { '2011-02-01': 28, '2012-02-01': 29 }, 'mm/month');
    expect([...value(convertSeries(rain, 'mm/d')).values].map((each) => each.toFixed(12))).toEqual([
      '1.000000000000',
      '1.000000000000',
    ]);
    expect([...value(convertSeries(rain, 'mm')).values]).toEqual([28, 29]);
    expect(
      [...value(convertSeries({ ...rain, step: yearly, unit: 'mm/yr' }, 'mm')).values].map(Math.round),
    ).toEqual([28, 29]);
  });

  it('shift temperatures', () => {
    expect(value(convertSeries(seriesOf(daily, { '2010-01-01': 50 }, 'degF'), 'degC')).values[0]).toBeCloseTo(
      10,
      10,
    );
  });

  it.each([
    ['m3/s', 'mm/d', {}, 'an area is needed'],
    ['m3/s', 'mm/d', { areaKm2: 0 }, 'the area is not above zero'],
    ['kg m-2 s-1', 'mm/d', {}, 'without its density'],
    ['mm/month', 'mm/d', {}, 'no fixed length'],
    ['degC', 'mm', {}, 'different things'],
    ['', 'mm', {}, 'no unit is stated'],
    ['mm', 'parsec', {}, 'is no unit'],
  ])('from "%s" to %s is refused with its reason', (from, to, over, reason) => {
    const refused = convertSeries(seriesOf(daily, { '2010-01-01': 1 }, from), to, over);
    expect(refused).toMatchObject({ undefined: expect.stringContaining(reason) });
  });

  it('need a step to count amounts with', () => {
    expect(convertSeries(seriesOf(irregular, { '2010-01-01': 1 }, 'mm/d'), 'mm')).toMatchObject({
      undefined: expect.stringContaining('has no step'),
    });
  });
});

describe('gaps', () => {
  it('are missing values and absent rows together, up to the last row', () => {
    const series = seriesOf(daily, {
      '2010-01-01': null,
      '2010-01-02': 2,
      '2010-01-03': null,
      '2010-01-06': 6,
      '2010-01-08': null,
    });
    expect(gapsOf(series)).toEqual([
      { firstSeconds: at('2010-01-01'), lastSeconds: at('2010-01-01'), steps: 1 },
      { firstSeconds: at('2010-01-03'), lastSeconds: at('2010-01-05'), steps: 3 },
      { firstSeconds: at('2010-01-07'), lastSeconds: at('2010-01-08'), steps: 2 },
    ]);
    expect(gapsOf(seriesOf(daily, {}))).toEqual([]);
  });

  it('are rows without a value among samples', () => {
    const samples = seriesOf(irregular, {
      '2010-01-01': 1,
      '2010-03-01': null,
      '2010-03-09': null,
      '2010-04-01': 4,
    });
    expect(gapsOf(samples)).toEqual([
      { firstSeconds: at('2010-03-01'), lastSeconds: at('2010-03-09'), steps: 2 },
    ]);
  });
});

describe('columns of a table', () => {
  it('are taken by name or place, and asked for in vain with an error', async () => {
    const table = await read('date,soil,deep\n2010-01-01,1,2\n', {
      ...plain,
      values: ['soil', 'deep'],
      unit: 'mm',
    });
    expect(entries(columnOf(table, 'deep'))).toEqual({ '2010-01-01': 2 });
    expect(columnOf(table, 2)).toEqual(columnOf(table, 'deep'));
    expect(columnOf(table).values).toEqual(Float64Array.of(1));
    expect(() => columnOf(table, 'snow')).toThrow('flow.csv was read without the column snow');
  });
});
