import { beforeAll, describe, expect, it } from 'vitest';
import { examine } from '../../src/commands/examine.ts';
import { readStudies } from '../../src/commands/studies.ts';
import { evidenceFor } from '../../src/facts/evidence.ts';
import { makeSeals } from '../../src/records/make-seals.ts';
import { writeSealsFile } from '../../src/records/seals-file.ts';
import { textReport } from '../../src/reports/text.ts';
import { type FilesInMemory, snapshotFromMemory } from '../../src/repository/memory.ts';

/** An invented network: three hundred gauges, one run for all, a score of each. */
const gauges = Array.from({ length: 300 }, (_, place) => `g${place + 1}`);
const today = '2024-05-01';
/** Ten years from October 2009 on. */
const months = Array.from({ length: 120 }, (_, place) => place);
const label = (place: number) =>
  `${2009 + Math.floor((place + 9) / 12)}-${String(((place + 9) % 12) + 1).padStart(2, '0')}`;

const manifest = `stoplog: 1
study:
  id: network
  title: Network of three hundred gauges
  purpose: Flow at every gauge of an invented network.
  decision: Which gauges keep their abstraction.
  needs: [{ variable: streamflow, regime: whole }]
  phase: calibration
model:
  name: slopes
  version: "2.0"
  release: "2.0.1"
  executable: [model/slopes.mjs]
  environment: { runtime: node, version: ">=20" }
inputs:
  gauge:
    each: { table: data/gauges.csv }
    role: streamflow
    files: ["data/flow/{each}.csv"]
    source: { provider: Invented Survey, title: "Gauge {each}", collected_by: own gauges, licence: CC-BY-4.0, retrieved: 2024-01-02 }
    series: { time: month, values: flow_m3s, unit: m3/s, step: P1M, missing: [NA] }
    period: 2009-10-01/2019-09-30
    missing_share: { table: data/gauges.csv }
    gaps_treated: Left missing; pairs dropped.
periods:
  year_begins: 10-01
  simulation: 2009-10-01/2019-09-30
  warm_up: 2009-10-01/2010-09-30
  calibration: [2010-10-01/2014-09-30]
  validation: [2014-10-01/2019-09-30]
setup:
  choices:
    - { topic: spatial units, chosen: slopes, thresholds: { least length in m: 50 }, because: thin soils }
    - { topic: evapotranspiration, chosen: none, because: winter floods only }
    - { topic: runoff generation, chosen: linear store, because: thin soils }
    - { topic: routing, chosen: none, because: small catchments }
parameters:
  calibrated_by: { strategy: manual, objective: flow, on: [gauge] }
  values:
    - { name: slope_days, unit: d, change: set, initial: 20, value: 29, range: [1, 90], range_from: common practice, scope: every catchment }
  sensitivity: { none_because: one parameter }
runs:
  calibrated:
    start: [node, model/slopes.mjs]
    takes: [inputs.gauge]
    gives: ["runs/calibrated/*.csv"]
evaluation:
  gauge:
    each: { table: data/gauges.csv }
    variable: streamflow
    step: P1M
    observed: { input: "gauge.{each}" }
    simulated: { run: calibrated, file: "runs/calibrated/{each}.csv", time: month, values: "q_{each}", unit: m3/s, step: P1M }
    scores: { table: data/scores.csv }
    review: { by: Invented Survey, on: 2024-03-04, says: Waves are followed. }
interventions: { none_because: natural catchments }
`;

/** A wave that differs from gauge to gauge; the model's has another height. */
const wave = (place: number, month: number) =>
  2 + Math.sin((month + 7 * place) / 5) + 0.3 * Math.cos(2 * month);
const flows = (place: number, factor: number, name: string) =>
  `month,${name}\n${months
    .map((month) => {
      const isMissing = name === 'flow_m3s' && month < place % 3;
      return `${label(month)},${isMissing ? 'NA' : (wave(place, month) * factor).toFixed(4)}\n`;
    })
    .join('')}`;

function network(): Record<string, string> {
  const files: Record<string, string> = {
    'stoplog.yaml': manifest,
    'model/slopes.mjs': '// Invented.\n',
    'data/gauges.csv': `gauge,missing_share\n${gauges
      .map((gauge, place) => `${gauge},${place % 3 === 0 ? '0' : ((place % 3) / months.length).toFixed(5)}\n`)
      .join('')}`,
    // Of pairs in a fixed ratio r2 is 1; PBIAS of 1.001 times the flow is -0.1, and NSE is 1 less a few millionths.
    'data/scores.csv': `target,window,nse,r2,pbias\n${gauges.map((gauge) => `${gauge},calibration,1.00,1.00,-0.1\n${gauge},validation,1.00,1.00,-0.1\n`).join('')}`,
  };
  for (const [place, gauge] of gauges.entries()) {
    files[`data/flow/${gauge}.csv`] = flows(place, 1, 'flow_m3s');
    files[`runs/calibrated/${gauge}.csv`] = flows(place, 1.001, `q_${gauge}`);
  }
  return files;
}

