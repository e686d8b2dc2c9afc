import fc from 'fast-check';
import { describe, expect, it, test } from 'vitest';
import { dateOfDay, dayNumber, isDate, parsePeriod } from './period.ts';

describe('a date', () => {
  // Gregorian leap years (ISO 8601-1:2019, 4.2.1): divisible by 4, not by 100 unless by 400.
  it.each(['2004-02-29', '2000-02-29', '1600-02-29', '2003-12-31', '0001-01-01', '9999-12-31'])(
    '%s is one',
    (text) => {
      expect(isDate(text)).toBe(true);
    },
  );

  it.each([
    '2003-02-29',
    '1900-02-29',
    '2100-02-29',
    '2004-02-30',
    '2004-04-31',
    '2004-13-01',
    '2004-00-10',
    '2004-01-00',
    '2004-1-1',
    '20040101',
    '2004-01',
    '2004-01-01T00:00',
    ' 2004-01-01',
    '01.01.2004',
    '',
  ])('"%s" is none', (text) => {
    expect(isDate(text)).toBe(false);
  });

  it('counts on from 1970-01-01 as a calendar walked day by day does', () => {
    const leap = (year: number) => (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
    const length = (year: number, month: number) =>
      month === 2 ? (leap(year) ? 29 : 28) : [4, 6, 9, 11].includes(month) ? 30 : 31;
    let day = dayNumber('1895-01-01');
    for (let year = 1895; year < 2105; year += 1) {
      for (let month = 1; month <= 12; month += 1) {
        for (let dayOfMonth = 1; dayOfMonth <= length(year, month); dayOfMonth += 1) {
          const date = `${year}-${String(month).padStart(2, '0')}-${String(dayOfMonth).padStart(2, '0')}`;
          if (dayNumber(date) !== day || dateOfDay(day) !== date)
            throw new Error(`${date} is not day ${day}`);
          day += 1;
        }
      }
    }
    expect(dayNumber('1970-01-01')).toBe(0);
    expect(day).toBe(dayNumber('2105-01-01'));
  });
});

describe('a period', () => {
  // Days: Python 3.11, (date.fromisoformat(last) - date.fromisoformat(first)).days + 1.
  it.each([
    ['1900-02-01/1900-03-01', 29],
    ['2000-02-01/2000-03-01', 30],
    ['2011-10-01/2012-09-30', 366],
    ['2012-10-01/2013-09-30', 365],
    ['1999-12-31/1999-12-31', 1],
    ['2010-10-01/2012-09-30', 731],
    ['1900-01-01/1999-12-31', 36524],
  ])('%s has %i days', (text, days) => {
    const [first, last] = text.split('/');
    expect(parsePeriod(text)).toEqual({ first, last, days });
  });

  it.each([
    '2004-01-02/2004-01-01',
    '2003-02-01/2003-02-29',
    '2004-01-01',
    '2004-01-01/',
    '/2004-01-01',
    '2004-01-01/2004-01-02/2004-01-03',
    '2004-01-01--2004-01-02',
    '2004-01-01 / 2004-01-02',
    '2004-01-01/P1Y',
    '',
  ])('"%s" is none', (text) => {
    expect(parsePeriod(text)).toBeNull();
  });

  test('two periods that meet have as many days as the whole', () => {
    const day = fc.integer({ min: -200_000, max: 200_000 });
    fc.assert(
      fc.property(day, fc.nat(40_000), fc.nat(40_000), (first, one, other) => {
        const days = (from: number, to: number) =>
          parsePeriod(`${dateOfDay(from)}/${dateOfDay(to)}`)?.days ?? Number.NaN;
        const end = first + one + 1 + other;
        expect(days(first, first + one) + days(first + one + 1, end)).toBe(days(first, end));
      }),
    );
  });
});
