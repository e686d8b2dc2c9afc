import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { total } from './arithmetic.ts';
import { correlation } from './fit/correlation.ts';
import { klingGupta2009, klingGuptaOfTheMean } from './fit/kling-gupta-2009.ts';
import { klingGupta2012 } from './fit/kling-gupta-2012.ts';
import { nashSutcliffe } from './fit/nash-sutcliffe.ts';
import { percentBias } from './fit/percent-bias.ts';
import { isDefined, type Paired, pairedShare, pairInOrder, type Statistic } from './paired.ts';
import { type ScoreName, scores } from './scores.ts';

/** Laws that hold for every pair of series, from the formulas alone; no expected number is needed. */
const flow = fc.integer({ min: 1, max: 1_000_000 }).map((thousandths) => thousandths / 1000);
const pairsOf = (least: number) =>
  fc.array(fc.tuple(flow, flow), { minLength: least, maxLength: 60 }).map(fromRows);

function fromRows(rows: readonly (readonly [number, number])[]): Paired {
  return pairInOrder({ observed: rows.map(([o]) => o), simulated: rows.map(([, s]) => s) });
}

function rowsOf(paired: Paired): [number, number][] {
  return Array.from(paired.observed, (o, index) => [o, paired.simulated[index] ?? Number.NaN]);
}

function value(statistic: Statistic): number {
  return isDefined(statistic) ? statistic.value : Number.NaN;
}

function near(actual: number, wanted: number, slack = 1e-9): void {
  expect(Math.abs(actual - wanted)).toBeLessThanOrEqual(slack * Math.max(1, Math.abs(wanted)));
}

const names = Object.keys(scores) as ScoreName[];
const best: Partial<Record<ScoreName, number>> = {
  ...{ nse: 1, log_nse: 1, rsr: 0, pbias: 0, r: 1, r2: 1, gradient: 1, rmse: 0, mae: 0 },
  ...{ kge: 1, kge_2012: 1, alpha: 1, beta: 1, gamma: 1, d: 1, fhv: 0, fms: 0, flv: 0 },
};

