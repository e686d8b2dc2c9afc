import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { blocks, CheckInMemory, type Files, told } from '../harness/check-in-memory.ts';
import { type PlantedFault, plant } from './plant.ts';

const read = (path: string) => readFileSync(new URL(path, import.meta.url), 'utf8');

/** Daily weather of Seattle, 2012 to 2015: NOAA, public domain, in npm vega-datasets (BSD-3-Clause). */
const weather = read('../../node_modules/vega-datasets/data/seattle-weather.csv');
const [, ...days] = weather
  .trim()
  .split('\n')
  .map((line) => line.split(','));
const forecast = days.slice(1).map(([date], place) => `${date},${days[place]?.[2]}\n`);

const files: Files = {
  'stoplog.yaml': read('seattle.yaml'),
  'data/rain.csv': weather,
  'data/warmth.csv': weather,
  'runs/forecast.csv': `date,t_max\n${forecast.join('')}`,
  'persistence.mjs': '// writes the highest temperature of each day to the next\n',
};
const check = new CheckInMemory(files, '2021-02-01');

const faults: readonly PlantedFault[] = [
  {
    fault: 'two digits in the wrong order',
    in: 'stoplog.yaml',
    change: { 'nse: 0.8587': 'nse: 0.8578' },
    rule: 'evaluation.score-differs',
    record: 'evaluation.warmth',
    says: 'the files give 0.858719',
  },
  {
    fault: 'the NSE of monthly means',
    in: 'stoplog.yaml',
    change: { 'nse: 0.8587': 'nse: 0.9987' },
    rule: 'evaluation.score-differs',
    record: 'evaluation.warmth',
    says: 'monthly values',
  },
  {
    fault: 'a forecast that was written to the day before, and knows it all',
    in: 'runs/forecast.csv',
    move: -1,
    rule: 'evaluation.score-differs',
    record: 'evaluation.warmth',
    says: 'NSE, R2, PBIAS, KGE, RMSE, RSR of warmth over calibration are not what the files give. Each stated figure is what comes out with the simulated series moved a day later',
  },
  {
    fault: 'a period of another year',
    in: 'stoplog.yaml',
    change: {
      'temp_max, unit: degC, step: P1D, day_ends: "24:00", utc_offset: "-08:00" }\n    period: 2012':
        'temp_max, unit: degC, step: P1D, day_ends: "24:00", utc_offset: "-08:00" }\n    period: 2011',
    },
    rule: 'inputs.period-differs',
    record: 'inputs.warmth',
    says: 'they begin 365 days later',
  },
  {
    fault: 'a month of rain left out',
    in: 'data/rain.csv',
    rows: '2013-11-01/2013-11-30',
    do: 'dropped',
    rule: 'inputs.missing-differs',
    record: 'inputs.rain',
    says: '30 of 1 461 values are missing, a share of 0.0205',
  },
  {
    fault: 'rain turned into millimetres twice',
    in: 'data/rain.csv',
    times: 25.4,
    rule: 'inputs.beyond-record',
    record: 'inputs.rain',
    says: 'mm of rain within twelve months',
  },
];

describe('real weather, through the whole check', () => {
  it('agrees with what was worked out by hand, and is told what a short record lacks', async () => {
    const found = await check.findingsIn(await check.sealedAnew(files));
    expect(told(found.filter(blocks))).toEqual([]);
    expect(found.filter(({ level }) => level === 'warn').map(({ rule }) => rule)).toEqual([
      'study.phase-behind',
      'periods.short',
    ]);
  });

  it.each(faults)('$fault', async (fault) => {
    const found = await check.findingsIn(await check.sealedAnew(plant(fault, files)));
    const named = found.filter(({ rule, record }) => rule === fault.rule && record === fault.record);
    expect(told(named.filter(blocks)).join('\n'), told(found).join('\n')).toContain(fault.says);
  });
});
