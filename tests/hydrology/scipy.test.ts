import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { chiSquareLimit } from '../../src/hydrology/distribution/chi-square-limit.ts';
import { chiSquareTail } from '../../src/hydrology/distribution/chi-square-tail.ts';
import { kolmogorovSmirnov } from '../../src/hydrology/distribution/kolmogorov-smirnov.ts';
import { normalTails } from '../../src/hydrology/distribution/normal-tails.ts';
import { quantile } from '../../src/hydrology/distribution/quantile.ts';
import { studentTails } from '../../src/hydrology/distribution/student-tails.ts';
import { doubleMass } from '../../src/hydrology/forcing/double-mass.ts';
import { isDefined, pairInOrder, type Statistic } from '../../src/hydrology/paired.ts';
import { findPeaks } from '../../src/hydrology/peaks/find-peaks.ts';
import { hullDistance } from '../../src/hydrology/scenarios/hull-distance.ts';
import { mahalanobis } from '../../src/hydrology/scenarios/mahalanobis.ts';
import { type ScoreName, scores } from '../../src/hydrology/scores.ts';
import { kendallTau } from '../../src/hydrology/trend/kendall-tau.ts';
import { mannKendall } from '../../src/hydrology/trend/mann-kendall.ts';
import { pettitt } from '../../src/hydrology/trend/pettitt.ts';
import { ranks } from '../../src/hydrology/trend/ranks.ts';
import { senSlope } from '../../src/hydrology/trend/sen-slope.ts';
import { outside } from '../harness/outside.ts';
import { generator, inventedPair } from './invented.ts';

/** Live comparison with SciPy and scikit-learn as Debian packages them (python3-scipy, python3-sklearn); calls in witness.py. */
const python = '/usr/bin/python3';
const witness = outside(python, ['-c', 'import scipy, sklearn']);

type Answers = Record<string, number> & { ranks?: number[]; inside?: boolean };

/** All questions of a test in one process: starting the libraries takes a second. */
function ask<T = Answers>(questions: readonly (readonly [string, object])[]): T[] {
  const asked = spawnSync(python, ['tests/hydrology/witness.py'], {
    input: JSON.stringify(questions),
    encoding: 'utf8',
    maxBuffer: 1e8,
  });
  if (asked.status !== 0) throw new Error(asked.stderr);
  return JSON.parse(asked.stdout) as T[];
}

function value<T>(statistic: Statistic<T>): T {
  if (!isDefined(statistic)) throw new Error(statistic.undefined);
  return statistic.value;
}

function near(actual: number, wanted: number | undefined, where: string, relative = 1e-9): void {
  const slack = Math.max(1e-12, relative * Math.abs(wanted ?? Number.NaN));
  expect(
    Math.abs(actual - (wanted ?? Number.NaN)),
    `${where}: ${actual}, ${wanted} there`,
  ).toBeLessThanOrEqual(slack);
}

const seeds = Array.from({ length: 25 }, (_, index) => index + 11);

