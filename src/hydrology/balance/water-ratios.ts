import { computed, type Statistic, undefinedBecause } from '../paired.ts';

export interface WaterRatios {
  readonly runoffRatio: Statistic;
  readonly evaporativeIndex: Statistic;
  readonly aridity: Statistic;
}

/**
 * Runoff ratio, evaporative index and aridity of a catchment over a window.
 *
 * Formula: Q / P, ET / P, PET / P
 * Inputs: totals over one window in mm over one area.
 * Range: 0 upwards; runoff ratio and evaporative index at most 1 in the long run unless water is imported or taken from storage.
 * Read: over whole years, five to ten at least, so that storage does not matter.
 * Undefined: no rainfall.
 * Source: Budyko 1974, Climate and Life.
 * Example: waterRatios({rainfallMm: 1000, runoffMm: 400, evapotranspirationMm: 580, potentialMm: 700}) -> {runoffRatio: {value: 0.4}, evaporativeIndex: {value: 0.58}, aridity: {value: 0.7}}
 */
export function waterRatios(of: {
  readonly rainfallMm: number;
  readonly runoffMm: number;
  readonly evapotranspirationMm: number;
  readonly potentialMm: number;
}): WaterRatios {
  const share = (part: number) =>
    of.rainfallMm > 0 ? computed(part / of.rainfallMm) : undefinedBecause('there is no rainfall');
  return {
    runoffRatio: share(of.runoffMm),
    evaporativeIndex: share(of.evapotranspirationMm),
    aridity: share(of.potentialMm),
  };
}
