import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { RecomputedBand } from '../../src/facts/bands.ts';
import { figuresToWrite } from '../../src/facts/figures.ts';
import { isDefined } from '../../src/hydrology/paired.ts';
import { fieldName } from '../../src/manifest/manifest.ts';
import { type StudyEdits, studyFacts } from '../harness/study.ts';

const at = 'uncertainty.bands.outlet-flow';

async function band(edits: StudyEdits): Promise<RecomputedBand> {
  const recomputed = (await studyFacts(edits)).bands[0]?.recomputed;
  if (recomputed === undefined || !isDefined(recomputed)) throw new Error(JSON.stringify(recomputed));
  return recomputed.value;
}

interface Case {
  readonly id: string;
  readonly source: string;
  readonly input: { readonly window: readonly [string, string] };
  readonly expect: Readonly<Record<string, number>>;
}

const { cases } = JSON.parse(readFileSync('tests/published/hydrology-cases.json', 'utf8')) as {
  readonly cases: readonly Case[];
};
const published = readFileSync('tests/published/data/rr-daily.csv', 'utf8');
const series = { time: 'date', unit: 'm3/s', step: 'P1D', missing: [''] };

describe('published figures of bands, from the files of a study', () => {
  it.each(cases.filter(({ id }) => id.startsWith('band/daily')))(
    '$id ($source)',
    async ({ input, expect: is }) => {
      const { stated } = await band({
        set: {
          'inputs.streamflow.series': { ...series, values: 'obs_m3s' },
          'evaluation.outlet-flow.simulated': {
            run: 'calibrated',
            file: 'data/flow.csv',
            ...series,
            values: 'sim_m3s',
          },
          'periods.warm_up': { zero_because: 'the window is stated' },
          [at]: {
            ...series,
            file: 'data/flow.csv',
            lower: 'lo_m3s',
            upper: 'hi_m3s',
            level: 0.95,
            over: input.window.join('/'),
          },
        },
        files: { 'data/flow.csv': published },
      });
      if (!isDefined(stated)) throw new Error(stated.undefined);
      const { steps, withoutBand, coverage, relativeWidth, meanWidth, intervalScore } = stated.value;
      expect([steps, withoutBand]).toEqual([is.n, 0]);
      for (const [figure, name] of [
        [coverage, 'p_factor'],
        [relativeWidth, 'r_factor'],
        [meanWidth, 'mean_width'],
        [intervalScore, 'mean_interval_score'],
      ] as const)
        expect(isDefined(figure) ? figure.value : figure, name).toBeCloseTo(is[name] ?? Number.NaN, 9);
    },
  );
});

describe('a band', () => {
  it('of samples counts those that there are', async () => {
    const flow = 'date,flow_m3s\n2008-01-10,0.2\n2008-02-20,0.4\n2009-07-05,99\n2012-01-01,1\n';
    const { stated } = await band({
      set: { 'inputs.streamflow.series.step': 'irregular' },
      files: { 'data/flow.csv': flow },
    });
    expect(stated).toMatchObject({ value: { windowSteps: 3, steps: 3, withoutBand: 0 } });
  });

  it('of months is held against the means of complete months', async () => {
    const months = Array.from({ length: 36 }, (_, place) => {
      const month = new Date(Date.UTC(2007, 9 + place)).toISOString().slice(0, 7);
      return `${month},0,9\n`;
    });
    const { stated, validation } = await band({
      set: { [`${at}.time`]: 'month', [`${at}.step`]: 'P1M' },
      files: { 'runs/calibrated/band.csv': `month,low,high\n${months.join('')}` },
    });
    expect(stated).toMatchObject({ value: { steps: 36, coverage: { value: 1 }, meanWidth: { value: 9 } } });
    expect(validation).toEqual(stated);
  });

  it('with one end missing on a day lacks that day', async () => {
    const { stated } = await band({
      set: { [`${at}.missing`]: ['NA'] },
      files: { 'runs/calibrated/band.csv': (old) => old.replace(/^(2008-02-01,[^,]*),.*/m, '$1,NA') },
    });
    expect(stated).toMatchObject({ value: { steps: 1095, withoutBand: 1 } });
  });
});

describe('figures of a band that are written, and its grade', () => {
  const written = async (edits: StudyEdits) =>
    figuresToWrite(await studyFacts(edits))
      .filter(({ record }) => record === 'uncertainty')
      .map(({ field, stated, found }) => [fieldName(field), stated, found]);

  it('are those that differ, or the usual ones', async () => {
    expect(await written({ set: { [`${at}.stated.coverage`]: 0.9 } })).toEqual([]);
    expect(await written({ set: { [`${at}.stated.coverage`]: 0.91 } })).toEqual([
      [`${at}.stated.coverage`, 0.91, 0.93],
    ]);
    expect(await written({ remove: [`${at}.stated`] })).toEqual([
      [`${at}.stated.coverage`, null, 0.93],
      [`${at}.stated.relative_width`, null, 0.83],
    ]);
    expect(await written({ set: { [`${at}.unit`]: 'degC' } })).toEqual([]);
  });

  it('is recomputed where every band agrees', async () => {
    const grade = async (edits: StudyEdits) =>
      (await studyFacts(edits)).standings.get('uncertainty')?.seal?.grade;
    expect(await grade({})).toBe('recomputed');
    expect(await grade({ set: { [`${at}.stated.coverage`]: 0.91 } })).toBe('sealed');
    expect(await grade({ remove: [`${at}.stated`] })).toBe('sealed');
    expect(await grade({ remove: ['uncertainty.bands'] })).toBe('sealed');
  });
});
