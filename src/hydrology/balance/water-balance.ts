import { total } from '../arithmetic.ts';
import { computed, type Statistic, undefinedBecause } from '../paired.ts';

export interface WaterBalance {
  readonly inflowMm: number;
  readonly outflowMm: number;
  readonly storageChangeMm: number;
  /** What came in, did not go out and was not stored. */
  readonly residualMm: number;
  /** Residual as a share of the inflow; positive = water is lost. */
  readonly residualShare: Statistic;
  /** Storage change as a share of the inflow. */
  readonly storageShare: Statistic;
}

/**
 * Water balance of a control volume over a window.
 *
 * Formula: residual = sum(inflows) - sum(outflows) - (storage after - storage before)
 * Inputs: totals of each term over the window, storage at the end of the day before its first and at the end of its last day; all mm over one area.
 * Range: best residual 0; a model's own balance closes to 1 % of the inflow, better 0.1 %.
 * Read: held against the inflow, not the runoff. Storage taken a day late makes a residual of one day's change.
 * Undefined: the shares, without inflow.
 * Source: conservation of mass; tolerances: Anderson & Woessner 1992, Applied Groundwater Modeling (from memory).
 * Example: waterBalance({inflowsMm: [1000], outflowsMm: [500, 480], storageBeforeMm: 100, storageAfterMm: 110}) -> {inflowMm: 1000, outflowMm: 980, storageChangeMm: 10, residualMm: 10, residualShare: {value: 0.01}}
 */
export function waterBalance(of: {
  readonly inflowsMm: ArrayLike<number>;
  readonly outflowsMm: ArrayLike<number>;
  readonly storageBeforeMm: number;
  readonly storageAfterMm: number;
}): WaterBalance {
  const inflowMm = total(of.inflowsMm);
  const outflowMm = total(of.outflowsMm);
  const storageChangeMm = of.storageAfterMm - of.storageBeforeMm;
  const residualMm = inflowMm - outflowMm - storageChangeMm;
  const share = (part: number) =>
    inflowMm > 0
      ? computed(part / inflowMm)
      : undefinedBecause('without inflow there is nothing to compare with');
  return {
    inflowMm,
    outflowMm,
    storageChangeMm,
    residualMm,
    residualShare: share(residualMm),
    storageShare: share(storageChangeMm),
  };
}
