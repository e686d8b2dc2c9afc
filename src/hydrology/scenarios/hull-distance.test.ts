import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isDefined } from '../paired.ts';
import { hullDistance } from './hull-distance.ts';
import { leverageLimit } from './leverage-limit.ts';
import { mahalanobis } from './mahalanobis.ts';

const square = [
  [0, 0],
  [2, 0],
  [0, 2],
  [2, 2],
];

describe('the joint domain', () => {
  it('holds its own years, its edges and its middle', () => {
    for (const point of [...square, [1, 0], [1, 1], [2, 1.5]])
      expect(hullDistance({ sample: square, point }), String(point)).toEqual({ value: 0 });
  });

  it('measures outside in standard deviations', () => {
    // sd with n - 1 of 0, 0, 2, 2 is 2 / sqrt 3; three units away along one driver
    const away = hullDistance({ sample: square, point: [5, 1] });
    expect(isDefined(away) && away.value).toBeCloseTo((3 * Math.sqrt(3)) / 2, 10);
  });

  it('a point inside both ranges can lie outside the domain', () => {
    const wetOrHot = [
      [0, 0],
      [1, 1.1],
      [2, 1.9],
      [3, 3],
    ];
    const both = hullDistance({ sample: wetOrHot, point: [0.5, 2.5] });
    expect(isDefined(both) && both.value).toBeGreaterThan(1);
    expect(mahalanobis({ sample: wetOrHot, point: [0.5, 2.5] })).toMatchObject({ value: { beyond: true } });
  });

  // Whole numbers on a small grid: corners, edges, faces and doubled points abound.
  const grid = fc.integer({ min: 1, max: 3 }).chain((drivers) =>
    fc.record({
      sample: fc.array(fc.array(fc.integer({ min: 0, max: 4 }), { minLength: drivers, maxLength: drivers }), {
        minLength: drivers + 1,
        maxLength: 12,
      }),
      direction: fc.array(fc.integer({ min: -3, max: 3 }), { minLength: drivers, maxLength: drivers }),
      shares: fc.array(fc.integer({ min: 0, max: 5 }), { minLength: 12, maxLength: 12 }),
    }),
  );
  const along = (row: readonly number[], direction: readonly number[]) =>
    row.reduce((sum, value, driver) => sum + value * (direction[driver] ?? 0), 0);

  it('every mixture of its years is inside', () =>
    fc.assert(
      fc.property(grid, ({ sample, shares }) => {
        const whole = sample.reduce((sum, _, year) => sum + (shares[year] ?? 0), 0);
        fc.pre(whole > 0);
        const point = (sample[0] ?? []).map(
          (_, driver) =>
            sample.reduce((sum, row, year) => sum + (shares[year] ?? 0) * (row[driver] ?? 0), 0) / whole,
        );
        const distance = hullDistance({ sample, point });
        if (isDefined(distance)) expect(distance.value).toBe(0);
      }),
      { numRuns: 1000 },
    ));

  it('every point beyond all years in some direction is outside', () =>
    fc.assert(
      fc.property(grid, ({ sample, direction }) => {
        fc.pre(direction.some((part) => part !== 0));
        const [furthest = []] = sample.toSorted((a, b) => along(b, direction) - along(a, direction));
        const point = furthest.map((value, driver) => value + 0.01 * (direction[driver] ?? 0));
        const distance = hullDistance({ sample, point });
        if (isDefined(distance)) expect(distance.value).toBeGreaterThan(1e-4);
      }),
      { numRuns: 1000 },
    ));

  it.each([
    [
      'drivers that depend on each other',
      [
        [1, 2],
        [2, 4],
        [3, 6],
        [5, 10],
      ],
      [2, 4],
    ],
    [
      'a driver that never varied',
      [
        [1, 7],
        [2, 7],
        [3, 7],
      ],
      [2, 7],
    ],
    [
      'too few years',
      [
        [1, 7],
        [2, 8],
      ],
      [2, 7],
    ],
    ['a row without a value', [[1, 7], [2], [3, 4]], [2, 7]],
    ['no drivers', [[], [], []], []],
  ])('has a reason for %s', (_, sample, point) => {
    expect(isDefined(hullDistance({ sample, point }))).toBe(false);
    expect(isDefined(mahalanobis({ sample, point }))).toBe(false);
    expect(isDefined(leverageLimit(sample))).toBe(false);
  });

  it('has a reason for more than three drivers, where the distance still has a value', () => {
    const sample = [
      [0, 0, 0, 0],
      [1, 0, 0, 0],
      [0, 1, 0, 0],
      [0, 0, 1, 0],
      [0, 0, 0, 1],
      [1, 1, 1, 1],
    ];
    expect(isDefined(hullDistance({ sample, point: [0, 0, 0, 0] }))).toBe(false);
    expect(isDefined(mahalanobis({ sample, point: [0, 0, 0, 0] }))).toBe(true);
  });
});
