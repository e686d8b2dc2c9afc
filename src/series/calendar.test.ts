import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  dateOf,
  dayNumber,
  daysInMonth,
  firstDayOfMonth,
  formatDate,
  formatSeconds,
  isDate,
  isLeapYear,
  monthNumber,
  parseDate,
  parseWindow,
} from './calendar.ts';
import { calendarYears, daysOfYear, parseYearBegins, yearOf } from './hydrological-year.ts';
import { spansOf } from './windows.ts';

const day = (text: string) => parseDate(text) ?? Number.NaN;

describe('dates', () => {
  it('agree with the calendar of the language, which is proleptic Gregorian too', () => {
    fc.assert(
      fc.property(fc.integer({ min: day('0001-01-01'), max: day('9999-12-31') }), (number) => {
        const text = new Date(number * 86_400_000).toISOString().slice(0, 10);
        expect(formatDate(number)).toBe(text);
        expect(parseDate(text)).toBe(number);
        const { year, month, day: ofMonth } = dateOf(number);
        expect(dayNumber(year, month, ofMonth)).toBe(number);
        expect(formatDate(firstDayOfMonth(monthNumber(number)))).toBe(`${text.slice(0, 7)}-01`);
      }),
    );
  });

  it('know leap years', () => {
    expect([1900, 2000, 2012, 2013, 2100].map(isLeapYear)).toEqual([false, true, true, false, false]);
    expect([daysInMonth(2000, 2), daysInMonth(1900, 2), daysInMonth(2001, 13)]).toEqual([29, 28, 0]);
  });

  it('refuse days that do not exist and other manners of writing', () => {
    for (const text of [
      '2011-02-29',
      '2010-00-10',
      '2010-1-1',
      '2010-01-01T00:00',
      '0000-01-01',
      '2010-01-32',
      '',
    ])
      expect(parseDate(text)).toBeNull();
    expect(isDate(10_000, 1, 1)).toBe(false);
  });

  it('are windows in pairs', () => {
    expect(parseWindow('2010-01-01/2010-01-01')).toEqual({
      firstDay: day('2010-01-01'),
      lastDay: day('2010-01-01'),
    });
    for (const text of [
      '2010-01-02/2010-01-01',
      '2010-01-01',
      '2010-01-01/2010-01-02/2010-01-03',
      '2010-01-01--2010-01-02',
    ])
      expect(parseWindow(text)).toBeNull();
  });

  it('are written with the time where there is one', () => {
    expect(formatSeconds(day('2010-01-01') * 86_400 + 9.5 * 3600)).toBe('2010-01-01T09:30');
    expect(formatSeconds(-1)).toBe('1969-12-31T23:59:59');
  });
});

describe('hydrological years', () => {
  const october = { month: 10, day: 1 };

  it('are named by the year in which they end', () => {
    expect(yearOf(day('2012-09-30'), october)).toBe(2012);
    expect(yearOf(day('2012-10-01'), october)).toBe(2013);
    expect(yearOf(day('2012-12-31'), calendarYears)).toBe(2012);
    const { firstDay, lastDay } = daysOfYear(2013, october);
    expect([formatDate(firstDay), formatDate(lastDay)]).toEqual(['2012-10-01', '2013-09-30']);
    expect(daysOfYear(2012, calendarYears)).toEqual({
      firstDay: day('2012-01-01'),
      lastDay: day('2012-12-31'),
    });
  });

  it('hold each day once', () => {
    const begins = fc.record({
      month: fc.integer({ min: 1, max: 12 }),
      day: fc.integer({ min: 1, max: 28 }),
    });
    fc.assert(
      fc.property(fc.integer({ min: -50_000, max: 50_000 }), begins, (number, yearBegins) => {
        const { firstDay, lastDay } = daysOfYear(yearOf(number, yearBegins), yearBegins);
        expect(firstDay <= number && number <= lastDay).toBe(true);
        expect([365, 366]).toContain(lastDay - firstDay + 1);
        expect(dateOf(firstDay)).toMatchObject(yearBegins);
      }),
    );
  });

  it('begin on a day that every year has', () => {
    expect(parseYearBegins('10-01')).toEqual(october);
    for (const text of ['02-29', '13-01', '1-1', '2010-10-01']) expect(parseYearBegins(text)).toBeNull();
  });
});

describe('spans of windows', () => {
  it('hold the days of any window but none left out', () => {
    const window = fc
      .tuple(fc.integer({ min: 0, max: 40 }), fc.integer({ min: 0, max: 12 }))
      .map(([firstDay, length]) => ({ firstDay, lastDay: firstDay + length }));
    fc.assert(
      fc.property(
        fc.array(window, { maxLength: 4 }),
        fc.array(window, { maxLength: 3 }),
        (windows, leftOut) => {
          const spans = spansOf(windows, leftOut);
          const held = (number: number) => (each: { firstDay: number; lastDay: number }) =>
            each.firstDay <= number && number <= each.lastDay;
          for (let number = 0; number <= 60; number++) {
            const holding = spans.filter(
              ({ fromSeconds, untilSeconds }) =>
                fromSeconds <= number * 86_400 && number * 86_400 < untilSeconds,
            );
            const wanted = windows.some(held(number)) && !leftOut.some(held(number));
            expect(holding.length).toBe(wanted ? 1 : 0);
          }
          for (const [index, span] of spans.entries())
            if (index > 0) expect(span.fromSeconds).toBeGreaterThan(spans[index - 1]?.untilSeconds ?? 0);
        },
      ),
    );
  });
});
