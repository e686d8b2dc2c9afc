import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isDefined, type Paired } from '../../src/hydrology/paired.ts';
import { parseDate } from '../../src/series/calendar.ts';
import { type Pairing, pairByDate } from '../../src/series/pair.ts';
import { columnOf } from '../../src/series/series.ts';
import { daily, irregular, monthly, parseStep, yearly } from '../../src/series/step.ts';
import { seriesOf, windowOf } from './made.ts';
import { read } from './told.ts';

function paired(pairing: Pairing): Paired {
  const result = pairByDate(pairing);
  if (!isDefined(result)) throw new Error(result.undefined);
  return result.value;
}

const plainly = ({ observed, simulated, times, ...rest }: Paired) => ({
  observed: [...observed],
  simulated: [...simulated],
  times: [...times],
  ...rest,
});

const firstDay = parseDate('2010-01-01') ?? 0;

describe('pairing', () => {
  it('takes both ends of the window, drops gaps and counts them', () => {
    const observed = seriesOf(daily, {
      '2009-12-31': 9,
      '2010-01-01': 1,
      '2010-01-02': null,
      '2010-01-03': 3,
      '2010-01-04': null,
      '2010-01-06': 6,
    });
    const simulated = seriesOf(daily, {
      '2010-01-01': 10,
      '2010-01-02': 20,
      '2010-01-04': 40,
      '2010-01-06': 60,
      '2010-01-07': 70,
    });
    const result = paired({ observed, simulated, windows: [windowOf('2010-01-01/2010-01-06')] });
    expect(plainly(result)).toEqual({
      observed: [1, 6],
      simulated: [10, 60],
      times: [firstDay, firstDay + 5],
      // 2 and 4 lack the observation, 3 the simulation, 5 both; 31 December and 7 January are outside.
      dropped: { missingObserved: 2, missingSimulated: 1, missingBoth: 1, outsideWindow: 2 },
      windowSteps: 6,
    });
  });

  it('counts the steps of a window that the files do not reach', () => {
    const observed = seriesOf(daily, { '2010-01-01': 1 });
    const result = paired({ observed, simulated: observed, windows: [windowOf('2009-10-01/2010-09-30')] });
    expect(result.windowSteps).toBe(365);
    expect(result.dropped.missingBoth).toBe(364);
  });

  it('keeps the warm-up out, and counts days of several windows once', () => {
    const days = Object.fromEntries(
      ['01', '02', '03', '04', '05', '06'].map((day) => [`2010-01-${day}`, Number(day)]),
    );
    const both = seriesOf(daily, days);
    const result = paired({
      observed: both,
      simulated: both,
      windows: [windowOf('2010-01-05/2010-01-06'), windowOf('2010-01-01/2010-01-05')],
      leftOut: [windowOf('2009-01-01/2010-01-02'), windowOf('2010-01-04/2010-01-04')],
    });
    expect(plainly(result)).toMatchObject({
      observed: [3, 5, 6],
      windowSteps: 3,
      dropped: { outsideWindow: 3, missingBoth: 0 },
    });
  });

  it('pairs daily values whatever hour their files write', async () => {
    const observed = await read('date,flow\n2010-01-01 09:00,1\n2010-01-02 09:00,2\n', {
      time: 'date',
      values: 'flow',
      step: 'P1D',
    });
    const simulated = await read('day,flow\n1,10\n2,20\n', {
      time: { counter: 'day', starts: '2010-01-01' },
      values: 'flow',
      step: 'P1D',
    });
    const result = paired({
      observed: columnOf(observed),
      simulated: columnOf(simulated),
      windows: [windowOf('2010-01-01/2010-01-02')],
    });
    expect(plainly(result)).toMatchObject({ observed: [1, 2], simulated: [10, 20] });
  });

  it('gives a time that several rows hold no value', async () => {
    const layout = { time: 'date', values: 'flow', step: 'P1D' };
    const once = await read('date,flow\n2010-01-01,1\n2010-01-02,2\n', layout);
    const twice = await read('date,flow\n2010-01-01,1\n2010-01-02,2\n2010-01-02,2\n', layout);
    const result = paired({
      observed: columnOf(twice),
      simulated: columnOf(once),
      windows: [windowOf('2010-01-01/2010-01-02')],
    });
    expect(plainly(result)).toMatchObject({ observed: [1], dropped: { missingObserved: 1 }, windowSteps: 2 });
  });

  it('counts hours by their time, the last hour of the last day included', () => {
    const hours = seriesOf(
      { kind: 'seconds', length: 3600 },
      { '2010-01-01T22': 22, '2010-01-01T23': 23, '2010-01-02T0': 0 },
    );
    const result = paired({
      observed: hours,
      simulated: hours,
      windows: [windowOf('2010-01-01/2010-01-01')],
    });
    expect(plainly(result)).toMatchObject({
      observed: [22, 23],
      times: [firstDay + 22 / 24, firstDay + 23 / 24],
      windowSteps: 24,
      dropped: { outsideWindow: 1, missingBoth: 22 },
    });
  });

  it('takes months that lie wholly in the window', () => {
    const months = seriesOf(monthly, { '2010-01-01': 1, '2010-02-01': 2, '2010-03-01': 3 });
    const result = paired({
      observed: months,
      simulated: months,
      windows: [windowOf('2010-01-02/2010-03-31')],
    });
    expect(plainly(result)).toMatchObject({
      observed: [2, 3],
      windowSteps: 2,
      dropped: { outsideWindow: 1 },
    });
  });

  it('takes years as they begin', () => {
    const years = seriesOf(yearly, { '2012-01-01': 12, '2013-01-01': 13, '2014-01-01': 14 });
    const both = { observed: years, simulated: years };
    const windows = [windowOf('2012-10-01/2014-09-30')];
    const yearBegins = { month: 10, day: 1 };
    expect(plainly(paired({ ...both, windows, yearBegins }))).toMatchObject({
      observed: [13, 14],
      windowSteps: 2,
    });
    expect(plainly(paired({ ...both, windows }))).toMatchObject({ observed: [13], windowSteps: 1 });
  });

  it('pairs samples with the day that holds them', () => {
    const samples = seriesOf(irregular, {
      '2010-01-02T10': 2,
      '2010-01-03T08': 3,
      '2010-01-03T16': 4,
      '2010-01-09T9': 9,
      '2010-01-20': 20,
    });
    const days = Object.fromEntries(
      ['01', '02', '03', '04'].map((day) => [`2010-01-${day}`, Number(day) * 10]),
    );
    const result = paired({
      observed: samples,
      simulated: seriesOf(daily, days),
      windows: [windowOf('2010-01-01/2010-01-10')],
    });
    expect(plainly(result)).toEqual({
      observed: [2],
      simulated: [20],
      times: [firstDay + 1],
      // Two samples of 3 January leave that day without a value; the model ended before the 9th.
      dropped: { missingObserved: 1, missingSimulated: 1, missingBoth: 0, outsideWindow: 1 },
      windowSteps: 3,
    });
  });

  it('says why different steps are not paired', () => {
    const windows = [windowOf('2010-01-01/2010-01-10')];
    const hourly = parseStep('PT1H') ?? irregular;
    expect(pairByDate({ observed: seriesOf(daily, {}), simulated: seriesOf(hourly, {}), windows })).toEqual({
      undefined: 'the observed series has the step P1D, the simulated one PT1H; bring them to one step first',
    });
  });

  it('says nothing of an empty window', () => {
    const none = seriesOf(daily, {});
    expect(paired({ observed: none, simulated: none, windows: [] })).toMatchObject({ windowSteps: 0 });
  });
});