async function sealed(files: FilesInMemory): Promise<FilesInMemory> {
  const snapshot = snapshotFromMemory(files);
  const [study] = await readStudies(snapshot);
  if (study === undefined || 'problems' in study) throw new Error(JSON.stringify(study));
  const { seals } = makeSeals({
    ...study,
    wanted: 'all',
    because: null,
    person: 'Test Reviewer <reviewer@network.example>',
    today,
    evidence: await evidenceFor(study, snapshot),
  });
  return { ...files, 'stoplog.seals.json': writeSealsFile(seals) };
}

const check = async (files: FilesInMemory) => examine(snapshotFromMemory(files), { today });
const plainText = { color: false, extent: 'whole' } as const;

describe('three hundred gauges', () => {
  let files: FilesInMemory;
  beforeAll(async () => {
    files = await sealed(network());
  }, 120_000);

  it('are six hundred sound records, recomputed from their own rows of the tables', async () => {
    const verdict = await check(files);
    const [study] = verdict.manifests;
    expect(study?.findings.filter(({ level }) => level === 'block')).toEqual([]);
    const ofGauges = study?.records.filter(({ id }) => id.includes('.gauge.')) ?? [];
    expect(ofGauges).toHaveLength(600);
    expect(new Set(ofGauges.map(({ state, grade }) => `${state} ${grade}`))).toEqual(
      new Set(['sound recomputed']),
    );
  }, 120_000);

  it('hide no root: one changed file is told once, with the rest counted', async () => {
    const path = 'data/flow/g17.csv';
    const changed = String(files[path]).replace(/(2011-03),[\d.]+/, '$1,9.5');
    const verdict = await check({ ...files, [path]: changed });
    const findings = verdict.manifests.flatMap((one) => one.findings);
    const stale = findings.filter(({ rule }) => rule === 'seal.stale');
    expect(stale.filter(({ trail }) => trail.length === 2).map(({ record }) => record)).toEqual([
      'inputs.gauge.g17',
    ]);
    // The parameters, the run and three hundred targets rest on it.
    expect(stale).toHaveLength(303);
    expect(new Set(stale.map(({ trail }) => trail.at(-1)))).toEqual(new Set([path]));
    const text = textReport(verdict, plainText);
    expect(text).toContain(`more records that rest on ${path}`);
    expect(text.match(/^ +rests on/gm)?.length).toBeLessThan(20);
  }, 120_000);

  it('tell a wrong score and a wrong share with the line of the table, of that gauge alone', async () => {
    const verdict = await check(
      await sealed({
        ...files,
        'data/scores.csv': String(files['data/scores.csv']).replace(
          'g200,calibration,1.00',
          'g200,calibration,0.90',
        ),
        'data/gauges.csv': String(files['data/gauges.csv']).replace('g3,0.01667', 'g3,0.03100'),
      }),
    );
    const blocking = verdict.manifests
      .flatMap((one) => one.findings)
      .filter(({ level }) => level === 'block');
    expect(blocking.map(({ rule, record, file, line }) => `${rule} ${record} ${file}:${line}`)).toEqual([
      'inputs.missing-differs inputs.gauge.g3 data/gauges.csv:4',
      'evaluation.score-differs evaluation.gauge.g200 data/scores.csv:400',
    ]);
  }, 120_000);

  it('tell a fault of the fragment that they share once, with the rest counted', async () => {
    const verdict = await check({
      ...files,
      'stoplog.yaml': manifest.replace('unit: m3/s, step: P1M, missing', 'step: P1M, missing'),
    });
    const text = textReport(verdict, plainText);
    expect(text).toContain('297 more records that stand in inputs.gauge and have the same findings');
    expect(text.split('\n').length).toBeLessThan(400);
  }, 120_000);

  it('with a run for each, one changed file touches its own run and score only', async () => {
    const apart = manifest
      .replace('on: [gauge]', 'on: [gauge.g1]')
      .replace('  calibrated:\n', '  calibrated:\n    each: { table: data/gauges.csv }\n')
      .replace('takes: [inputs.gauge]', 'takes: ["inputs.gauge.{each}"]')
      .replace('gives: ["runs/calibrated/*.csv"]', 'gives: ["runs/calibrated/{each}.csv"]')
      .replace('{ run: calibrated,', '{ run: "calibrated.{each}",');
    const before = await sealed({ ...network(), 'stoplog.yaml': apart });
    const path = 'data/flow/g17.csv';
    const after = { ...before, [path]: String(before[path]).replace(/(2011-03),[\d.]+/, '$1,9.5') };
    const stale = (await check(after)).manifests
      .flatMap((one) => one.findings)
      .filter(({ rule }) => rule === 'seal.stale');
    expect(stale.map(({ record }) => record).sort()).toEqual([
      'evaluation.gauge.g17',
      'inputs.gauge.g17',
      'runs.calibrated.g17',
    ]);
  }, 120_000);
});
