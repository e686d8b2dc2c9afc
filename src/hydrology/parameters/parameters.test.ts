import { describe, expect, it } from 'vitest';
import { isDefined } from '../paired.ts';
import { boundPosition } from './bound-position.ts';
import { changedValue } from './changed-value.ts';
import { compositeCurveNumber } from './composite-curve-number.ts';
import { curveNumberRunoff } from './curve-number-runoff.ts';

describe('parameters', () => {
  it('curve number 75 and 6.0 in of rain give 3.28 in of runoff (TR-55 1986, from memory)', () => {
    const storm = curveNumberRunoff({ curveNumber: 75, rainfallMm: 6 * 25.4 });
    expect(isDefined(storm) && storm.value.runoffMm / 25.4).toBeCloseTo(3.28, 2);
  });

  it('a curve number of 100 lets all rain run off; sealing raises every other', () => {
    expect(curveNumberRunoff({ curveNumber: 100, rainfallMm: 40 })).toMatchObject({
      value: { runoffMm: 40 },
    });
    for (const pervious of [30, 61, 74, 80, 97]) {
      const sealed = compositeCurveNumber({ pervious, sealedPercent: 30 });
      expect(isDefined(sealed) && sealed.value).toBeGreaterThan(pervious);
    }
    expect(isDefined(curveNumberRunoff({ curveNumber: 0, rainfallMm: 40 }))).toBe(false);
    expect(isDefined(curveNumberRunoff({ curveNumber: 75, rainfallMm: Number.NaN }))).toBe(false);
  });

  it('a value can sit at its bound in logarithms and not in plain numbers', () => {
    const range = { value: 1.03, lower: 1, upper: 1000, tolerance: 0.01 };
    // ln 1.03 / ln 1000 = 0.0043
    expect(boundPosition({ ...range, logarithmic: true })).toMatchObject({
      value: { state: 'at lower bound' },
    });
    // (10 - 1) / 999 = 0.009; ln 10 / ln 1000 = 0.333
    expect(boundPosition({ ...range, value: 10, logarithmic: false })).toMatchObject({
      value: { state: 'at lower bound' },
    });
    expect(boundPosition({ ...range, value: 10, logarithmic: true })).toMatchObject({
      value: { state: 'inside' },
    });
  });

  it('fixed and broken ranges', () => {
    const range = { lower: 5, upper: 5, tolerance: 0.01, logarithmic: false };
    expect(boundPosition({ ...range, value: 5 })).toMatchObject({ value: { state: 'fixed' } });
    expect(boundPosition({ ...range, value: 6 })).toMatchObject({ value: { state: 'outside' } });
    expect(isDefined(boundPosition({ ...range, lower: 9, value: 6 }))).toBe(false);
    expect(isDefined(boundPosition({ ...range, lower: 0, value: 3, logarithmic: true }))).toBe(false);
  });

  it('the three ways of change', () => {
    expect(changedValue({ change: 'set', initial: 150, by: 182 })).toEqual({ value: 182 });
    expect(changedValue({ change: 'shift', initial: 0.5, by: 0.4 })).toEqual({ value: 0.9 });
    expect(changedValue({ change: 'scale', initial: 1, by: 0.93 })).toEqual({ value: 0.93 });
    expect(isDefined(changedValue({ change: 'scale', initial: 1, by: 0 }))).toBe(false);
  });
});
