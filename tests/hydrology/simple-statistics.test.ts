import * as npm from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import { mean, median, sampleDeviation, total } from '../../src/hydrology/arithmetic.ts';
import { quantile } from '../../src/hydrology/distribution/quantile.ts';
import { isDefined, pairInOrder, type Statistic } from '../../src/hydrology/paired.ts';
import { scores } from '../../src/hydrology/scores.ts';
import { inventedPair } from './invented.ts';

/** Live comparison with the npm library simple-statistics, where it has the same statistic. */
const seeds = Array.from({ length: 30 }, (_, index) => index + 3);

function near(actual: number, wanted: number): void {
  expect(Math.abs(actual - wanted)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(wanted)));
}

function value(statistic: Statistic): number {
  if (!isDefined(statistic)) throw new Error(statistic.undefined);
  return statistic.value;
}

describe('against simple-statistics', () => {
  for (const seed of seeds)
    it(`series of ${seed * 5} invented flows`, () => {
      const { observed, simulated } = inventedPair(seed, seed * 5);
      const paired = pairInOrder({ observed, simulated });
      const rows = observed.map((flow, index) => [flow, simulated[index] ?? Number.NaN]);
      const errors = observed.map((flow, index) => flow - (simulated[index] ?? Number.NaN));

      near(total(observed), npm.sum(observed));
      near(mean(observed), npm.mean(observed));
      near(median(observed), npm.median(observed));
      near(sampleDeviation(observed), npm.sampleStandardDeviation(observed));
      near(value(scores.r(paired)), npm.sampleCorrelation(observed, simulated));
      const { m, b } = npm.linearRegression(rows);
      near(value(scores.gradient(paired)), m);
      near(value(scores.intercept(paired)), b);
      near(value(scores.rmse(paired)), npm.rootMeanSquare(errors));
      near(value(scores.mae(paired)), npm.mean(errors.map(Math.abs)));
      near(value(scores.alpha(paired)), npm.standardDeviation(simulated) / npm.standardDeviation(observed));
      near(value(scores.beta(paired)), npm.mean(simulated) / npm.mean(observed));
      near(
        value(scores.gamma(paired)),
        npm.coefficientOfVariation(simulated) / npm.coefficientOfVariation(observed),
      );

      // Its r-squared of a function against data is 1 - SSE / SST: NSE with each step as its own x.
      const steps = observed.map((flow, step) => [step, flow]);
      near(
        value(scores.nse(paired)),
        npm.rSquared(steps, (step) => simulated[step] ?? Number.NaN),
      );
      near(value(scores.r2(paired)), npm.rSquared(rows, npm.linearRegressionLine({ m, b })));

      // Its median is every quantile type's; other probabilities follow a definition of their own.
      near(value(quantile({ values: observed, probability: 0.5, type: 7 })), npm.quantile(observed, 0.5));
      near(value(quantile({ values: observed, probability: 0.5, type: 6 })), npm.quantile(observed, 0.5));
    });
});
