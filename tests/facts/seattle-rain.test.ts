import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { comparisonOf } from '../../src/facts/profiles/comparison.ts';
import { isDefined } from '../../src/hydrology/paired.ts';
import { rules } from '../../src/rules/index.ts';
import { runRules } from '../../src/rules/run.ts';
import { calendarYears } from '../../src/series/hydrological-year.ts';
import { daily, type Step } from '../../src/series/step.ts';
import { levelOf } from '../../src/verdict/level.ts';
import { studyFacts } from '../harness/study.ts';

/**
 * Daily weather of Seattle, 2012 to 2015: NOAA, public domain, in npm vega-datasets (BSD-3-Clause), `data/seattle-weather.csv`:
 * date, precipitation (mm), temp_max, temp_min (degC), wind, weather.
 */
const text = readFileSync(
  new URL('../../node_modules/vega-datasets/data/seattle-weather.csv', import.meta.url),
  'utf8',
);
const rows = text
  .trim()
  .split('\n')
  .slice(1)
  .map((line) => line.split(','));
const rain = rows.map(([, value]) => Number(value));

const input = (file: string, values: string, role: string, unit: string) => ({
  role,
  files: [file],
  source: {
    provider: 'NOAA',
    title: 'Daily weather of Seattle',
    url: 'https://github.com/vega/vega-datasets',
    licence: 'LicenseRef-public-domain',
    retrieved: '2021-01-04',
    published_sha256: createHash('sha256').update(text).digest('hex'),
  },
  series: { time: 'date', values, unit, step: 'P1D', day_ends: '24:00', utc_offset: '-08:00' },
  period: '2012-01-01/2015-12-31',
  missing_share: 0,
});

const facts = await studyFacts({
  set: {
    'inputs.seattle-rain': input('data/seattle-weather.csv', 'precipitation', 'precipitation', 'mm/d'),
    'inputs.seattle-warmth': input('data/seattle-again.csv', 'temp_max', 'temperature', 'degC'),
  },
  files: { 'data/seattle-weather.csv': text, 'data/seattle-again.csv': text },
});

describe('real rain, through reading, profile and rules', () => {
  const file = facts.profiles.get('seattle-rain')?.files[0];

  it('has the figures that a plain reading of the package’s file has', () => {
    // Counted by hand in the file: 1461 days with one 29 February, 4426.0 mm, 623 days with rain, 55.9 mm on 2015-03-15.
    expect([rows.length, rain.filter((mm) => mm > 0).length, Math.max(...rain)]).toEqual([1461, 623, 55.9]);
    const total = rain.reduce((sum, mm) => sum + mm, 0);
    expect(total).toBeCloseTo(4426, 8);
    const highest = rain.indexOf(55.9);
    expect(file).toMatchObject({
      rows: 1461,
      problems: { total: 0 },
      repeated: { total: 0 },
      absent: { total: 0 },
      columns: [
        {
          name: 'precipitation',
          values: 1461,
          missing: 0,
          total: expect.closeTo(total, 8),
          highest: { value: 55.9, time: rows[highest]?.[0], line: highest + 2 },
          lowest: { value: 0 },
          // Two days with 13.7 mm are the longest of equal rain; 48 dry days in a row, then 35.
          equalRuns: [],
          drySpells: { longest: { steps: 48 }, nextSteps: 35 },
        },
      ],
    });
    expect(facts.profiles.get('seattle-rain')?.annualMm).toBeCloseTo((total / 1461) * 365.2425, 8);
  });

  it('gives no finding', () => {
    const found = runRules(rules, facts)
      .filter(({ draft }) => draft.record.startsWith('inputs.seattle'))
      .map(({ rule, draft }) => [rule.id, levelOf(rule, draft, 'archive', undefined), draft.message]);
    expect(found).toEqual([]);
  });
});

describe('a product with the right season in the wrong years', () => {
  // The gauge's own rain of a year later, times 0.8. Expected figures: numpy 1.24 (corrcoef) on monthly and yearly sums by
  // pandas 1.5; anomalies are months less the mean of their calendar month.
  const series = (values: readonly number[]) => ({
    unit: 'mm/d',
    step: daily satisfies Step,
    timeSeconds: Float64Array.from(rows, ([date = '']) => Date.parse(date) / 1000),
    values: Float64Array.from(values),
  });
  const outcome = comparisonOf({
    checked: series(rain.map((_, day) => 0.8 * (rain[(day + 365) % 1461] ?? 0))),
    reference: series(rain),
    role: 'precipitation',
    yearBegins: calendarYears,
    over: {},
  });

  it('is told by years and anomalies, not by the season', () => {
    if (!isDefined(outcome)) throw new Error(outcome.undefined);
    const near = (value: number) => ({ value: expect.closeTo(value, 9) });
    expect(outcome.value).toMatchObject({
      pairs: 1461,
      years: ['2012', '2013', '2014', '2015'],
      biasPercent: near(-20),
      yearsBiasPercent: [-45.9706362153, 19.1111111111, -26.0739779364, -13.904494382].map(near),
      annualCorrelation: near(-0.554985381691),
      seasonCorrelation: near(0.9976823986),
      anomalyCorrelation: near(-0.264247732357),
      dayShift: { value: { sameDay: expect.closeTo(0.0252314887234, 9) } },
    });
  });
});
