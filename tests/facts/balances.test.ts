import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { RecomputedBalance } from '../../src/facts/balances/balance-of.ts';
import { figuresToWrite } from '../../src/facts/figures.ts';
import { isDefined } from '../../src/hydrology/paired.ts';
import { fieldName } from '../../src/manifest/manifest.ts';
import { daysInMonth } from '../../src/series/calendar.ts';
import { soundFiles } from '../harness/sound-files.ts';
import { type StudyEdits, studyFacts } from '../harness/study.ts';

async function balance(edits: StudyEdits, volume = 'catchment'): Promise<RecomputedBalance> {
  const recomputed = (await studyFacts(edits)).balances.get(volume)?.recomputed;
  if (recomputed === undefined || !isDefined(recomputed)) throw new Error(JSON.stringify(recomputed));
  return recomputed.value;
}

interface Case {
  readonly id: string;
  readonly source: string;
  readonly input: {
    readonly window: readonly [string, string];
    readonly storage_before_first_row_mm: number;
  };
  readonly expect: Readonly<Record<string, number>>;
}

const { cases } = JSON.parse(readFileSync('tests/published/hydrology-cases.json', 'utf8')) as {
  readonly cases: readonly Case[];
};
const file = 'runs/calibrated/published.csv';
const published = readFileSync('tests/published/data/rr-daily.csv', 'utf8');

describe('published balances, from a run’s own file', () => {
  it.each(cases.filter(({ id }) => id.startsWith('balance/')))(
    '$id ($source)',
    async ({ input, expect: is }) => {
      const found = await balance({
        set: {
          'periods.warm_up': { zero_because: 'the window is stated' },
          'balance.catchment': {
            run: 'calibrated',
            file,
            time: 'date',
            unit: 'mm',
            over: input.window.join('/'),
            inflow: { rain: 'rain_mm' },
            outflow: { evaporation: 'et_mm', runoff: 'q_mm' },
            storage: 'storage_mm',
            storage_before: input.storage_before_first_row_mm,
            potential_evapotranspiration: 'pet_mm',
          },
        },
        files: { [file]: published },
      });
      const totals = Object.fromEntries(found.terms.map(({ name, total }) => [name, total]));
      expect(totals.rain).toBeCloseTo(is.P ?? Number.NaN, 6);
      expect(totals.evaporation).toBeCloseTo(is.ET ?? Number.NaN, 6);
      expect(totals.runoff).toBeCloseTo(is.Q ?? Number.NaN, 6);
      expect(found.storageChangeMm).toBeCloseTo(is.dS ?? Number.NaN, 6);
      expect(found.residualMm).toBeCloseTo(is.residual ?? Number.NaN, 8);
      for (const [figure, name] of [
        [found.runoffRatio, 'runoff_ratio'],
        [found.evaporativeRatio, 'et_ratio'],
        [found.aridity, 'aridity'],
        [found.budyko, 'budyko'],
        [found.fu, 'fu_omega'],
      ] as const)
        expect(isDefined(figure) ? figure.value : figure, name).toBeCloseTo(is[name] ?? Number.NaN, 8);
    },
  );
});

/** Columns of the sound study’s daily file by month, from October 2001: totals, for storage the last value. */
function byMonth(daily: string): string {
  const [head = '', ...rows] = daily.trimEnd().split('\n');
  const names = head.split(',');
  const months = new Map<string, number[]>();
  for (const row of rows) {
    const [date = '', ...cells] = row.split(',');
    const month = months.get(date.slice(0, 7)) ?? cells.map(() => 0);
    months.set(date.slice(0, 7), month);
    for (const [place, cell] of cells.entries())
      month[place] = names[place + 1]?.match(/soil|ground/)
        ? Number(cell)
        : (month[place] ?? 0) + Number(cell);
  }
  const flow = names.indexOf('flow_m3s') - 1;
  return `${head.replace('date', 'month')}\n${[...months]
    .map(([month, values]) => {
      const days = daysInMonth(Number(month.slice(0, 4)), Number(month.slice(5)));
      return `${month},${values.with(flow, (values[flow] ?? 0) / days).join(',')}\n`;
    })
    .join('')}`;
}

const daily = 'runs/calibrated/daily.csv';
const monthly = 'runs/calibrated/by-month.csv';

