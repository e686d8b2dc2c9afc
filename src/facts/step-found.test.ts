import { describe, expect, it } from 'vitest';
import { parseDate, secondsOfDay } from '../series/calendar.ts';
import { formatStep, formatTime, irregular } from '../series/step.ts';
import { withStep } from './step-found.ts';

/** Times such as `2010-01-31` or `2010-01-31T06`. */
function found(times: readonly string[]) {
  const timeSeconds = Float64Array.from(times, (text) => {
    const [date = '', hour = '0'] = text.split('T');
    return (parseDate(date) ?? Number.NaN) * secondsOfDay + Number(hour) * 3600;
  });
  const series = withStep({ unit: 'mm', step: irregular, timeSeconds, values: timeSeconds });
  return { step: formatStep(series.step), first: formatTime(series.timeSeconds[0] ?? 0, series.step) };
}

describe('the step that times have', () => {
  it.each([
    ['P1D', ['2010-01-01', '2010-01-02', '2010-01-03']],
    ['P1D', ['2010-01-01', '2010-01-02', '2010-01-05', '2010-01-06']],
    ['PT1H', ['2010-01-01T00', '2010-01-01T01', '2010-01-01T02']],
    ['P1M', ['2010-01-01', '2010-02-01', '2010-03-01', '2010-04-01']],
    ['P1M', ['2010-01-15', '2010-02-15', '2010-03-15']],
    ['P1Y', ['2009-01-01', '2010-01-01', '2011-01-01']],
    ['P7D', ['2010-01-01', '2010-01-08', '2010-01-15']],
    ['irregular', ['2010-01-01', '2010-01-04', '2010-02-11', '2010-02-12']],
    ['irregular', ['2010-01-03', '2010-02-07', '2010-03-05']],
    ['irregular', ['2010-01-01']],
  ])('%s of %j', (step, times) => {
    expect(found(times).step).toBe(step);
  });

  it('puts days and months where they begin', () => {
    expect(found(['2010-01-01T09', '2010-01-02T09', '2010-01-03T09'])).toEqual({
      step: 'P1D',
      first: '2010-01-01',
    });
    expect(found(['2010-01-15', '2010-02-15', '2010-03-15'])).toEqual({ step: 'P1M', first: '2010-01' });
  });
});
