import { describe, expect, it } from 'vitest';
import { differenceOfSeries } from './difference.ts';
import type { SeriesLayout } from './layout.ts';
import { readSeries } from './read.ts';

const layout: SeriesLayout = { time: 'date', values: 'rain', unit: 'mm', step: 'P1D', missing: ['NA'] };

async function difference(before: string, after: string, of: SeriesLayout = layout) {
  const read = (text: string) => readSeries([Buffer.from(text)], of, 'rain.csv');
  return differenceOfSeries(await read(before), await read(after));
}

const before = 'date,rain\n2010-01-01,1\n2010-01-02,2\n2010-01-03,NA\n2010-01-04,4\n';

describe('the difference of two versions of a series', () => {
  it('is none where only the text changed', async () => {
    expect(
      await difference(
        before,
        'date,rain\r\n2010-01-01,1.0\r\n2010-01-02,2e0\r\n2010-01-03,NA\r\n2010-01-04,4\r\n',
      ),
    ).toEqual({
      values: 3,
      changed: 0,
      totalBefore: 7,
      totalAfter: 7,
      first: null,
      last: null,
      unit: 'mm',
      unread: 0,
    });
  });

  it('is none where only the order changed', async () => {
    expect(
      await difference(before, 'date,rain\n2010-01-04,4\n2010-01-01,1\n2010-01-02,2\n2010-01-03,NA\n'),
    ).toMatchObject({
      changed: 0,
    });
  });

  it('counts values that differ, that became missing and that were missing', async () => {
    expect(
      await difference(before, 'date,rain\n2010-01-01,1\n2010-01-02,2.5\n2010-01-03,3\n2010-01-04,NA\n'),
    ).toEqual({
      values: 3,
      changed: 3,
      totalBefore: 7,
      totalAfter: 6.5,
      first: '2010-01-02',
      last: '2010-01-04',
      unit: 'mm',
      unread: 0,
    });
  });

  it('counts rows that were added and removed', async () => {
    expect(
      await difference(before, 'date,rain\n2009-12-31,9\n2010-01-02,2\n2010-01-03,NA\n2010-01-04,4\n'),
    ).toMatchObject({
      values: 3,
      changed: 2,
      first: '2009-12-31',
      last: '2010-01-01',
    });
  });

  it('counts repeated rows one by one', async () => {
    expect(await difference(before, `${before}2010-01-04,4\n`)).toMatchObject({
      values: 4,
      changed: 1,
      first: '2010-01-04',
    });
  });

  it('runs over all columns', async () => {
    const two = { ...layout, values: ['a', 'b'], step: 'P1M' };
    expect(await difference('date,a,b\n2010-01,1,2\n', 'date,b,a\n2010-01,3,1\n', two)).toMatchObject({
      values: 2,
      changed: 1,
      totalBefore: 3,
      totalAfter: 4,
      first: '2010-01',
    });
  });

  it('takes all values for new where the old file lacked the column', async () => {
    expect(await difference('date,snow\n2010-01-01,1\n', before)).toMatchObject({
      changed: 3,
      totalBefore: 0,
    });
  });
});