describe('a balance', () => {
  it('of months, with a mean flow in m3/s over the catchment’s area', async () => {
    const { records } = await studyFacts();
    const ofDays = await balance({});
    expect(records.manifest.data.catchment?.area).toEqual({ value: 50, unit: 'km2' });
    const ofMonths = await balance({
      set: {
        'balance.catchment.file': monthly,
        'balance.catchment.time': 'month',
        'balance.catchment.step': 'P1M',
        'balance.catchment.outflow.streamflow': { values: 'flow_m3s', unit: 'm3/s' },
      },
      files: { [monthly]: byMonth(soundFiles()[daily] ?? '') },
    });
    expect(ofMonths.first).toBe('2003-10');
    expect(ofMonths.last).toBe('2010-09');
    expect(ofMonths.inflowMm).toBeCloseTo(ofDays.inflowMm, 6);
    // The file has flow with four decimals of a m3/s.
    expect(ofMonths.outflowMm).toBeCloseTo(ofDays.outflowMm, 0);
    expect(ofMonths.storageChangeMm).toBeCloseTo(ofDays.storageChangeMm ?? Number.NaN, 9);
    expect(ofMonths.years.map(({ year }) => year)).toEqual([2004, 2005, 2006, 2007, 2008, 2009, 2010]);
  });

  it('over windows that do not touch adds up what each of them gives', async () => {
    const over = async (...windows: readonly string[]) =>
      balance({ set: { 'periods.calibration': windows, 'balance.catchment.over': 'calibration' } });
    const [one, other, both] = [
      await over('2003-10-01/2004-03-31'),
      await over('2005-06-01/2005-06-30'),
      await over('2003-10-01/2004-03-31', '2005-06-01/2005-06-30'),
    ];
    expect(both.inflowMm).toBeCloseTo(one.inflowMm + other.inflowMm, 9);
    expect(both.storageChangeMm).toBeCloseTo((one.storageChangeMm ?? 0) + (other.storageChangeMm ?? 0), 9);
    expect(both.residualMm).toBeCloseTo(one.residualMm + other.residualMm, 9);
  });

  it('keeps the warm-up out of every window', async () => {
    const found = await balance({ set: { 'balance.catchment.over': '2001-10-01/2004-09-30' } });
    expect([found.first, found.last]).toEqual(['2003-10-01', '2004-09-30']);
  });

  it('of a volume in m3, and of one without a unit, adds up in the unit that is stated', async () => {
    const inCubicMetres = await balance({
      set: { 'balance.catchment.unit': 'm3', 'balance.catchment.storage': { values: 'soil_mm', unit: 'm3' } },
    });
    expect(inCubicMetres).toMatchObject({ unit: 'm3', inflowMm: 7237 });
    expect(await balance({ remove: ['balance.catchment.unit'] })).toMatchObject({ unit: '', inflowMm: 7237 });
    // m3/s of a day are 86 400 m3.
    const flow = await balance(
      {
        set: {
          'balance.reach': {
            run: 'calibrated',
            file: daily,
            time: 'date',
            unit: 'm3/s',
            over: '2004-01-01/2004-01-01',
            inflow: { upstream: 'flow_m3s' },
            outflow: { downstream: 'flow_m3s' },
          },
        },
      },
      'reach',
    );
    expect(flow).toMatchObject({ unit: 'm3', residualMm: 0, storageChangeMm: null });
    // The file has four decimals.
    expect(flow.inflowMm / 8.64).toBeCloseTo(Math.round(flow.inflowMm / 8.64), 9);
  });
});

describe('figures of a balance that are written', () => {
  const written = async (edits: StudyEdits) =>
    figuresToWrite(await studyFacts(edits))
      .filter(({ record }) => record.startsWith('balance.'))
      .map(({ field, stated, found }) => [fieldName(field), stated, found]);

  it('are none where all agree', async () => {
    expect(await written({})).toEqual([]);
  });

  it('are those that differ, to the decimals that are stated', async () => {
    expect(
      await written({
        set: {
          'balance.catchment.stated': { runoff_ratio: 0.5, aridity: 0.5328, totals: { streamflow: 3400.1 } },
        },
      }),
    ).toEqual([['balance.catchment.stated.totals.streamflow', 3400.1, 3398.8]]);
  });

  it('are the usual ones where none is stated; no ratio of a volume without rain', async () => {
    expect(await written({ remove: ['balance.catchment.stated'] })).toEqual([
      ['balance.catchment.stated.residual_share', null, 0],
      ['balance.catchment.stated.runoff_ratio', null, 0.47],
      ['balance.catchment.stated.evaporative_ratio', null, 0.533],
      ['balance.catchment.stated.aridity', null, 0.533],
      ['balance.catchment.stated.storage_change', null, -17.5],
    ]);
    const aquifer = {
      run: 'calibrated',
      file: daily,
      time: 'date',
      unit: 'mm',
      inflow: { recharge: 'rain_mm' },
      outflow: { 'base flow': 'flow_mm' },
    };
    expect(await written({ set: { 'balance.aquifer': aquifer } })).toEqual([
      ['balance.aquifer.stated.residual_share', null, 0.5304],
    ]);
  });
});

describe('the grade of a balance', () => {
  const grade = async (edits: StudyEdits) =>
    (await studyFacts(edits)).standings.get('balance.catchment')?.seal;

  it('is recomputed where every stated figure agrees, and sealed where one differs or none is stated', async () => {
    const seal = await grade({});
    expect(seal?.grade).toBe('recomputed');
    expect(seal?.facts.runoff_ratio?.value).toBeCloseTo(0.4696, 4);
    expect((await grade({ set: { 'balance.catchment.stated.runoff_ratio': 0.5 } }))?.grade).toBe(
      'recomputed',
    );
    expect((await grade({ set: { 'balance.catchment.stated.runoff_ratio': 0.51 } }))?.grade).toBe('sealed');
    expect((await grade({ remove: ['balance.catchment.stated'] }))?.grade).toBe('sealed');
  });
});
