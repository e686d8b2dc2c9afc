import { describe, expect, it } from 'vitest';
import { few, figure } from './figures.ts';

describe('figures for people', () => {
  it.each([
    [5113, '5 113'],
    [11402.4, '11 402'],
    [1234567, '1 234 567'],
    [999.96, '1 000'],
    [12.34567, '12.35'],
    [0.00123456, '0.001235'],
    [0, '0'],
    [-11402, '-11 402'],
    [1e-12, '1e-12'],
  ])('%d is written %s', (value, written) => {
    expect(figure(value)).toBe(written);
  });

  it('shortens a list', () => {
    expect(few(['a', 'b', 'c'])).toBe('a, b, c');
    expect(few(['a', 'b', 'c', 'd', 'e'])).toBe('a, b, c and 2 more');
  });
});
