import { describe, expect, it } from 'vitest';
import { missingShareFigures } from '../../src/facts/missing-shares.ts';
import { fieldName } from '../../src/manifest/manifest.ts';
import { withLines, withValues } from '../harness/edit-lines.ts';
import { type StudyEdits, studyFacts } from '../harness/study.ts';

/** Figures to write for an edited study, as `field: stated -> found`. */
async function figures(edits: StudyEdits) {
  const found = missingShareFigures(await studyFacts(edits));
  return found.map((one) => `${fieldName(one.field)}: ${one.stated} -> ${one.found}`);
}

// sound.yaml's streamflow has 3287 days of which 2 are missing: 0.00060846...
describe('shares of missing values that are to be written', () => {
  it('are none where all that is stated holds', async () => expect(await figures({})).toEqual([]));

  it('have the decimals that are written, and at least four', async () => {
    const stated = (share: number) => figures({ set: { 'inputs.streamflow.missing_share': share } });
    expect(await stated(0.1)).toEqual(['inputs.streamflow.missing_share: 0.1 -> 0.0006']);
    expect(await stated(0.000777)).toEqual(['inputs.streamflow.missing_share: 0.000777 -> 0.000608']);
  });

  it('are written where none is stated', async () => {
    expect(
      await figures({ remove: ['inputs.streamflow.missing_share', 'inputs.rainfall.missing_share'] }),
    ).toEqual([
      'inputs.rainfall.missing_share: null -> 0',
      'inputs.streamflow.missing_share: null -> 0.0006',
    ]);
  });

  it('never say that none is missing where some are', async () => {
    const days = Array.from({ length: 30_000 }, (_, day) =>
      new Date(day * 86_400_000).toISOString().slice(0, 10),
    );
    const rows = days.map((day, index) => `${day},${index === 9 ? '' : 1}\n`);
    expect(await figures({ files: { 'data/rain.csv': `date,rain_mm\n${rows.join('')}` } })).toEqual([
      'inputs.rainfall.missing_share: 0 -> 0.00003',
    ]);
  });

  it('are written for each file where they are stated so', async () => {
    const set = { 'inputs.streamflow.missing_share': { per_file: { 'data/flow.csv': 0.5 } } };
    expect(await figures({ set })).toEqual([
      'inputs.streamflow.missing_share.per_file.data/flow.csv: 0.5 -> 0.0006',
    ]);
  });

  it('wait until every row can be read', async () => {
    const set = { 'inputs.streamflow.missing_share': 0.5 };
    expect(await figures({ set, files: { 'data/flow.csv': withLines({ 9: '2001-10-08,x' }) } })).toEqual([]);
  });

  it('have no place where one fragment stands for many records', async () => {
    const gauge = {
      each: ['rain', 'check'],
      role: 'precipitation',
      files: ['data/{each}.csv'],
      series: { time: 'date', values: 'rain_mm', unit: 'mm/d', step: 'P1D', missing: [''] },
      missing_share: 0.5,
    };
    const files = { 'data/rain.csv': withValues(() => '', 5, 9) };
    const found = await figures({ set: { 'inputs.gauge': gauge }, files });
    expect(found).toEqual(['inputs.rainfall.missing_share: 0 -> 0.0015']);
  });
});
