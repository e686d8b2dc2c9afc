import { describe, expect, it } from 'vitest';
import { figuresToWrite } from '../../src/facts/figures.ts';
import { fieldName } from '../../src/manifest/manifest.ts';
import { type StudyEdits, studyFacts } from '../harness/study.ts';

const target = 'evaluation.outlet-flow';

async function sealOf(record: string, edits: StudyEdits = {}) {
  const seal = (await studyFacts(edits)).standings.get(record)?.seal;
  if (seal == null) throw new Error(`${record} is not sealed`);
  return seal;
}

describe('the grade of a seal', () => {
  it('is recomputed where every stated figure is what the files give, and the figures are kept', async () => {
    const { grade, facts } = await sealOf(target);
    expect(grade).toBe('recomputed');
    expect(facts['calibration.pairs']).toEqual({ value: 1459, computed_by: 1 });
    for (const [name, value] of [
      ['calibration.nse', 0.966],
      ['validation.pbias', 7.9],
    ] as const) {
      expect(facts[name]?.value).toBeCloseTo(value, 2);
      expect(facts[name]?.computed_by).toBe(1);
    }
  });

  const sealedOnly: readonly (StudyEdits & { readonly name: string; readonly record: string })[] = [
    { name: 'a score differs', record: target, set: { [`${target}.scores.calibration.nse`]: 0.9 } },
    { name: 'no scores are stated', record: target, remove: [`${target}.scores`] },
    {
      name: 'a row of a score table can’t be read',
      record: target,
      set: { [`${target}.scores`]: { table: 'scores.csv' } },
      files: { 'scores.csv': 'window,score,value\ncalibration,nse,0.966\nall,nse,0.9\n' },
    },
    {
      name: 'a missing share differs',
      record: 'inputs.streamflow',
      set: { 'inputs.streamflow.missing_share': 0.01 },
    },
    {
      name: 'a period differs',
      record: 'inputs.rainfall',
      set: { 'inputs.rainfall.period': '2001-10-01/2010-09-29' },
    },
    {
      name: 'an input states neither',
      record: 'inputs.rainfall',
      remove: ['inputs.rainfall.period', 'inputs.rainfall.missing_share'],
    },
    { name: 'an input is no series', record: 'inputs.terrain' },
    { name: 'nothing is computed of it', record: 'study' },
  ];
  it.each(sealedOnly)('is sealed where $name', async ({ name: _, record, ...edits }) => {
    expect((await sealOf(record, edits)).grade).toBe('sealed');
  });

  it('of inputs: missing share and period', async () => {
    const { grade, facts } = await sealOf('inputs.streamflow');
    expect(grade).toBe('recomputed');
    // Two of 3287 days.
    expect(facts.missing_share?.value).toBeCloseTo(2 / 3287, 12);
  });
});

describe('scores that are written into the manifest', () => {
  const written = async (edits: StudyEdits) =>
    figuresToWrite(await studyFacts(edits))
      .filter(({ record }) => record === target)
      .map(({ field, stated, found }) => [fieldName(field), stated, found]);
  const calibration = `${target}.scores.calibration`;

  it('are those that differ, in the decimals that are stated, small ones in two at least, and one of the low flows that are needed', async () => {
    expect(await written({})).toEqual([]);
    expect(await written({ set: { [calibration]: { nse: 0.5, pbias: 1.2, r2: 1, kge: 0.903 } } })).toEqual([
      [`${calibration}.nse`, 0.5, 0.97],
      [`${calibration}.pbias`, 1.2, 7.8],
      [`${calibration}.log_nse`, null, 0.96],
    ]);
  });

  it('are one of each kind with two decimals where a window has none', async () => {
    expect(await written({ remove: [calibration] })).toEqual([
      [`${calibration}.nse`, null, 0.97],
      [`${calibration}.pbias`, null, 7.77],
      [`${calibration}.r2`, null, 1],
      [`${calibration}.kge`, null, 0.9],
      [`${calibration}.log_nse`, null, 0.96],
    ]);
  });

  it('are none of a table, of a window that is not stated, or of what has no value', async () => {
    const table = { 'scores.csv': 'window,score,value\ncalibration,nse,0.1\nvalidation,nse,0.1\n' };
    expect(await written({ set: { [`${target}.scores`]: { table: 'scores.csv' } }, files: table })).toEqual(
      [],
    );
    expect(await written({ remove: ['periods.validation'] })).toEqual([]);
    expect(await written({ set: { [`${calibration}.peaks_hit`]: 0.5 } })).toEqual([]);
  });
});
