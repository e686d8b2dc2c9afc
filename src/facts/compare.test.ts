import { describe, expect, it } from 'vitest';
import { compare, type Otherwise } from './compare.ts';

const plainly: Otherwise = { as: undefined, from: undefined, to: undefined };

describe('holding what a file says against a record', () => {
  it.each([
    ['1.4.2', '1.4.2', true],
    ['1.4', '1.4.0', false],
    ['1.10', '1.1', false],
    ['180', 180, true],
    ['1.80E+02', 180, true],
    ['1.8D2', 180, true],
    [180, 180, true],
    ['180.1', 180, false],
    ['false', false, true],
    [true, false, false],
    ['2001/10/01', '2001-10-01', true],
    ['20011001', '2001-10-01', true],
    ['01.10.2001', '2001-10-01', false],
    ['2003-10-01/2009-09-30', ['2003-10-01/2009-09-30'], true],
  ])('file %j, record %j: %s', (taken, value, agrees) => {
    expect(compare(taken, value, plainly)).toMatchObject({ agrees });
  });

  it('says what can’t be compared', () => {
    expect(compare('two', 2, plainly)).toBe('says `two`, where a number is expected');
    expect(compare('2', { zero_because: 'x' }, plainly)).toContain('no single value');
    expect(compare('2', [1, 2], plainly)).toContain('no single value');
    expect(compare('2', 180, { ...plainly, from: 'd', to: 'mm' })).toContain('can’t be compared');
    expect(compare('2', '2001-10-01', { ...plainly, as: 'years' })).toContain('no single value');
  });

  it('leaves open what a silent record says', () => {
    expect(compare('2', undefined, plainly)).toEqual({ stated: null, found: '2', agrees: false });
    expect(compare('2', undefined, { ...plainly, as: 'years' })).toEqual({
      stated: null,
      found: '2',
      agrees: false,
    });
  });

  it('converts units', () => {
    // 25.4 mm to the inch, exactly (international inch of 1959); 0 degC is 273.15 K.
    expect(compare('10', 254, { ...plainly, from: 'in', to: 'mm' })).toMatchObject({
      found: 254,
      agrees: true,
    });
    expect(compare('273.15', 0, { ...plainly, from: 'K', to: 'degC' })).toMatchObject({ agrees: true });
    expect(compare('274.15', 0, { ...plainly, from: 'K', to: 'degC' })).toMatchObject({ agrees: false });
  });
});

describe('a period as a file writes it', () => {
  const two = '2001-10-01/2003-09-30';
  it.each([
    ['years', two, 2],
    ['months', two, 24],
    ['days', two, 730], // 365 + 365; 2004 is the leap year
    ['days', '2003-10-01/2004-09-30', 366],
    ['years', '2003-10-01/2004-09-30', 1],
    ['months', '2001-01-15/2001-03-14', 2],
    ['first_day', two, '2001-10-01'],
    ['last_day', two, '2003-09-30'],
    ['first_year', two, 2001],
    ['last_year', two, 2003],
    ['years', ['2001-10-01/2003-09-30', '2005-10-01/2006-09-30'], 3],
    ['last_day', ['2001-10-01/2003-09-30', '2005-10-01/2006-09-30'], '2006-09-30'],
    ['years', { zero_because: 'starts from a measured state' }, 0],
    ['days', { zero_because: 'starts from a measured state' }, 0],
  ] as const)('%s of %j is %s', (as, value, stated) => {
    expect(compare(String(stated), value, { ...plainly, as })).toMatchObject({ stated, agrees: true });
  });

  it('gives a broken length in mean months', () => {
    // 100 days over a mean Gregorian month of 365.2425 / 12 days
    const compared = compare('3.3', '2001-01-01/2001-04-10', { ...plainly, as: 'months' });
    expect(compared).toMatchObject({ stated: expect.closeTo(100 / 30.436875, 9), agrees: false });
  });
});
