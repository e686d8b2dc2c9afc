import { describe, expect, it } from 'vitest';
import { annualDepthMm } from '../../src/facts/profiles/as-depth.ts';
import { comparisonOf } from '../../src/facts/profiles/comparison.ts';
import { isDefined } from '../../src/hydrology/paired.ts';
import { aggregated } from '../../src/series/aggregate.ts';
import { calendarYears } from '../../src/series/hydrological-year.ts';
import type { Series } from '../../src/series/series.ts';
import { daily, irregular, monthly, type Step, yearly } from '../../src/series/step.ts';

/** Three invented years of daily rain from 2001-01-01, in mm. */
const rain: Series = {
  unit: 'mm',
  step: daily,
  timeSeconds: Float64Array.from({ length: 1095 }, (_, day) => (11_323 + day) * 86_400),
  values: Float64Array.from({ length: 1095 }, (_, day) => ((day * 7919) % 13 < 4 ? (day % 29) / 2 : 0)),
};
const times = (factor: number, unit: string, series = rain): Series => ({
  ...series,
  unit,
  values: series.values.map((value) => value * factor),
});
const compare = (checked: Series, reference: Series, role = 'precipitation', areaKm2?: number) =>
  comparisonOf({
    checked,
    reference,
    role,
    yearBegins: calendarYears,
    over: areaKm2 === undefined ? {} : { areaKm2 },
  });

describe('a series held against its reference', () => {
  // 1 in = 25.4 mm, 1 kg of water on 1 m2 = 1 mm, and 1 m3/s over 100 km2 = 0.864 mm a day: by definition.
  it.each([
    ['inches', times(1 / 25.4, 'in/d'), 'precipitation'],
    ['kilograms on a square metre', times(1, 'kg m-2'), 'precipitation'],
    ['a flow over its area', times(100 / 86.4, 'm3/s'), 'streamflow'],
  ])('in %s, is the same amount', (_, series, role) => {
    const outcome = compare(series, rain, role, 100);
    const totals = isDefined(outcome) ? outcome.value.totals : null;
    expect(totals?.checked).toBeCloseTo(totals?.reference ?? Number.NaN, 6);
    expect(outcome).toMatchObject({ value: { pairs: 1095, biasPercent: { value: expect.closeTo(0, 8) } } });
  });

  it('may have another step: both are brought to the longer one', () => {
    const months = aggregated(times(1.1, 'mm'), { by: 'month', how: 'total', completeness: 'every-step' });
    expect(compare(months, rain)).toMatchObject({
      value: {
        pairs: 36,
        years: ['2001', '2002', '2003'],
        biasPercent: { value: expect.closeTo(10, 8) },
        dayShift: { undefined: expect.stringContaining('only daily series') },
      },
    });
    const years = aggregated(rain, { by: 'year', how: 'total', completeness: 'every-step' });
    expect(compare(rain, years)).toMatchObject({
      value: {
        pairs: 3,
        biasPercent: { value: 0 },
        seasonCorrelation: { undefined: expect.stringContaining('season') },
      },
    });
  });

  it('of a kind that does not add up has no bias', () => {
    expect(compare(times(1, 'degC'), times(1, 'K'), 'temperature')).toMatchObject({
      value: {
        totals: null,
        biasPercent: { undefined: expect.any(String) },
        annualCorrelation: { value: expect.closeTo(1, 8) },
      },
    });
  });

  it('leaves out years of which a tenth is missing', () => {
    const gaps = {
      ...rain,
      values: rain.values.map((value, day) => (day >= 365 && day < 405 ? Number.NaN : value)),
    };
    expect(compare(gaps, rain)).toMatchObject({ value: { pairs: 1055, years: ['2001', '2003'] } });
  });

  it.each([
    ['other things', times(1, 'degC'), rain, "can't be given"],
    [
      'another time',
      { ...rain, timeSeconds: rain.timeSeconds.map((time) => time + 5000 * 86_400) },
      rain,
      'no step has a value in both',
    ],
    ['samples', { ...rain, step: irregular }, rain, 'no regular step'],
  ])('can’t be compared with %s', (_, checked, reference, reason) => {
    expect(compare(checked, reference)).toEqual({ undefined: expect.stringContaining(reason) });
  });
});

describe('the depth of a mean year', () => {
  // A mean year has 365.2425 days; twelve months of a common year 365.
  it.each<[string, string, Step, number, number]>([
    ['a daily rate', 'mm/d', daily, 2, 730.485],
    ['a daily amount', 'mm', daily, 2, 730.485],
    ['an hourly rate', 'mm/h', { kind: 'seconds', length: 3600 }, 0.1, 876.582],
    ['a monthly rate', 'mm/d', monthly, 2, 730.485],
    ['a monthly amount', 'mm', monthly, 50, (600 * 365.2425) / 365],
    ['a yearly amount', 'mm', yearly, 900, (900 * 365.2425) / 365],
  ])('of %s', (_, unit, step, mean, expected) => {
    expect(annualDepthMm({ mean, unit, step })).toBeCloseTo(expected, 8);
  });

  it('is not known of samples, of a flow without its area, of no unit', () => {
    expect(annualDepthMm({ mean: 1, unit: 'mm', step: irregular })).toBeNull();
    expect(annualDepthMm({ mean: 1, unit: 'm3/s', step: daily })).toBeNull();
    expect(annualDepthMm({ mean: 1, unit: '', step: daily })).toBeNull();
    expect(annualDepthMm({ mean: 1, unit: 'm3/s', step: daily }, { areaKm2: 100 })).toBeCloseTo(
      0.864 * 365.2425,
      8,
    );
  });
});
