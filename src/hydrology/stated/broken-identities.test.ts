import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isDefined, pairInOrder } from '../paired.ts';
import { scores } from '../scores.ts';
import { brokenIdentities, type StatedScores } from './broken-identities.ts';
import { agreesAsPrinted, type PrintedNumber, printedNumber } from './printed-number.ts';

const names = ['nse', 'rsr', 'pbias', 'beta', 'r', 'r2', 'alpha', 'kge'] as const;

function printed(text: string): PrintedNumber {
  const number = printedNumber(text);
  if (number === null) throw new Error(`${text} is no number`);
  return number;
}

function stated(texts: Partial<Record<(typeof names)[number], string>>): StatedScores {
  return Object.fromEntries(Object.entries(texts).map(([name, text]) => [name, printed(text)]));
}

describe('identities of stated scores', () => {
  it('hold for the twelve pairs of NSE and RSR in Moriasi et al. 2007, Trans. ASABE 50(3):885-900, Table 5', () => {
    const nse = [
      '1.00',
      '0.66',
      '0.81',
      '0.93',
      '1.00',
      '0.78',
      '0.69',
      '1.00',
      '0.69',
      '0.84',
      '0.85',
      '0.78',
    ];
    const rsr = [
      '0.03',
      '0.58',
      '0.43',
      '0.26',
      '0.06',
      '0.46',
      '0.55',
      '0.06',
      '0.56',
      '0.40',
      '0.39',
      '0.46',
    ];
    nse.forEach((text, row) => {
      expect(brokenIdentities(stated({ nse: text, rsr: rsr[row] ?? '' }))).toEqual([]);
    });
  });

  it('hold for whatever pairs give, rounded to any number of decimals', () => {
    const flow = fc.integer({ min: 1, max: 100_000 }).map((thousandths) => thousandths / 1000);
    fc.assert(
      fc.property(
        fc.array(fc.tuple(flow, flow), { minLength: 2, maxLength: 30 }),
        fc.array(fc.integer({ min: 0, max: 6 }), { minLength: names.length, maxLength: names.length }),
        (rows, decimals) => {
          const paired = pairInOrder({ observed: rows.map(([o]) => o), simulated: rows.map(([, s]) => s) });
          const texts: Record<string, string> = {};
          names.forEach((name, index) => {
            const score = scores[name](paired);
            if (!isDefined(score)) return;
            texts[name] = score.value.toFixed(decimals[index]);
            expect(agreesAsPrinted({ stated: printed(texts[name]), recomputed: score.value }), name).toBe(
              true,
            );
          });
          expect(brokenIdentities(stated(texts))).toEqual([]);
        },
      ),
    );
  });

  const broken: [string, StatedScores, string[]][] = [
    // sqrt(1 - 0.75) = 0.5
    ['RSR = sqrt(1 - NSE)', stated({ nse: '0.75', rsr: '0.60' }), ['nse', 'rsr']],
    // 100 (1 - 0.9) = 10: the sign is reversed
    ['PBIAS = 100 (1 - beta)', stated({ pbias: '-10.0', beta: '0.90' }), ['pbias', 'beta']],
    // 0.9^2 = 0.81
    ['R2 = r^2', stated({ r: '0.90', r2: '0.90' }), ['r', 'r2']],
    // 0.825 > 0.905^2 = 0.819
    ['NSE <= r^2', stated({ nse: '0.83', r: '0.90' }), ['nse', 'r']],
    ['NSE <= r^2', stated({ nse: '0.91', r2: '0.89' }), ['nse', 'r2']],
    // 1 - sqrt(0.1^2 + 0.1^2 + 0.1^2) = 0.827
    [
      'KGE of its parts',
      stated({ kge: '0.90', r: '0.90', alpha: '0.90', beta: '1.10' }),
      ['kge', 'r', 'alpha', 'beta'],
    ],
    ['possible value', stated({ nse: '1.20' }), ['nse']],
    ['possible value', stated({ rsr: '-0.20' }), ['rsr']],
  ];
  for (const [identity, scoresStated, scoresNamed] of broken)
    it(`${identity} breaks on ${JSON.stringify(scoresStated)}`, () => {
      expect(brokenIdentities(scoresStated)).toEqual([{ identity, scores: scoresNamed }]);
    });

  it('printed decimals leave room: one digit can stand for both', () => {
    expect(brokenIdentities(stated({ nse: '0.9', r2: '0.89' }))).toEqual([]);
    expect(brokenIdentities(stated({ pbias: '0', beta: '1.004' }))).toEqual([]);
    expect(brokenIdentities({})).toEqual([]);
  });
});

describe('printed numbers', () => {
  it.each([
    ['0.78', 0.78, 2],
    ['-3.1', -3.1, 1],
    ['+.5', 0.5, 1],
    ['12', 12, 0],
    ['1.20e2', 120, 0],
    ['1e3', 1000, -3],
    ['2.5E-3', 0.0025, 4],
    ['0.70', 0.7, 2],
  ])('%s', (text, value, decimals) => expect(printedNumber(text)).toEqual({ value, decimals }));

  it.each(['', 'NA', '1,5', '0x10', '1.2.3', 'NaN'])('%s is none', (text) =>
    expect(printedNumber(text)).toBeNull(),
  );

  it('a half agrees with both neighbours, a hair more with one', () => {
    expect(agreesAsPrinted({ stated: printed('0.78'), recomputed: 0.785 })).toBe(true);
    expect(agreesAsPrinted({ stated: printed('0.79'), recomputed: 0.785 })).toBe(true);
    // 1.13 + 0.005 falls a bit under 1.135 in binary.
    expect(agreesAsPrinted({ stated: printed('1.13'), recomputed: 1.135 })).toBe(true);
    expect(agreesAsPrinted({ stated: printed('0.78'), recomputed: 0.78501 })).toBe(false);
    expect(agreesAsPrinted({ stated: printed('0.780'), recomputed: 0.7811 })).toBe(false);
    expect(agreesAsPrinted({ stated: printed('0.78'), recomputed: Number.NaN })).toBe(false);
  });
});