describe('laws of the scores', () => {
  it('are the manifest’s scores, peaks aside', () => {
    const schema = JSON.parse(readFileSync('schemas/manifest.schema.json', 'utf8'));
    expect([...names, 'peaks_hit'].sort()).toEqual(Object.keys(schema.$defs.Scores.properties).sort());
  });

  it('a perfect fit scores the best or has a reason', () =>
    fc.assert(
      fc.property(fc.array(flow, { maxLength: 60 }), (flows) => {
        const perfect = pairInOrder({ observed: flows, simulated: flows });
        for (const name of names) {
          const score = scores[name](perfect);
          const wanted = best[name];
          if (isDefined(score) && wanted !== undefined) near(score.value, wanted);
        }
      }),
    ));

  it('the observed mean as model gives NSE 0, RSR 1, PBIAS 0, and no correlation', () =>
    fc.assert(
      fc.property(fc.array(flow, { minLength: 2, maxLength: 60 }), (flows) => {
        fc.pre(new Set(flows).size > 1);
        const observedMean = total(flows) / flows.length;
        const model = pairInOrder({ observed: flows, simulated: flows.map(() => observedMean) });
        near(value(scores.nse(model)), 0);
        near(value(scores.rsr(model)), 1);
        near(value(scores.pbias(model)), 0);
        expect(isDefined(scores.kge(model))).toBe(false);
      }),
    ));

  it('equal values leave nothing to explain, though their mean may round away from them', () =>
    fc.assert(
      fc.property(
        flow,
        fc.integer({ min: 2, max: 50 }),
        fc.array(flow, { minLength: 50, maxLength: 50 }),
        (same, n, flows) => {
          const simulated = flows.slice(0, n);
          const equal = pairInOrder({ observed: simulated.map(() => same), simulated });
          for (const name of ['nse', 'log_nse', 'rsr', 'r', 'kge', 'alpha', 'd'] as const)
            expect(isDefined(scores[name](equal)), name).toBe(false);
        },
      ),
    ));

  it('1 - sqrt 2 is the limit of KGE for noise about the observed mean', () => {
    // Symmetric and uncorrelated with the observations, its size going to zero.
    const noise = [1, -1, -1, 1].map((sign) => 5 + sign * 1e-9);
    const paired = pairInOrder({ observed: [4, 4, 6, 6], simulated: noise });
    near(value(scores.kge(paired)), klingGuptaOfTheMean, 1e-6);
  });

  it('no score is NaN or infinite, whatever finite numbers come', () =>
    fc.assert(
      fc.property(fc.array(fc.tuple(anyNumber, anyNumber), { maxLength: 12 }).map(fromRows), (paired) => {
        for (const name of names) {
          const score = scores[name](paired);
          if (isDefined(score)) expect(Number.isFinite(score.value), name).toBe(true);
          else expect(score.undefined.length, name).toBeGreaterThan(10);
        }
      }),
      { numRuns: 500 },
    ));

  it('the order of the steps does not matter', () =>
    fc.assert(
      fc.property(pairsOf(2), fc.integer(), (paired, seed) => {
        const rows = rowsOf(paired);
        const shuffled = fromRows(
          rows
            .map((row, index) => ({ row, key: Math.sin(seed + index) }))
            .sort((a, b) => a.key - b.key)
            .map(({ row }) => row),
        );
        for (const name of names) {
          const [one, other] = [scores[name](paired), scores[name](shuffled)];
          expect(isDefined(one), name).toBe(isDefined(other));
          if (isDefined(one) && isDefined(other)) near(other.value, one.value, 1e-7);
        }
      }),
    ));

  it('steps without a pair change nothing but the share', () =>
    fc.assert(
      fc.property(pairsOf(1), fc.array(fc.nat(60), { maxLength: 10 }), (paired, gaps) => {
        const rows: [number | null, number | null][] = rowsOf(paired);
        for (const gap of gaps)
          rows.splice(gap % (rows.length + 1), 0, gap % 2 ? [null, gap] : [gap, Number.NaN]);
        const gappy = pairInOrder({ observed: rows.map(([o]) => o), simulated: rows.map(([, s]) => s) });
        for (const name of names) expect(scores[name](gappy), name).toEqual(scores[name](paired));
        near(value(pairedShare(gappy)), paired.observed.length / rows.length);
        expect(gappy.dropped.missingObserved + gappy.dropped.missingSimulated).toBe(gaps.length);
      }),
    ));

  it('another unit changes only what has a unit', () =>
    fc.assert(
      fc.property(pairsOf(2), fc.constantFrom(0.001, 86.4, 25.4, 1000), (paired, factor) => {
        const scaled = fromRows(rowsOf(paired).map(([o, s]) => [o * factor, s * factor]));
        for (const name of names) {
          const [one, other] = [scores[name](paired), scores[name](scaled)];
          // A near-zero spread may round to none or to a little under another factor.
          if (!isDefined(one) || !isDefined(other)) continue;
          const grows = name === 'rmse' || name === 'mae' || name === 'intercept';
          near(other.value, grows ? one.value * factor : one.value, 1e-6);
        }
      }),
    ));

  it('a shared shift leaves NSE, RSR, r, RMSE, MAE and d', () =>
    fc.assert(
      fc.property(pairsOf(2), fc.integer({ min: -500, max: 500 }), (paired, shift) => {
        const shifted = fromRows(rowsOf(paired).map(([o, s]) => [o + shift, s + shift]));
        for (const name of ['nse', 'rsr', 'r', 'rmse', 'mae', 'd'] as const) {
          const [one, other] = [scores[name](paired), scores[name](shifted)];
          if (isDefined(one) && isDefined(other)) near(other.value, one.value, 1e-6);
        }
      }),
    ));

  it('RSR is sqrt(1 - NSE), PBIAS is 100 (1 - beta), NSE stays at or below r^2, MAE at or below RMSE', () =>
    fc.assert(
      fc.property(pairsOf(2), (paired) => {
        const of = (name: ScoreName) => value(scores[name](paired));
        fc.pre(isDefined(scores.r(paired)));
        near(of('rsr'), Math.sqrt(Math.max(0, 1 - of('nse'))), 1e-6);
        near(of('pbias'), 100 * (1 - of('beta')));
        expect(of('nse')).toBeLessThanOrEqual(of('r2') + 1e-9);
        expect(of('mae')).toBeLessThanOrEqual(of('rmse') * (1 + 1e-12) + 1e-12);
        expect(Math.abs(of('r'))).toBeLessThanOrEqual(1);
        for (const name of ['nse', 'kge', 'kge_2012', 'd'] as const) expect(of(name)).toBeLessThanOrEqual(1);
        expect(of('d')).toBeGreaterThanOrEqual(-1e-12);
      }),
    ));

  it('KGE is its parts’ distance from 1, and at least the sum of their gaps allows', () =>
    fc.assert(
      fc.property(pairsOf(2), (paired) => {
        const [older, newer] = [klingGupta2009(paired), klingGupta2012(paired)];
        fc.pre(isDefined(older) && isDefined(newer));
        if (!isDefined(older) || !isDefined(newer)) return;
        const { efficiency, r, alpha, beta } = older.value;
        near(efficiency, 1 - Math.sqrt((r - 1) ** 2 + (alpha - 1) ** 2 + (beta - 1) ** 2));
        for (const part of [r, alpha, beta])
          expect(efficiency).toBeLessThanOrEqual(1 - Math.abs(part - 1) + 1e-12);
        near(newer.value.gamma, alpha / beta);
      }),
    ));

  it('errors of two windows add up: squares, sums and water lacking', () =>
    fc.assert(
      fc.property(pairsOf(2), pairsOf(2), (first, second) => {
        const whole = fromRows([...rowsOf(first), ...rowsOf(second)]);
        const squares = (paired: Paired) => value(scores.rmse(paired)) ** 2 * paired.observed.length;
        near(squares(whole), squares(first) + squares(second), 1e-9);
        const lacking = (paired: Paired) => value(percentBias(paired)) * total(paired.observed);
        near(lacking(whole), lacking(first) + lacking(second), 1e-8);
      }),
    ));

  it('swapping the sides keeps r and turns beta over', () =>
    fc.assert(
      fc.property(pairsOf(2), (paired) => {
        const swapped = fromRows(rowsOf(paired).map(([o, s]) => [s, o]));
        const [one, other] = [correlation(paired), correlation(swapped)];
        fc.pre(isDefined(one) && isDefined(other));
        near(value(other), value(one));
        near(value(scores.beta(swapped)) * value(scores.beta(paired)), 1);
      }),
    ));

  it('scaling the simulation by its own regression reaches r^2', () =>
    fc.assert(
      fc.property(pairsOf(3), (paired) => {
        const r2 = scores.r2(paired);
        fc.pre(isDefined(r2));
        // Regression of the observed on the simulated side: the best linear rescaling.
        const back = fromRows(rowsOf(paired).map(([o, s]) => [s, o]));
        const [gradient, intercept] = [value(scores.gradient(back)), value(scores.intercept(back))];
        const rescaled = fromRows(rowsOf(paired).map(([o, s]) => [o, intercept + gradient * s]));
        near(value(nashSutcliffe(rescaled)), value(r2), 1e-7);
      }),
    ));
});

const anyNumber = fc.oneof(
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.constantFrom(0, -0, 0.1, 1, 1e-320, 1e300, -1e300, 1e8 + 0.1),
);
