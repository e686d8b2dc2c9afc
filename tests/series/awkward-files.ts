import type { SeriesLayout } from '../../src/series/layout.ts';
import { plain } from './told.ts';

export const twoDays = ['2010-01-31 1.5', '2010-02-01 0.25'];

/** Files as modellers have them, all of two days with the flows 1.5 and 0.25 unless rows are given. */
export const awkward: readonly {
  readonly name: string;
  readonly text: string | Uint8Array;
  readonly layout?: SeriesLayout;
  readonly rows?: readonly string[];
}[] = [
  { name: 'commas', text: 'date,flow\n2010-01-31,1.5\n2010-02-01,0.25\n' },
  { name: 'no line end after the last row', text: 'date,flow\n2010-01-31,1.5\n2010-02-01,0.25' },
  { name: 'Windows line ends', text: 'date,flow\r\n2010-01-31,1.5\r\n2010-02-01,0.25\r\n' },
  { name: 'line ends of old Macintoshes', text: 'date,flow\r2010-01-31,1.5\r2010-02-01,0.25\r' },
  { name: 'a byte-order mark', text: '\uFEFFdate,flow\n2010-01-31,1.5\n2010-02-01,0.25\n' },
  {
    name: 'a byte-order mark before a quoted name',
    text: '\uFEFF"date",flow\n2010-01-31,1.5\n2010-02-01,0.25\n',
  },
  { name: 'blank lines', text: '\ndate,flow\n\n2010-01-31,1.5\n  \n2010-02-01,0.25\n\n\n' },
  { name: 'blanks around fields', text: ' date , flow\n2010-01-31 ,  1.5 \n 2010-02-01, 0.25\n' },
  { name: 'quoted fields', text: '"date","flow"\n"2010-01-31","1.5"\n"2010-02-01", "0.25" \n' },
  {
    name: 'quoted fields with separators, line ends and quotation marks inside',
    text: 'date,remark,flow\n2010-01-31,"ice, ""thick"",\nsecond line",1.5\r\n2010-02-01,"",0.25\n',
  },
  {
    name: 'columns that are not asked for',
    text: 'id,flow,date,note\n7,1.5,2010-01-31,x\n7,0.25,2010-02-01,\n',
  },
  { name: 'empty fields after the last column', text: 'date,flow\n2010-01-31,1.5,,\n2010-02-01,0.25,\n' },
  {
    name: 'a sign, an exponent, no digit before or after the point',
    text: 'date,flow\n2010-01-31,+15.e-1\n2010-02-01,.25D+00\n',
  },
  { name: 'the hour of a daily value', text: 'date,flow\n2010-01-31T09:00,1.5\n2010-02-01 24:00:00Z,0.25\n' },
  {
    name: 'semicolons and decimal comma',
    text: 'date;flow\n2010-01-31;1,5\n2010-02-01;0,25\n',
    layout: { ...plain, separator: 'semicolon', decimal: 'comma' },
  },
  {
    name: 'commas and quoted decimal commas',
    text: 'date,flow\n2010-01-31,"1,5"\n2010-02-01,"0,25"\n',
    layout: { ...plain, decimal: 'comma' },
  },
  {
    name: 'tabs, and blanks in a name',
    text: 'date\tmean flow\n2010-01-31\t1.5\n2010-02-01\t 0.25\n',
    layout: { ...plain, separator: 'tab', values: 'mean flow' },
  },
  {
    name: 'an empty field between tabs',
    text: 'date\tnote\tflow\n2010-01-31\t\t1.5\n2010-02-01\tx\t0.25\n',
    layout: { ...plain, separator: 'tab' },
  },
  {
    name: 'runs of blanks, at the ends too',
    text: '   date        flow  \n 2010-01-31    1.5\n 2010-02-01 \t   0.25  \n',
    layout: { ...plain, separator: 'blank' },
  },
  {
    name: 'a header of several words over columns set in blanks',
    text: 'Date  Mean daily flow (m3/s)\n2010-01-31  1.5\n2010-02-01  0.25\n',
    layout: { ...plain, separator: 'blank', time: 1, values: 2 },
  },
  {
    name: 'lines to skip',
    text: 'Station: "Old Mill\nUnits, m3/s, daily\n\ndate,flow\n2010-01-31,1.5\n2010-02-01,0.25\n',
    layout: { ...plain, skip_lines: 3 },
  },
  {
    name: 'comments',
    text: '# Old Mill\n#\ndate,flow\n2010-01-31,1.5\n  # gauge moved\n2010-02-01,0.25\n#end',
    layout: { ...plain, comment: '#' },
  },
  {
    name: 'no header',
    text: '2010-01-31,1.5\n2010-02-01,0.25\n',
    layout: { ...plain, header: false, time: 1, values: 2 },
  },
  {
    name: 'declared codes of missing values',
    text: 'date,flow\n2010-01-30,NA\n2010-01-31,-9.90\n2010-02-01,\n2010-02-02,"NA"\n2010-02-03,-999\n2010-02-04,-0.9\n',
    layout: { ...plain, missing: ['NA', -9.9, '', '-999.0'] },
    rows: ['2010-01-30 -', '2010-01-31 -', '2010-02-01 -', '2010-02-02 -', '2010-02-03 -', '2010-02-04 -0.9'],
  },
  {
    name: 'a missing code with decimal comma',
    text: 'date;flow\n2010-01-31;-9,9\n',
    layout: { ...plain, separator: 'semicolon', decimal: 'comma', missing: ['-9,9'] },
    rows: ['2010-01-31 -'],
  },
  {
    name: 'several value columns',
    text: 'date,soil,deep\n2010-01-31,1,2\n2010-02-01,3,4\n',
    layout: { ...plain, values: ['deep', 'soil'] },
    rows: ['2010-01-31 2 1', '2010-02-01 4 3'],
  },
  {
    name: 'dates in the German manner',
    text: 'date,flow\n31.01.2010,1.5\n01.02.2010,0.25\n',
    layout: { ...plain, time: { column: 'date', pattern: 'DD.MM.YYYY' } },
  },
  {
    name: 'unpadded dates',
    text: 'date,flow\n1/31/2010,1.5\n2/1/2010,0.25\n',
    layout: { ...plain, time: { column: 'date', pattern: 'M/D/YYYY' } },
  },
  {
    name: 'dates with names of months',
    text: 'date,flow\n31-Jan-2010,1.5\n01-FEB-2010,0.25\n',
    layout: { ...plain, time: { column: 'date', pattern: 'DD-MMM-YYYY' } },
  },
  {
    name: 'compact dates',
    text: 'date,flow\n20100131,1.5\n20100201,0.25\n',
    layout: { ...plain, time: { column: 'date', pattern: 'YYYYMMDD' } },
  },
  {
    name: 'year and day of the year in one column',
    text: 'date,flow\n2010-031,1.5\n2010-032,0.25\n',
    layout: { ...plain, time: { column: 'date', pattern: 'YYYY-DDD' } },
  },
  {
    name: 'columns of year, month and day',
    text: 'year month day flow\n2010 1 31 1.5\n2010 02 01 0.25\n',
    layout: { ...plain, separator: 'blank', time: { year: 'year', month: 'month', day: 'day' } },
  },
  {
    name: 'columns of year and day of the year',
    text: 'flow,year,doy\n1.5,2010,31\n0.25,2010,32\n',
    layout: { ...plain, time: { year: 'year', day_of_year: 'doy' } },
  },
  {
    name: 'day 366 of a leap year',
    text: 'year,doy,flow\n2012,366,1.5\n2013,1,0.25\n',
    layout: { ...plain, time: { year: 1, day_of_year: 2 } },
    rows: ['2012-12-31 1.5', '2013-01-01 0.25'],
  },
  {
    name: "a model's counter of days",
    text: 'day,flow\n1,1.5\n2,0.25\n',
    layout: { ...plain, time: { counter: 'day', starts: '2010-01-31' } },
  },
  {
    name: "a spreadsheet's serial days",
    text: 'day,flow\n40209,1.5\n40210,0.25\n',
    layout: { ...plain, time: { counter: 'day', first: 0, starts: '1899-12-30' } },
  },
  {
    name: 'a counter of hours',
    text: 'hour,flow\n0,1.5\n25,0.25\n',
    layout: { values: 'flow', step: 'PT1H', time: { counter: 'hour', first: 0, starts: '2010-01-31T06:00' } },
    rows: ['2010-01-31T06:00 1.5', '2010-02-01T07:00 0.25'],
  },
  {
    name: 'columns with the hour 24',
    text: 'y,m,d,h,flow\n2010,1,31,23,1.5\n2010,1,31,24,0.25\n',
    layout: { values: 'flow', step: 'PT1H', time: { year: 'y', month: 'm', day: 'd', hour: 'h' } },
    rows: ['2010-01-31T23:00 1.5', '2010-02-01T00:00 0.25'],
  },
  {
    name: 'times with quarter hours, midnight written as a date',
    text: 'date,flow\n2010-01-31 23:45,1.5\n2010-02-01,0.25\n',
    layout: { ...plain, step: 'PT15M' },
    rows: ['2010-01-31T23:45 1.5', '2010-02-01T00:00 0.25'],
  },
  {
    name: 'times with offsets brought to the stated clock of the station',
    text: 'date,flow\n2010-01-31T23:00Z,1.5\n2010-02-01T11:00:00+11:00,0.25\n',
    layout: { ...plain, step: 'PT1H', utc_offset: '+10:00' },
    rows: ['2010-02-01T09:00 1.5', '2010-02-01T10:00 0.25'],
  },
  {
    name: 'times over a change to summer time brought to the offset of the first',
    text: 'date,flow\n2010-03-28T01:00+01:00,1.5\n2010-03-28T03:00+02:00,0.25\n',
    layout: { ...plain, step: 'PT1H' },
    rows: ['2010-03-28T01:00 1.5', '2010-03-28T02:00 0.25'],
  },
  {
    name: 'seconds',
    text: 'date,flow\n2010-01-31T10:00:30,1.5\n2010-01-31T10:01,0.25\n',
    layout: { ...plain, step: 'PT30S' },
    rows: ['2010-01-31T10:00:30 1.5', '2010-01-31T10:01 0.25'],
  },
  {
    name: 'months without a day, with their first or their last',
    text: 'month,flow\n2010-01,1.5\n2010-02-01,0.25\n2010-03-31,3\n',
    layout: { time: 'month', values: 'flow', step: 'P1M' },
    rows: ['2010-01 1.5', '2010-02 0.25', '2010-03 3'],
  },
  {
    name: 'months in two columns',
    text: 'year,month,flow\n2010,1,1.5\n2010,2,0.25\n',
    layout: { time: { year: 'year', month: 'month' }, values: 'flow', step: 'P1M' },
    rows: ['2010-01 1.5', '2010-02 0.25'],
  },
  {
    name: 'years',
    text: 'year,volume\n1871,1120\n1872,1160\n',
    layout: { time: 'year', values: 'volume', step: 'P1Y' },
    rows: ['1871 1120', '1872 1160'],
  },
  {
    name: 'samples at no fixed step',
    text: 'date,flow\n2010-01-31,1.5\n2010-02-05T11:20,0.25\n',
    layout: { ...plain, step: 'irregular' },
    rows: ['2010-01-31 1.5', '2010-02-05T11:20 0.25'],
  },
  {
    name: 'rows before 1900 and before 1970',
    text: 'date,flow\n1900-02-28,1.5\n1900-03-01,0.25\n',
    rows: ['1900-02-28 1.5', '1900-03-01 0.25'],
  },
];
