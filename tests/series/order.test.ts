import { describe, expect, it } from 'vitest';
import { parseDate } from '../../src/series/calendar.ts';
import { readSeries } from '../../src/series/read.ts';
import { piecesOf, plain, read, rowsOf } from './told.ts';

describe('order and step', () => {
  it('lists repeated, disordered and absent days, and puts rows in order', async () => {
    const table = await read(
      'date,flow\n2010-01-01,1\n2010-01-02,2\n2010-01-02,3\n2010-01-09,9\n2010-01-05,5\n2010-01-10,10\n',
      plain,
    );
    expect(rowsOf(table)).toEqual([
      '2010-01-01 1',
      '2010-01-02 2',
      '2010-01-02 3',
      '2010-01-05 5',
      '2010-01-09 9',
      '2010-01-10 10',
    ]);
    expect([...table.lines]).toEqual([2, 3, 4, 6, 5, 7]);
    expect(table.repeated).toMatchObject({
      total: 1,
      first: [{ line: 4, timeSeconds: seconds('2010-01-02') }],
    });
    expect(table.outOfOrder).toMatchObject({ total: 1, first: [{ line: 6 }] });
    expect(table.absent).toMatchObject({
      total: 5,
      first: [
        { firstSeconds: seconds('2010-01-03'), lastSeconds: seconds('2010-01-04'), steps: 2 },
        { firstSeconds: seconds('2010-01-06'), lastSeconds: seconds('2010-01-08'), steps: 3 },
      ],
    });
  });

  it('finds rows off the grid of hours', async () => {
    const table = await read('date,flow\n2010-01-01 00:00,1\n2010-01-01 00:50,2\n2010-01-01 03:00,3\n', {
      ...plain,
      step: 'PT1H',
    });
    expect(table.offStep).toMatchObject({ total: 1, first: [{ line: 3 }] });
    expect(table.absent.total).toBe(2);
  });

  it('finds absent months and quarters off the grid', async () => {
    const months = await read('date,flow\n2009-11,1\n2010-03,2\n', { ...plain, step: 'P1M' });
    expect(months.absent.total).toBe(3);
    const quarters = await read('date,flow\n2010-01,1\n2010-04,2\n2010-06,3\n', { ...plain, step: 'P3M' });
    expect(quarters.offStep).toMatchObject({ total: 1, first: [{ line: 4 }] });
  });

  it('asks nothing of the step of samples', async () => {
    const table = await read('date,flow\n2010-01-01,1\n2010-07-20,2\n', { ...plain, step: 'irregular' });
    expect(table.absent.total + table.offStep.total).toBe(0);
  });

  it('reads several files at once without mixing them', async () => {
    const texts = ['date,flow\n2010-01-01,1\n', 'date,flow\n2011-01-01,2\n2011-01-02,3\n'];
    const tables = await Promise.all(
      texts.map((text) => readSeries(piecesOf(Buffer.from(text), new Uint8Array(4)), plain, 'x')),
    );
    expect(tables.map(rowsOf)).toEqual([['2010-01-01 1'], ['2011-01-01 2', '2011-01-02 3']]);
  });
});

function seconds(date: string): number {
  return (parseDate(date) ?? Number.NaN) * 86_400;
}
