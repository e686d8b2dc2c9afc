import { expect, it } from 'vitest';
import { pageDocuments } from '../../../src/dossier/page/index.ts';
import { dayNumber, formatDate } from '../../../src/series/calendar.ts';
import { temporaryRepository } from '../../harness/repository.ts';
import { withContent } from './content.ts';

const first = dayNumber(1901, 1, 1);
const days = dayNumber(2001, 1, 1) - first;

/** A century of invented daily flow that never repeats itself, with a gap each year. */
function flow(factor: number): string {
  let state = 1;
  const rows = Array.from({ length: days }, (_, place) => {
    state = (state * 48271) % 2147483647;
    const season = 2 + Math.sin((2 * Math.PI * place) / 365.25);
    const value = factor * season * (0.5 + state / 2147483647);
    return `${formatDate(first + place)},${place % 365 === 200 ? '' : value.toFixed(3)}`;
  });
  return `date,flow\n${rows.join('\n')}\n`;
}

const layout = 'time: date, values: flow, unit: m3/s, step: P1D, missing: [""]';
const names = Array.from({ length: 100 }, (_, place) => `g${String(place).padStart(3, '0')}`);
const manifest = `stoplog: 1
study: {title: Hundred invented gauges, phase: calibration}
model: {name: pond, version: "1.0", release: "1.0.0"}
periods: {simulation: 1901-01-01/2000-12-31, warm_up: 1901-01-01/1902-12-31, calibration: [1903-01-01/1950-12-31], validation: [1951-01-01/2000-12-31]}
inputs:
  gauge: {each: [${names}], role: streamflow, files: [data/flow.csv], series: {${layout}}}
runs:
  all: {gives: [runs/flow.csv]}
evaluation:
  target:
    each: [${names}]
    variable: streamflow
    observed: {input: "gauge.{each}"}
    simulated: {run: all, file: runs/flow.csv, ${layout}}
`;

it('stays below 5 MB with a hundred targets over a century of days', async () => {
  const repository = await temporaryRepository({
    'stoplog.yaml': manifest,
    'data/flow.csv': flow(1),
    'runs/flow.csv': flow(0.9),
  });
  try {
    const [page] = await withContent(repository, pageDocuments);
    const html = String(page?.content);
    expect(html.match(/<h3 id="study-1-target-/g)).toHaveLength(100);
    expect(
      html.match(/<title>target\.g\d\d\d: observed and simulated over time, linear scale/g),
    ).toHaveLength(100);
    expect(html.match(/<title>gauge\.g\d\d\d: what is there and what is missing/g)).toHaveLength(100);
    expect(Buffer.byteLength(html)).toBeLessThan(5 * 2 ** 20);
  } finally {
    await repository.remove();
  }
}, 300_000);