describe.skipIf(!witness.available)(`against SciPy and scikit-learn ${witness.reason}`, () => {
  it('scores of pairs', () => {
    const given = seeds.map((seed) => inventedPair(seed, 2 + seed * 7));
    ask(given.map((pair) => ['pairs', pair])).forEach((answer, index) => {
      const paired = pairInOrder(given[index] ?? { observed: [], simulated: [] });
      for (const [name, wanted] of Object.entries(answer))
        near(
          value(scores[name as ScoreName](paired)),
          wanted as number,
          `${name} of seed ${seeds[index]}`,
          1e-8,
        );
    });
  });

  it('peaks of noisy, tied and flat series', () => {
    const given = seeds.map((seed) => {
      const next = generator(seed);
      // Coarse steps make plateaus and ties; under 16 peaks, where the order of SciPy's ties is fixed.
      const values = Array.from({ length: 40 }, () => Math.round(next() * (seed % 2 ? 4 : 1000)));
      return { values, height: seed % 2 ? 2 : 300, distance: 1 + (seed % 4) };
    });
    ask<number[]>(given.map((question) => ['peaks', question])).forEach((answer, index) => {
      const { values, height, distance } = given[index] ?? { values: [], height: 0, distance: 1 };
      const positions = values.map((_, step) => step);
      expect(findPeaks({ values, positions, threshold: height, minimumDistance: distance })).toEqual(answer);
    });
  });

  it('trends, ranks and changes of records', () => {
    const given = seeds.map((seed) => {
      const next = generator(seed);
      const values = Array.from({ length: 3 + seed }, (_, year) =>
        Math.round(40 * next() + (year * seed) / 30),
      );
      const times = values.map((_, year) => 1950 + year + Math.floor(year / 5));
      return { times, values };
    });
    ask(given.map((question) => ['record', question])).forEach((answer, index) => {
      const of = given[index] ?? { times: [], values: [] };
      const line = value(senSlope(of));
      near(line.slope, answer.slope, 'slope');
      near(line.intercept, answer.intercept, 'intercept');
      near(line.lower95, answer.low, 'lower end');
      near(line.upper95, answer.high, 'upper end');
      expect(value(mannKendall(of.values)).s).toBe(answer.s);
      near(value(kendallTau(of)), answer.tau, 'tau');
      expect(Array.from(ranks(of.values))).toEqual(answer.ranks);
      const change = value(pettitt(of));
      near(change.k, answer.k, 'K');
      expect(change.before).toBe(answer.before);
    });
  });

  it('two samples', () => {
    const given = seeds.map((seed) => {
      const next = generator(seed);
      const sample = (length: number, shift: number) => Array.from({ length }, () => next() + shift);
      return { a: sample(3 + (seed % 9), 0), b: sample(4 + seed, (seed % 5) / 4) };
    });
    ask(given.map((question) => ['samples', question])).forEach((answer, index) => {
      const { a, b } = given[index] ?? { a: [], b: [] };
      const found = value(kolmogorovSmirnov({ sample: a, other: b }));
      near(found.distance, answer.distance, 'distance');
      near(found.pLimit, answer.limit, 'limiting p', 1e-8);
      near(value(found.pExact), answer.exact, 'exact p', 1e-8);
    });
  });

  it('tails far and near', () => {
    const given = [0, 0.01, 0.5, 1, 1.96, 2.8, 2.83, 5, 12, 30].flatMap((size) =>
      [1, 2, 3, 4, 7, 28, 300].map((degrees) => ({ z: size, t: size, degrees, x: size * size })),
    );
    ask(given.map((question) => ['tails', question])).forEach((answer, index) => {
      const { z, t, degrees, x } = given[index] ?? { z: 0, t: 0, degrees: 1, x: 0 };
      const where = `${z} with ${degrees}`;
      // Relative to the tail itself, however small.
      const close = (actual: number, wanted: number | undefined, name: string) =>
        expect(
          Math.abs(actual / (wanted ?? 0) - 1),
          `${name} ${where}: ${actual}, ${wanted} there`,
        ).toBeLessThan(1e-9);
      close(normalTails(z), answer.normal, 'normal');
      close(studentTails({ t, degrees }), answer.student, 'student');
      close(chiSquareTail({ x, degrees }), answer.chi_square, 'chi-square');
      close(chiSquareLimit({ exceeded: 0.025, degrees }), answer.chi_square_limit, 'chi-square limit');
    });
  });

  it('quantiles', () => {
    const given = seeds.flatMap((seed) =>
      [0, 0.013, 0.3, 1 / 3, 0.5, 0.98, 1].map((probability) => ({
        values: inventedPair(seed, seed - 10).observed,
        probability,
      })),
    );
    ask(given.map((question) => ['quantiles', question])).forEach((answer, index) => {
      const question = given[index] ?? { values: [], probability: 0 };
      near(value(quantile({ ...question, type: 6 })), answer.type6, 'type 6');
      near(value(quantile({ ...question, type: 7 })), answer.type7, 'type 7');
    });
  });

  it('joint distances and hulls in one to three drivers', () => {
    const given = seeds.flatMap((seed) =>
      [1, 2, 3].map((drivers) => {
        const next = generator(seed * 10 + drivers);
        const row = (spread: number) =>
          Array.from({ length: drivers }, (_, k) => 10 ** k * (5 + spread * (next() + next() - 1)));
        return { sample: Array.from({ length: 8 + seed }, () => row(1)), point: row(1.4) };
      }),
    );
    let inside = 0;
    ask(given.map((question) => ['joint', question])).forEach((answer, index) => {
      const question = given[index] ?? { sample: [], point: [] };
      near(value(mahalanobis(question)).distance, answer.distance, 'distance', 1e-8);
      expect(value(hullDistance(question)) === 0, JSON.stringify(question.point)).toBe(answer.inside);
      if (answer.inside) inside++;
    });
    // The comparison means something only when both answers occur often.
    expect(inside).toBeGreaterThan(15);
    expect(given.length - inside).toBeGreaterThan(15);
  });

  it('two means, as the double mass compares them', () => {
    const given = seeds.map((seed) => {
      const next = generator(seed);
      const station = Array.from({ length: 20 }, (_, year) => (year < 9 ? 1 : 0.6) + 0.2 * next());
      return doubleMass({ years: station.map((_, year) => year), pattern: station.map(() => 1), station });
    });
    const parts = seeds.map((seed, index) => {
      const next = generator(seed);
      const ratios = Array.from({ length: 20 }, (_, year) => (year < 9 ? 1 : 0.6) + 0.2 * next());
      const { before } = value(given[index] ?? { undefined: '' }).change;
      return { a: ratios.slice(0, before), b: ratios.slice(before) };
    });
    ask(parts.map((question) => ['two_means', question])).forEach((answer, index) => {
      const difference = value(value(given[index] ?? { undefined: '' }).difference);
      near(difference.f, answer.f, 'F', 1e-8);
      expect(Math.abs(difference.p / (answer.p ?? 0) - 1)).toBeLessThan(1e-8);
    });
  });
});
