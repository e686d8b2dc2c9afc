import { expect, it } from 'vitest';
import { readManifest } from './read.ts';

const layout = (more: string) => `inputs: {rain: {series: {${more}}}}`;
const input = (more: string) => `inputs: {rain: {${more}}}`;

/** What somebody might write who never saw a manifest, and how the one message on it ends. */
const mistakes: readonly (readonly [text: string, ending: string])[] = [
  [layout('separator: ";"'), 'blank. Perhaps `semicolon` is meant.'],
  [layout('separator: "\\t"'), 'Perhaps `tab` is meant.'],
  [layout('separator: space'), 'Perhaps `blank` is meant.'],
  [layout('decimal: ","'), 'expected one of point, comma. Perhaps `comma` is meant.'],
  [layout('decimal: "."'), 'Perhaps `point` is meant.'],
  [layout('delimiter: comma'), 'perhaps `separator` is meant.'],
  [layout('skip_rows: 2'), 'perhaps `skip_lines` is meant.'],
  [layout('units: mm/d'), 'perhaps `unit` is meant.'],
  [layout('unit: [mm/d]'), 'is a list; expected a text. Perhaps `mm/d` is meant.'],
  [layout('step: daily'), 'Perhaps `P1D` is meant.'],
  [layout('missing: NA'), 'Perhaps `[NA]` is meant.'],
  [layout('missing: -999'), 'Perhaps `[-999]` is meant.'],
  [layout('day_ends: 9'), 'Perhaps `"09:00"` is meant.'],
  [layout('utc_offset: UTC'), 'Perhaps `"+00:00"` is meant.'],
  [layout('utc_offset: +1'), 'Perhaps `"+01:00"` is meant.'],
  [layout('time: {column: date, format: DD/MM/YYYY}'), 'perhaps `pattern` is meant.'],
  [input('role: rainfall'), 'Perhaps `precipitation` is meant.'],
  [input('role: discharge'), 'Perhaps `streamflow` is meant.'],
  [input('stored: external'), 'Perhaps `elsewhere` is meant.'],
  [input('files: data/rain.csv'), 'Perhaps `[data/rain.csv]` is meant.'],
  [input('source: {retrieved: 03/04/2020}'), 'Perhaps `2020-04-03` or `2020-03-04` is meant.'],
  [input('source: {retrieved: 13.4.2020}'), 'such as 2026-01-14. Perhaps `2020-04-13` is meant.'],
  [input('source: {retrieved: 2020-04-03T12:00:00}'), 'Perhaps `2020-04-03` is meant.'],
  [input('missing_share: 2 %'), 'Perhaps `0.02` is meant.'],
  [input('missing_share: "0.004"'), 'Write it without quotes.'],
  ['periods: {simulation: 2001-10-01 to 2015-09-30}', 'Perhaps `2001-10-01/2015-09-30` is meant.'],
  ['periods: {simulation: [2001-10-01, 2015-09-30]}', 'Perhaps `2001-10-01/2015-09-30` is meant.'],
  ['periods: {simulation: {from: 2001-10-01, to: 2015-09-30}}', 'Perhaps `2001-10-01/2015-09-30` is meant.'],
  ['periods: {simulation: 2001-2015}', 'the first not after the last.'],
  ['periods: {year_begins: October}', 'such as 10-01. Perhaps `10-01` is meant.'],
  ['periods: {spin_up: 2001-10-01/2003-09-30}', 'perhaps `warm_up` is meant.'],
  ['study: {needs: [{regime: low flows}]}', 'Perhaps `low` is meant.'],
  ['study: {purpose: [low flows, floods]}', 'is a list; expected a text.'],
  ['catchment: {area: 61 km2}', 'expected a map of keys such as {value: ..., unit: ...}.'],
  ['balance: {catchment: {inflow: [P]}}', 'is a list; expected a map of keys such as {NAME: ...}.'],
  ['catchment: {outlet: [-1.5, 52.5]}', 'such as {longitude: ..., latitude: ...}.'],
  ['parameters: {values: [{name: a, change: multiply}]}', 'Perhaps `scale` is meant.'],
  ['parameters: {values: [{name: a, range: 50-400}]}', 'least and greatest, such as [50, 400].'],
  ['evaluation: {q: {scores: {calibration: {nse: 0,83}}}}', 'as in 0.83, and no comma.'],
  [
    'evaluation: {q: {scores: {calibration:\n  {nse: "0,83"}}}}',
    'expected a number. Perhaps `0.83` is meant.',
  ],
  ['evaluation: {q: {variable: discharge}}', 'Perhaps `streamflow` is meant.'],
  ['uncertainty: {bands: {q: {level: 95%}}}', 'Perhaps `0.95` is meant.'],
  ['study:\n\ttitle: a\nmodel: {}\ninputs: {}', 'YAML takes only blanks: `title: a`.'],
];

it.each(mistakes)('%s is told what to write', (text, ending) => {
  const messages = readManifest('stoplog.yaml', `stoplog: 1\n${text}\n`).problems.map(
    ({ message }) => message,
  );
  expect(messages).toHaveLength(1);
  expect(messages[0]?.slice(-ending.length)).toBe(ending);
});
