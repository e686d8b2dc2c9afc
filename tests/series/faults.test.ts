import { describe, expect, it } from 'vitest';
import type { SeriesLayout } from '../../src/series/layout.ts';
import { plain, problemsOf, read, rowsOf } from './told.ts';

/** Faults in files and layouts: what is said, and the rows that are read all the same. */
const faulty: readonly {
  readonly name: string;
  readonly text: string | Uint8Array;
  readonly layout?: SeriesLayout;
  readonly says: readonly string[];
  readonly rows?: readonly string[];
}[] = [
  {
    name: 'text where a number is expected',
    text: 'date,flow\n2010-01-31,1.5\n2010-02-01,ice\n2010-02-02,NA\n',
    layout: { ...plain, unit: 'm3/s', missing: ['NA'] },
    says: [
      'flow.csv line 3, column flow: expected a number in m3/s, found "ice"; if it marks a missing value, say missing: ["ice"]',
    ],
    rows: ['2010-01-31 1.5', '2010-02-02 -'],
  },
  {
    name: 'codes of missing values that are not declared',
    text: 'date,flow\n2010-01-31,NA\n2010-02-01,\n2010-02-02,"-9999"\n2010-02-03,-999.0\n2010-02-04,NaN\n2010-02-05,2\n',
    says: [
      'flow.csv line 2, column flow: expected a number, found "NA"; if it marks a missing value, say missing: ["NA"]',
      'flow.csv line 3, column flow: expected a number, found nothing; if it marks a missing value, say missing: [""]',
      'flow.csv line 4, column flow: expected a plausible number, found "-9999"; if it marks a missing value, say missing: [-9999]',
      'flow.csv line 5, column flow: expected a plausible number, found "-999.0"; if it marks a missing value, say missing: [-999]',
      'flow.csv line 6, column flow: expected a number, found "NaN"; if it marks a missing value, say missing: ["NaN"]',
    ],
    rows: ['2010-02-05 2'],
  },
  {
    name: 'the other decimal mark',
    text: 'date;flow\n2010-01-31;1,5\n',
    layout: { ...plain, separator: 'semicolon' },
    says: [
      'flow.csv line 2, column flow: expected a number, found "1,5"; if that is its decimal mark, say decimal: comma',
    ],
  },
  {
    name: 'the point where a comma was stated, thousands separators, stars, infinity, hexadecimal',
    text: 'date;flow\n2010-01-31;1.5\n2010-01-31;1.234,5\n2010-01-31;******\n2010-01-31;inf\n2010-01-31;0x1F\n2010-01-31;1e999\n',
    layout: { ...plain, separator: 'semicolon', decimal: 'comma' },
    says: [
      'flow.csv line 2, column flow: expected a number, found "1.5"; if that is its decimal mark, say decimal: point',
      'flow.csv line 3, column flow: expected a number, found "1.234,5"; write numbers without separators of thousands',
      ...['******', 'inf', '0x1F', '1e999'].map(
        (text, index) =>
          `flow.csv line ${index + 4}, column flow: expected a number, found "${text}"; if it marks a missing value, say missing: ["${text}"]`,
      ),
    ],
  },
  {
    name: 'dates that the calendar does not have, or in another manner',
    text: 'date,flow\n2011-02-29,1\n2010-13-01,1\n31/01/2010,1\n2010-2-1,1\n,1\n1900-02-29,1\n2010-01-31x,1\n2010-01-31 25:00,1\n0000-01-01,1\n2010-01,1\n2012-02-29,2\n',
    says: [
      '2011-02-29',
      '2010-13-01',
      '31/01/2010',
      '2010-2-1',
      '',
      '1900-02-29',
      '2010-01-31x',
      '2010-01-31 25:00',
      '0000-01-01',
      '2010-01',
    ].map(
      (text, index) =>
        `flow.csv line ${index + 2}, column date: expected a date of the calendar such as 2010-09-30, found ${text === '' ? 'nothing' : `"${text}"`}; if times are written otherwise, state it: time: {column, pattern: "DD/MM/YYYY"}`,
    ),
    rows: ['2012-02-29 2'],
  },
  {
    name: 'times that do not follow the pattern',
    text: 'date,flow\n31.01.2010,1\n1.2.2010,1\n2010-02-01,1\n29.02.2011,1\n',
    layout: { ...plain, time: { column: 'date', pattern: 'DD.MM.YYYY' } },
    says: ['1.2.2010', '2010-02-01', '29.02.2011'].map(
      (text, index) =>
        `flow.csv line ${index + 3}, column date: expected a time written DD.MM.YYYY, found "${text}"`,
    ),
    rows: ['2010-01-31 1'],
  },
  {
    name: 'columns of dates that the calendar does not have',
    text: 'y,m,d,flow\n2010,2,30,1\n2010,2.0,3,1\n2010,0,3,1\n2010,2,3,1\n',
    layout: { ...plain, time: { year: 'y', month: 'm', day: 'd' } },
    says: ['2010 2 30', '2010 2.0 3', '2010 0 3'].map(
      (text, index) =>
        `flow.csv line ${index + 2}, column y, m, d: expected a date of the calendar in whole numbers, found "${text}"`,
    ),
    rows: ['2010-02-03 1'],
  },
  {
    name: 'day 366 of a common year',
    text: 'y,d,flow\n2010,366,1\n',
    layout: { ...plain, time: { year: 'y', day_of_year: 'd' } },
    says: [
      'flow.csv line 2, column y, d: expected a year and a day of that year (1 to 365, in leap years 366), found "2010 366"',
    ],
  },
  {
    name: 'a counter with decimals',
    text: 'day,flow\n1.5,1\n',
    layout: { ...plain, time: { counter: 'day', starts: '2010-01-31' } },
    says: ['flow.csv line 2, column day: expected a whole number that counts steps, found "1.5"'],
  },
  {
    name: 'rows with too many or too few columns',
    text: 'date,flow\n2010-01-31,1,5\n2010-02-01\n2010-02-02,2\n',
    layout: { ...plain, decimal: 'comma' },
    says: [
      'flow.csv line 2: expected 2 columns, found 3; a comma within a value, such as a decimal comma, parts it: quote the value or use another separator',
      'flow.csv line 3: expected at least 2 columns, found 1',
    ],
    rows: ['2010-02-02 2'],
  },
  {
    name: 'a merge conflict that was left',
    text: 'date,flow\n<<<<<<< HEAD\n2010-01-31,1\n=======\n2010-01-31,2\n>>>>>>> other\n2010-02-01,3\n',
    says: [
      'flow.csv line 2: expected a row, found "<<<<<<< HEAD"; git left a merge conflict here',
      'flow.csv line 4: expected a row, found "======="; git left a merge conflict here',
      'flow.csv line 6: expected a row, found ">>>>>>> other"; git left a merge conflict here',
    ],
    rows: ['2010-01-31 1', '2010-01-31 2', '2010-02-01 3'],
  },
  {
    name: 'text after a quoted field',
    text: 'date,flow\n2010-01-31,"1"5\n2010-02-01,2\n',
    says: [
      'flow.csv line 2: expected a separator after a quoted field, found text after its closing quotation mark',
    ],
    rows: ['2010-02-01 2'],
  },
  {
    name: 'a quotation mark that never closes',
    text: 'date,flow\n2010-01-31,1\n2010-02-01,"2\n2010-02-02,3\n',
    says: [
      'flow.csv line 3: expected the end of the row within 1048576 bytes, found none; look for a quotation mark that is never closed',
    ],
    rows: ['2010-01-31 1'],
  },
  {
    name: 'a row that is longer than any honest one',
    text: `date,flow\n2010-01-31,1\n${'x'.repeat(1_100_000)}`,
    says: [
      'flow.csv line 3: expected the end of the row within 1048576 bytes, found none; look for a quotation mark that is never closed',
    ],
    rows: ['2010-01-31 1'],
  },
  {
    name: 'a column that is not there',
    text: 'date,discharge,stage\n2010-01-31,1,2\n',
    says: [
      'flow.csv line 1, column flow: expected a column named "flow", found the columns date, discharge, stage; check the name, and skip_lines if the header stands elsewhere',
    ],
  },
  {
    name: 'another separator',
    text: 'date;flow\n2010-01-31;1\n',
    says: [
      'flow.csv line 1, column date: expected a column named "date", found one column, "date;flow"; check separator (comma, semicolon, tab, blank) and skip_lines',
    ],
  },
  {
    name: 'a name that two columns have',
    text: 'date,flow,flow\n2010-01-31,1,2\n',
    says: [
      'flow.csv line 1, column flow: expected one column named "flow", found several of that name; give the place of the column, counted from 1',
    ],
  },
  {
    name: 'a place beyond the header',
    text: 'date,flow\n2010-01-31,1\n',
    layout: { ...plain, values: 3 },
    says: ['flow.csv line 1, column 3: expected a column 3, counted from 1, found 2 columns in the header'],
  },
  {
    name: 'a name without a header',
    text: '2010-01-31,1\n',
    layout: { ...plain, time: 1, header: false },
    says: [
      'flow.csv, column flow: expected a header with a column named "flow", found a layout that says the file has none (header: false); give the place of the column, counted from 1, or say header: true',
    ],
  },
  {
    name: 'a first row taken for a header',
    text: '2010-01-31,1\n2010-02-01,2\n',
    layout: { ...plain, time: 1, values: 2 },
    says: [
      'flow.csv line 1: expected a header with the names of the columns, found 2010-01-31 1; if the file has none, say header: false',
    ],
  },
  {
    name: 'UTF-16',
    text: Buffer.from('\uFEFFdate,flow\n2010-01-31,1\n', 'utf16le'),
    says: ['flow.csv: expected text in UTF-8, found UTF-16 text; save the file as UTF-8'],
  },
  { name: 'an empty file', text: '', says: ['flow.csv: expected rows of values, found none'] },
  { name: 'a header only', text: 'date,flow\n', says: ['flow.csv: expected rows of values, found none'] },
  {
    name: 'fewer lines than are to be skipped',
    text: 'date,flow\n2010-01-31,1\n',
    layout: { ...plain, skip_lines: 9 },
    says: ['flow.csv: expected rows of values, found none'],
  },
  ...(
    [
      [
        { ...plain, step: 'P1.5D' },
        'step "P1.5D" is neither "irregular" nor a whole ISO 8601 duration such as P1D, PT15M or P1M',
      ],
      [
        { ...plain, step: 'P1M1D' },
        'step "P1M1D" is neither "irregular" nor a whole ISO 8601 duration such as P1D, PT15M or P1M',
      ],
      [{ values: 'flow' }, 'no column of the time is stated'],
      [{ time: 'date' }, 'no column of values is stated'],
      [
        { ...plain, time: { column: 'date', pattern: 'DD.MM.YY' } },
        'the pattern "DD.MM.YY" can\'t be used: "YY" stands for no part of a time; what does: YYYY, MMM, MM, M, DDD, DD, D, hh, h, mm, ss',
      ],
      [
        { ...plain, time: { column: 'date', pattern: 'DD.MM.' } },
        'the pattern "DD.MM." can\'t be used: it has no year of four digits (YYYY)',
      ],
      [
        { ...plain, time: { column: 'date', pattern: 'YYYY-MM-DD MM' } },
        'the pattern "YYYY-MM-DD MM" can\'t be used: the month comes twice',
      ],
      [
        { ...plain, time: { column: 'date', pattern: 'MM/YYYY' } },
        'the pattern "MM/YYYY" can\'t be used: it gives no day, which this step needs',
      ],
      [
        { ...plain, time: { column: 'date', pattern: 'YYYY-MM-DDD' } },
        'the pattern "YYYY-MM-DDD" can\'t be used: the day of the year goes with neither month nor day',
      ],
      [
        { ...plain, time: { year: 'y', month: 'm' } },
        'the time has year and month, but no day, which this step needs',
      ],
      [
        { ...plain, step: 'irregular', time: { counter: 'n', starts: '2010-01-01' } },
        'the time is a counter of steps, so a step such as P1D must be stated',
      ],
      [
        { ...plain, time: { counter: 'n', starts: '2010-02-30' } },
        'the counter starts at "2010-02-30", which is no date such as 2001-01-01',
      ],
      [{ ...plain, utc_offset: '10' }, 'utc_offset "10" is no offset from UTC such as "+10:00"'],
    ] as const satisfies readonly (readonly [SeriesLayout, string])[]
  ).map(([layout, found]) => ({
    name: `a layout: ${found}`,
    text: 'date,flow\n2010-01-31,1\n',
    layout,
    says: [`flow.csv: expected a usable layout, found ${found}`],
  })),
];

describe('faults are named with file, line and what was expected', () => {
  for (const { name, text, layout = plain, says, rows = [] } of faulty)
    it(name, async () => {
      const table = await read(text, layout);
      expect(problemsOf(table)).toEqual(says);
      expect(rowsOf(table)).toEqual(rows);
    });

  it('counts all problems and lists the first twenty', async () => {
    const lines = Array.from({ length: 500 }, () => '2010-01-31,x');
    const { problems } = await read(`date,flow\n${lines.join('\n')}\n`, plain);
    expect(problems.total).toBe(500);
    expect(problems.first.map(({ line }) => line)).toEqual(
      Array.from({ length: 20 }, (_, index) => index + 2),
    );
  });
});
