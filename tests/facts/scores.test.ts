import { describe, expect, it } from 'vitest';
import type { Cause } from '../../src/facts/scores/causes.ts';
import type { ScoredWindow } from '../../src/facts/scores/stated.ts';
import type { ComparedScore, TargetFigures } from '../../src/facts/scores.ts';
import { isDefined } from '../../src/hydrology/paired.ts';
import { soundFiles } from '../harness/sound-files.ts';
import { type StudyEdits, studyFacts } from '../harness/study.ts';
import { columnByDate, monthly, type Pair, pairsIn, plainScores, sum } from './plain-scores.ts';

const files = soundFiles();
const observed = columnByDate(files['data/flow.csv'] ?? '', 'flow_m3s');
const simulated = columnByDate(files['runs/calibrated/daily.csv'] ?? '', 'flow_m3s');
const windows = {
  warmUp: '2001-10-01/2003-09-30',
  calibration: '2003-10-01/2007-09-30',
  validation: '2007-10-01/2010-09-30',
};
const calibration = plainScores(pairsIn(observed, simulated, [windows.calibration]));

async function target(edits: StudyEdits = {}, name = 'outlet-flow'): Promise<TargetFigures> {
  const figures = (await studyFacts(edits)).scores.get(name);
  if (figures === undefined) throw new Error(`no figures of ${name}`);
  return figures;
}

function over(figures: TargetFigures, window: ScoredWindow) {
  if (!isDefined(figures.recomputed)) throw new Error(figures.recomputed.undefined);
  const found = figures.recomputed.value.windows[window];
  if (found === undefined || !isDefined(found)) throw new Error(`nothing over ${window}`);
  return found.value;
}

function expectScores(figures: TargetFigures, window: ScoredWindow, pairs: readonly Pair[]) {
  const found = over(figures, window);
  expect(found.pairs).toBe(pairs.length);
  const { rsrOfSample: _, ...plain } = plainScores(pairs);
  const names = Object.keys(found.scores) as (keyof typeof plain)[];
  expect(names).toEqual(expect.arrayContaining(['nse', 'log_nse', 'rsr', 'pbias', 'r2', 'kge']));
  for (const name of names) {
    const score = found.scores[name];
    expect.soft(score && isDefined(score) ? score.value : score, name).toBeCloseTo(plain[name], 9);
  }
}

const scoresField = 'evaluation.outlet-flow.scores';

