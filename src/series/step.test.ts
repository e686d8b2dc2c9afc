import { describe, expect, it } from 'vitest';
import { parseDate } from './calendar.ts';
import {
  afterSteps,
  formatStep,
  formatTime,
  irregular,
  isByDate,
  parseStep,
  sameStep,
  startOfStep,
  stepsBetween,
} from './step.ts';

const at = (date: string) => (parseDate(date) ?? Number.NaN) * 86_400;
const step = (text: string) => parseStep(text) ?? irregular;

describe('steps', () => {
  it.each([
    ['P1D', { kind: 'seconds', length: 86_400 }, 'P1D'],
    ['PT24H', { kind: 'seconds', length: 86_400 }, 'P1D'],
    ['P1W', { kind: 'seconds', length: 604_800 }, 'P7D'],
    ['P1DT12H', { kind: 'seconds', length: 129_600 }, 'PT36H'],
    ['PT15M', { kind: 'seconds', length: 900 }, 'PT15M'],
    ['PT90S', { kind: 'seconds', length: 90 }, 'PT90S'],
    ['P1M', { kind: 'months', length: 1 }, 'P1M'],
    ['P1Y', { kind: 'months', length: 12 }, 'P1Y'],
    ['P1Y6M', { kind: 'months', length: 18 }, 'P18M'],
    ['irregular', { kind: 'irregular' }, 'irregular'],
  ])('%s', (text, expected, written) => {
    expect(parseStep(text)).toEqual(expected);
    expect(formatStep(step(text))).toBe(written);
  });

  it.each(['P0D', 'P', 'PT', 'P1M1D', 'P0.5D', 'PT1.5H', '1D', 'p1d', 'daily', 'P-1D', ''])(
    '%s is none',
    (text) => {
      expect(parseStep(text)).toBeNull();
    },
  );

  it('are alike by length, not by manner', () => {
    expect(sameStep(step('P12M'), step('P1Y'))).toBe(true);
    expect(sameStep(step('P1D'), irregular)).toBe(false);
    expect(sameStep(irregular, irregular)).toBe(true);
    expect(sameStep(step('P1M'), step('P1D'))).toBe(false);
  });

  it('count by date from a day on', () => {
    expect(['P1D', 'P7D', 'P1M', 'PT1H', 'PT36H', 'irregular'].map((text) => isByDate(step(text)))).toEqual([
      true,
      true,
      true,
      false,
      false,
      false,
    ]);
    expect(startOfStep(at('2010-03-31') + 60, step('P1D'))).toBe(at('2010-03-31'));
    expect(startOfStep(at('2010-03-31') + 60, step('P1M'))).toBe(at('2010-03-01'));
    expect(startOfStep(at('2010-03-31') + 60, step('P1Y'))).toBe(at('2010-01-01'));
    expect(startOfStep(at('2010-03-31') + 60, step('PT1H'))).toBe(at('2010-03-31') + 60);
  });

  it('go over the ends of months and years', () => {
    expect(afterSteps(at('2011-11-01'), 4, step('P1M'))).toBe(at('2012-03-01'));
    expect(stepsBetween(at('2011-11-01'), at('2012-03-01'), step('P1M'))).toBe(4);
    expect(afterSteps(at('2012-02-28'), 2, step('P1D'))).toBe(at('2012-03-01'));
    expect(stepsBetween(at('2012-01-01'), at('2010-01-01'), step('P1Y'))).toBe(-2);
    expect(stepsBetween(0, 1, irregular)).toBeNaN();
  });

  it('write times as people do', () => {
    const time = at('2007-01-14');
    expect(['P1Y', 'P1M', 'P1D', 'PT1H', 'irregular'].map((text) => formatTime(time, step(text)))).toEqual([
      '2007',
      '2007-01',
      '2007-01-14',
      '2007-01-14T00:00',
      '2007-01-14',
    ]);
    expect(formatTime(time + 3600, irregular)).toBe('2007-01-14T01:00');
  });
});
