import { beforeAll, describe, expect, it } from 'vitest';
import { examine } from '../../src/commands/examine.ts';
import { readStudies } from '../../src/commands/studies.ts';
import { evidenceFor } from '../../src/facts/evidence.ts';
import { makeSeals } from '../../src/records/make-seals.ts';
import { writeSealsFile } from '../../src/records/seals-file.ts';
import { textReport } from '../../src/reports/text.ts';
import { type FilesInMemory, snapshotFromMemory } from '../../src/repository/memory.ts';
import { formatDate, parseDate } from '../../src/series/calendar.ts';

/** An invented network: three hundred gauges, one run for all, a score of each. */
const gauges = Array.from({ length: 300 }, (_, place) => `g${place + 1}`);
const today = '2024-05-01';
const first = parseDate('2009-10-01') ?? 0;
const days = Array.from({ length: 4 * 365 + 1 }, (_, place) => place);

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
    series: { time: date, values: flow_m3s, unit: m3/s, step: P1D, missing: [NA], day_ends: "24:00", utc_offset: "+00:00" }
    period: 2009-10-01/2013-09-30
    missing_share: { table: data/gauges.csv }
    gaps_treated: Left missing; pairs dropped.
periods:
  year_begins: 10-01
  simulation: 2009-10-01/2013-09-30
  warm_up: 2009-10-01/2010-09-30
  calibration: [2010-10-01/2012-09-30]
  validation: [2012-10-01/2013-09-30]
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
    step: P1D
    observed: { input: "gauge.{each}" }
    simulated: { run: calibrated, file: "runs/calibrated/{each}.csv", time: date, values: "q_{each}", unit: m3/s, step: P1D }
    scores: { table: data/scores.csv }
    review: { by: Invented Survey, on: 2024-03-04, says: Waves are followed. }
interventions: { none_because: natural catchments }
`;

/** A wave that differs from gauge to gauge; the model's has another height. */
const wave = (place: number, day: number) => 2 + Math.sin((day + 7 * place) / 29) + 0.3 * Math.cos(day / 5);
const flows = (place: number, factor: number, name: string) =>
  `date,${name}\n${days
    .map((day) => {
      const isMissing = name === 'flow_m3s' && day < place % 3;
      return `${formatDate(first + day)},${isMissing ? 'NA' : (wave(place, day) * factor).toFixed(4)}\n`;
    })
    .join('')}`;

function network(): Record<string, string> {
  const files: Record<string, string> = {
    'stoplog.yaml': manifest,
    'model/slopes.mjs': '// Invented.\n',
    'data/gauges.csv': `gauge,missing_share\n${gauges
      .map((gauge, place) => `${gauge},${place % 3 === 0 ? '0' : ((place % 3) / days.length).toFixed(5)}\n`)
      .join('')}`,
    // Of pairs in a fixed ratio r2 is 1, and PBIAS of 1.01 times the flow is -1; NSE is 1 less a ten thousandth of some 8.
    'data/scores.csv': `target,window,nse,r2,pbias\n${gauges.map((gauge) => `${gauge},calibration,1.00,1.00,-1.0\n${gauge},validation,1.00,1.00,-1.0\n`).join('')}`,
  };
  for (const [place, gauge] of gauges.entries()) {
    files[`data/flow/${gauge}.csv`] = flows(place, 1, 'flow_m3s');
    files[`runs/calibrated/${gauge}.csv`] = flows(place, 1.01, `q_${gauge}`);
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
const quietly = { color: false, quiet: false };

describe('three hundred gauges', () => {
  let files: FilesInMemory;
  beforeAll(async () => {
    files = await sealed(network());
  }, 60_000);

  it('are six hundred sound records, recomputed from their own rows of the tables', async () => {
    const verdict = await check(files);
    const [study] = verdict.manifests;
    expect(study?.findings.filter(({ level }) => level === 'block')).toEqual([]);
    const ofGauges = study?.records.filter(({ id }) => id.includes('.gauge.')) ?? [];
    expect(ofGauges).toHaveLength(600);
    expect(new Set(ofGauges.map(({ state, grade }) => `${state} ${grade}`))).toEqual(
      new Set(['sound recomputed']),
    );
  }, 60_000);

  it('hide no root: one changed file is told once, with the rest counted', async () => {
    const path = 'data/flow/g17.csv';
    const changed = String(files[path]).replace(/(2011-03-05),[\d.]+/, '$1,9.5');
    const verdict = await check({ ...files, [path]: changed });
    const findings = verdict.manifests.flatMap((one) => one.findings);
    const stale = findings.filter(({ rule }) => rule === 'seal.stale');
    expect(stale.filter(({ trail }) => trail.length === 2).map(({ record }) => record)).toEqual([
      'inputs.gauge.g17',
    ]);
    // The parameters, the run and three hundred targets rest on it.
    expect(stale).toHaveLength(303);
    expect(new Set(stale.map(({ trail }) => trail.at(-1)))).toEqual(new Set([path]));
    const text = textReport(verdict, quietly);
    expect(text).toContain(`more records that rest on ${path}`);
    expect(text.match(/^ +rests on/gm)?.length).toBeLessThan(20);
  }, 60_000);

  it('tell a wrong score and a wrong share with the line of the table, of that gauge alone', async () => {
    const verdict = await check(
      await sealed({
        ...files,
        'data/scores.csv': String(files['data/scores.csv']).replace(
          'g200,calibration,1.00',
          'g200,calibration,0.90',
        ),
        'data/gauges.csv': String(files['data/gauges.csv']).replace('g3,0.00137', 'g3,0.03100'),
      }),
    );
    const blocking = verdict.manifests
      .flatMap((one) => one.findings)
      .filter(({ level }) => level === 'block');
    expect(blocking.map(({ rule, record, file, line }) => `${rule} ${record} ${file}:${line}`)).toEqual([
      'inputs.missing-differs inputs.gauge.g3 data/gauges.csv:4',
      'evaluation.score-differs evaluation.gauge.g200 data/scores.csv:400',
    ]);
  }, 60_000);

  it('tell a fault of the fragment that they share once, with the rest counted', async () => {
    const verdict = await check({
      ...files,
      'stoplog.yaml': manifest.replace('unit: m3/s, step: P1D, missing', 'step: P1D, missing'),
    });
    const text = textReport(verdict, quietly);
    expect(text).toContain('297 more records that stand in inputs.gauge and have the same findings');
    expect(text.split('\n').length).toBeLessThan(400);
  }, 60_000);
});