describe('scores from the files', () => {
  it.each(['calibration', 'validation'] as const)('over %s are those of plain formulas', async (window) => {
    expectScores(await target(), window, pairsIn(observed, simulated, [windows[window]]));
  });

  it('are those that are stated, besides the usual ones', async () => {
    const stated = { r: 0.1, rmse: 0.1, mae: 0.1, alpha: 0.1, beta: 0.1 };
    const figures = await target({ set: { [`${scoresField}.calibration`]: stated } });
    expect(Object.keys(over(figures, 'calibration').scores)).toHaveLength(6 + 5);
    expectScores(figures, 'calibration', pairsIn(observed, simulated, [windows.calibration]));
  });

  it('agree with what the sound study states', async () => {
    const { stated } = await target();
    expect(stated.length).toBe(10);
    expect(stated.every(({ agrees, causes }) => agrees && causes.length === 0)).toBe(true);
  });

  it('count what was dropped', async () => {
    // sound-files.ts leaves two days of March 2004 out.
    expect(over(await target(), 'calibration')).toMatchObject({
      pairs: 1459,
      windowSteps: 1461,
      dropped: { missingObserved: 2, missingSimulated: 0, missingBoth: 0 },
      periods: [windows.calibration],
    });
  });

  it('of several windows are taken together, and the target’s own go first', async () => {
    const own = ['2003-10-01/2004-09-30', '2006-10-01/2007-09-30'];
    const figures = await target({ set: { 'evaluation.outlet-flow.periods': { calibration: own } } });
    expectScores(figures, 'calibration', pairsIn(observed, simulated, own));
    expectScores(figures, 'validation', pairsIn(observed, simulated, [windows.validation]));
  });

  it('leave the warm-up out where a window holds it', async () => {
    const figures = await target({ set: { 'periods.calibration': ['2001-10-01/2007-09-30'] } });
    expectScores(figures, 'calibration', pairsIn(observed, simulated, [windows.calibration]));
    const ofRun = await target({
      set: {
        'periods.calibration': ['2001-10-01/2007-09-30'],
        'runs.calibrated.warm_up': '2001-10-01/2004-09-30',
      },
    });
    expectScores(ofRun, 'calibration', pairsIn(observed, simulated, ['2004-10-01/2007-09-30']));
  });

  it('of months are those of monthly means, months with more than 5 days missing left out', async () => {
    // All of March 2005 but its last six days, and five single days of June 2005.
    const gaps = /^(2005-03-(?:0\d|1\d|2[0-5])|2005-06-(?:01|05|10|15|20)),.*$/gm;
    const table = (files['data/flow.csv'] ?? '').replace(gaps, '$1,NA');
    const figures = await target({
      set: { 'evaluation.outlet-flow.step': 'P1M' },
      files: { 'data/flow.csv': table },
    });
    const months = monthly(columnByDate(table, 'flow_m3s'), 5);
    const pairs = pairsIn(months, monthly(simulated, 0), [windows.calibration]);
    expect(pairs.map(({ date }) => date)).not.toContain('2005-03-01');
    expect(pairs.map(({ date }) => date)).toContain('2005-06-01');
    expect(over(figures, 'calibration').windowSteps).toBe(48);
    expectScores(figures, 'calibration', pairs);
  });

  it('compare a flow with a depth over the catchment', async () => {
    const depth = columnByDate(files['runs/calibrated/daily.csv'] ?? '', 'flow_mm');
    // 1 mm/d over 50 km2 is 50 000 m3 in 86 400 s.
    const flow = new Map([...depth].map(([date, mm]) => [date, (mm * 50_000) / 86_400]));
    for (const unit of ['mm/d', 'mm'])
      expectScores(
        await target({
          set: {
            'evaluation.outlet-flow.simulated.values': 'flow_mm',
            'evaluation.outlet-flow.simulated.unit': unit,
          },
        }),
        'calibration',
        pairsIn(observed, flow, [windows.calibration]),
      );
  });

  it('add amounts up: daily mm against monthly totals', async () => {
    const depth = columnByDate(files['runs/calibrated/daily.csv'] ?? '', 'flow_mm');
    const months = monthly(depth, 0, sum);
    const table = [...months]
      .map(([month, mm]) => `${month.slice(0, 7)},${(mm * 1.1).toFixed(3)}\n`)
      .join('');
    const figures = await target({
      files: { 'data/flow.csv': `month,flow_mm\n${table}` },
      set: {
        'inputs.streamflow.series': { time: 'month', values: 'flow_mm', unit: 'mm', step: 'P1M' },
        'evaluation.outlet-flow.step': 'P1M',
        'evaluation.outlet-flow.simulated.values': 'flow_mm',
        'evaluation.outlet-flow.simulated.unit': 'mm',
      },
    });
    const seen = new Map([...months].map(([month, mm]) => [month, Number((mm * 1.1).toFixed(3))]));
    expectScores(figures, 'calibration', pairsIn(seen, months, [windows.calibration]));
  });

  it('pair samples with the day that holds them', async () => {
    const days = [...observed].filter(([date, flow]) => date.endsWith('-07') && Number.isFinite(flow));
    const table = days.map(([date, flow]) => `${date}T13:30,${flow}\n`).join('');
    const figures = await target({
      files: { 'data/flow.csv': `time,flow\n${table}` },
      set: { 'inputs.streamflow.series': { time: 'time', values: 'flow', unit: 'm3/s', step: 'irregular' } },
    });
    const pairs = pairsIn(new Map(days), simulated, [windows.calibration]);
    expect(over(figures, 'calibration').windowSteps).toBe(48);
    expectScores(figures, 'calibration', pairs);
  });

  it('read the step from the times where nobody states it', async () => {
    const figures = await target({
      remove: ['evaluation.outlet-flow.step', 'inputs.streamflow.series.step'],
    });
    expect(figures.recomputed).toMatchObject({ value: { step: 'P1D', unit: 'm3/s' } });
    expectScores(figures, 'validation', pairsIn(observed, simulated, [windows.validation]));
  });
});