/** Twenty days from 2010-01-01 with gaps and missing values. */
const days = fc
  .array(fc.option(fc.integer({ min: 0, max: 99 }), { nil: null, freq: 3 }), { minLength: 20, maxLength: 20 })
  .map((values) =>
    Object.fromEntries(values.map((value, day) => [`2010-01-${String(day + 1).padStart(2, '0')}`, value])),
  );

const whole = windowOf('2009-12-30/2010-01-25');

describe('laws of pairing', () => {
  it('does not care about the order of rows', async () => {
    const layout = { time: 'date', values: 'flow', step: 'P1D', missing: ['-'] };
    const text = (entries: readonly (readonly [string, number | null])[]) =>
      `date,flow\n${entries.map(([date, value]) => `${date},${value ?? '-'}`).join('\n')}\n`;
    await fc.assert(
      fc.asyncProperty(days, days, fc.infiniteStream(fc.nat()), async (some, others, keys) => {
        const shuffled = Object.entries(some)
          .map((entry) => ({ entry, key: keys.next().value }))
          .sort((one, other) => one.key - other.key)
          .map(({ entry }) => entry);
        const simulated = seriesOf(daily, others);
        const observed = columnOf(await read(text(shuffled), layout));
        expect(paired({ observed, simulated, windows: [whole] })).toEqual(
          paired({ observed: seriesOf(daily, some), simulated, windows: [whole] }),
        );
      }),
      { numRuns: 50 },
    );
  });

  it('takes an absent row and a missing value alike', () => {
    fc.assert(
      fc.property(days, days, (some, others) => {
        const present = (values: Readonly<Record<string, number | null>>) =>
          Object.fromEntries(Object.entries(values).filter(([, value]) => value !== null));
        const marked = paired({
          observed: seriesOf(daily, some),
          simulated: seriesOf(daily, others),
          windows: [whole],
        });
        const absent = paired({
          observed: seriesOf(daily, present(some)),
          simulated: seriesOf(daily, present(others)),
          windows: [whole],
        });
        expect(absent).toEqual(marked);
      }),
    );
  });

  it('accounts for every step of the window', () => {
    fc.assert(
      fc.property(days, days, (some, others) => {
        const { observed, dropped, windowSteps } = paired({
          observed: seriesOf(daily, some),
          simulated: seriesOf(daily, others),
          windows: [whole],
        });
        expect(windowSteps).toBe(27);
        const { missingObserved, missingSimulated, missingBoth } = dropped;
        expect(observed.length + missingObserved + missingSimulated + missingBoth).toBe(windowSteps);
      }),
    );
  });

  it('adds up over windows that follow one another', () => {
    fc.assert(
      fc.property(days, days, fc.integer({ min: 1, max: 19 }), (some, others, cut) => {
        const sides = { observed: seriesOf(daily, some), simulated: seriesOf(daily, others) };
        const last = firstDay + 19;
        const first = paired({ ...sides, windows: [{ firstDay, lastDay: firstDay + cut - 1 }] });
        const second = paired({ ...sides, windows: [{ firstDay: firstDay + cut, lastDay: last }] });
        const both = paired({ ...sides, windows: [{ firstDay, lastDay: last }] });
        expect([...first.observed, ...second.observed]).toEqual([...both.observed]);
        expect([...first.simulated, ...second.simulated]).toEqual([...both.simulated]);
        expect(first.windowSteps + second.windowSteps).toBe(both.windowSteps);
      }),
    );
  });
});