describe('no scores, with a reason', () => {
  const cases: readonly (StudyEdits & { readonly name: string; readonly reason: string })[] = [
    {
      name: 'a step finer than the data',
      set: { 'evaluation.outlet-flow.step': 'PT1H' },
      reason: 'its step is P1D',
    },
    { name: 'a week', set: { 'evaluation.outlet-flow.step': 'P7D' }, reason: "can't be brought to P7D" },
    {
      name: 'units that measure different things',
      set: { 'evaluation.outlet-flow.simulated.unit': 'degC' },
      reason: 'measure different things',
    },
    { name: 'no unit', remove: ['evaluation.outlet-flow.simulated.unit'], reason: 'the simulated series' },
    {
      name: 'no such column',
      set: { 'evaluation.outlet-flow.simulated.values': 'runoff' },
      reason: 'expected a column named "runoff"',
    },
    {
      name: 'a row of the simulation that can’t be read',
      files: {
        'runs/calibrated/daily.csv': (old) => old.replace(/^(2005-07-04(?:,[^,]*){3}),[^,]*/m, '$1,n/a'),
      },
      set: {
        'evaluation.outlet-flow.simulated.values': 'flow_mm',
        'evaluation.outlet-flow.simulated.unit': 'mm',
      },
      reason: 'runs/calibrated/daily.csv line 1374: expected a number in mm',
    },
    {
      name: 'two columns',
      set: { 'evaluation.outlet-flow.simulated.values': ['flow_m3s', 'flow_mm'] },
      reason: 'several columns of runs/calibrated/daily.csv',
    },
    { name: 'no observed input', remove: ['evaluation.outlet-flow.observed'], reason: 'no observed input' },
    { name: 'no file', remove: ['evaluation.outlet-flow.simulated.file'], reason: 'no file is named' },
    {
      name: 'a depth without an area',
      set: { 'evaluation.outlet-flow.simulated.unit': 'mm/d' },
      remove: ['catchment.area'],
      reason: 'an area is needed',
    },
  ];
  it.each(cases)('$name', async ({ name: _, reason, ...edits }) => {
    const figures = await target(edits);
    expect(figures.recomputed).toMatchObject({ undefined: expect.stringContaining(reason) });
    expect(figures.away).toBeNull();
    expect(figures.stated.some(({ agrees }) => agrees)).toBe(false);
  });

  it('content that is not here', async () => {
    const pointer = `version https://git-lfs.github.com/spec/v1\noid sha256:${'0'.repeat(64)}\nsize 9\n`;
    for (const path of ['data/flow.csv', 'runs/calibrated/daily.csv'])
      expect(await target({ files: { [path]: pointer } })).toMatchObject({
        away: 'not-fetched',
        recomputed: { undefined: `the content of ${path} is not here` },
      });
  });

  it('a window that nobody states', async () => {
    const { stated } = await target({ remove: ['periods.validation'] });
    const validation = stated.filter(({ window }) => window === 'validation');
    expect(validation.map(({ recomputed }) => recomputed)).toEqual(
      validation.map(() => ({ undefined: 'no validation window is stated' })),
    );
  });
});

describe('the likely cause of a stated score', () => {
  const round = (value: number) => Number(value.toFixed(6));
  const causesOf = async (scores: Record<string, number>, edits: StudyEdits = {}) => {
    const rounded = Object.fromEntries(Object.entries(scores).map(([name, value]) => [name, round(value)]));
    const { stated } = await target({
      ...edits,
      set: { [`${scoresField}.calibration`]: rounded, ...edits.set },
    });
    return stated.filter(({ window }) => window === 'calibration').map(({ causes }: ComparedScore) => causes);
  };
  const days = (...some: string[]) => pairsIn(observed, simulated, some);
  const both = (pairs: readonly Pair[]) => {
    const { nse, pbias } = plainScores(pairs);
    return { nse, pbias };
  };
  const all = '2001-10-01/2010-09-30';
  const swapped = days(windows.calibration).map((pair) => ({
    ...pair,
    observed: pair.simulated,
    simulated: pair.observed,
  }));
  const daysMoved = (days: number) => {
    const moved = [...simulated].map(([date, flow]) => {
      const other = new Date(Date.parse(date) + days * 86_400_000);
      return [other.toISOString().slice(0, 10), flow] as const;
    });
    return pairsIn(observed, new Map(moved), [windows.calibration]);
  };
  const months = pairsIn(monthly(observed, 5), monthly(simulated, 0), [windows.calibration]);

  const ofPairs: readonly (readonly [string, readonly Pair[], Cause])[] = [
    ['another window', days(windows.validation), { is: 'other-window', window: 'validation' }],
    ['both windows', days(windows.calibration, windows.validation), { is: 'both-windows' }],
    ['warm-up inside', days(windows.warmUp, windows.calibration), { is: 'warm-up-inside' }],
    ['the whole simulation', days(all), { is: 'whole-simulation' }],
    ['monthly for daily', months, { is: 'other-step', step: 'monthly' }],
    ['observed and simulated swapped', swapped, { is: 'swapped-sides' }],
    ['a run that is now dated a day early', daysMoved(1), { is: 'other-day', days: 1 }],
    ['a run that is now dated a day late', daysMoved(-1), { is: 'other-day', days: -1 }],
  ];
  it.each(ofPairs)('%s, on every score', async (_, pairs, cause) => {
    expect(await causesOf(both(pairs))).toEqual([[cause], [cause]]);
  });
  it.each(ofPairs)('%s, on the one that is stated', async (_, pairs, cause) => {
    expect(await causesOf({ nse: plainScores(pairs).nse })).toEqual([[cause]]);
  });

  it('another unit than is said', async () => {
    const edits = { set: { 'evaluation.outlet-flow.simulated.unit': 'mm/d' } };
    expect(await causesOf(both(days(windows.calibration)), edits)).toEqual(
      Array(2).fill([{ is: 'one-unit', unit: 'm3/s' }]),
    );
  });

  it('daily for monthly', async () => {
    const edits = { set: { 'evaluation.outlet-flow.step': 'P1M' } };
    expect(await causesOf(both(days(windows.calibration)), edits)).toEqual(
      Array(2).fill([{ is: 'other-step', step: 'daily' }]),
    );
  });

  it('months with days missing counted', async () => {
    const table = (files['data/flow.csv'] ?? '').replace(/^(2005-0[34]-[01]\d),.*$/gm, '$1,NA');
    const counted = pairsIn(monthly(columnByDate(table, 'flow_m3s'), 31), monthly(simulated, 0), [
      windows.calibration,
    ]);
    const edits = { set: { 'evaluation.outlet-flow.step': 'P1M' }, files: { 'data/flow.csv': table } };
    expect(await causesOf(both(counted), edits)).toEqual(Array(2).fill([{ is: 'incomplete-counted' }]));
  });

  it('the sign of PBIAS, others being right', async () => {
    expect(await causesOf({ nse: calibration.nse, pbias: -calibration.pbias })).toEqual([
      [],
      [{ is: 'sign-reversed' }],
    ]);
  });

  it('R2 given as NSE, and the reverse', async () => {
    expect(await causesOf({ nse: calibration.r2, pbias: calibration.pbias })).toEqual([
      [{ is: 'other-score', score: 'r2' }],
      [],
    ]);
    expect(await causesOf({ r2: calibration.nse })).toEqual([[{ is: 'other-score', score: 'nse' }]]);
  });

  it('the deviation of a sample in RSR', async () => {
    const { rsrOfSample, nse } = plainScores(months);
    const edits = { set: { 'evaluation.outlet-flow.step': 'P1M' } };
    expect(await causesOf({ rsr: rsrOfSample, nse }, edits)).toEqual([[{ is: 'sample-deviation' }], []]);
  });

  it('is left open where no try gives the figure', async () => {
    expect(await causesOf({ nse: 0.5, pbias: calibration.pbias })).toEqual([[], []]);
  });
});

describe('a table of scores', () => {
  const set = { [scoresField]: { table: 'runs/calibrated/scores.csv' } };
  const table = (rows: string) => ({
    set,
    files: { 'runs/calibrated/scores.csv': `window,score,value\n${rows}` },
  });

  it('is read as figures are', async () => {
    const { stated, unread } = await target(table('calibration,nse,0.966\nvalidation,pbias,-7.90\n'));
    expect(unread).toEqual([]);
    expect(stated).toMatchObject([
      {
        window: 'calibration',
        score: 'nse',
        agrees: true,
        at: { file: 'runs/calibrated/scores.csv', line: 2 },
      },
      {
        window: 'validation',
        score: 'pbias',
        agrees: false,
        causes: [{ is: 'sign-reversed' }],
        at: { line: 3 },
      },
    ]);
  });

  it('may have decimal commas and lines above', async () => {
    const { stated } = await target({
      set: {
        [scoresField]: {
          table: { file: 'scores.txt', separator: 'semicolon', decimal: 'comma', skip_lines: 1 },
        },
      },
      files: { 'scores.txt': 'made 2021\nwindow;score;value\ncalibration;nse;0,966\n' },
    });
    expect(stated).toMatchObject([{ printed: { value: 0.966, decimals: 3 }, agrees: true, at: { line: 3 } }]);
  });

  it('names rows that hold no score', async () => {
    const { stated, unread } = await target(table('cal,nse,0.9\ncalibration,ns,0.9\ncalibration,nse,good\n'));
    expect(stated).toEqual([]);
    expect(unread).toMatchObject([
      { line: 2, found: 'cal' },
      { line: 3, found: 'ns' },
      { line: 4, found: 'good', expected: 'a number' },
    ]);
  });
});
