import { expect, it } from 'vitest';
import { nearestName } from './nearest.ts';

const names = [
  'study',
  'catchment',
  'model',
  'inputs',
  'periods',
  'setup',
  'separator',
  'values',
  'skip_lines',
];

it.each([
  ['stdy', 'study'],
  ['stuyd', 'study'],
  ['Study', 'study'],
  ['seperator', 'separator'],
  ['skip-lines', 'skip_lines'],
  ['skiplines', 'skip_lines'],
  ['input', 'inputs'],
  ['value', 'values'],
])('%s is nearest to %s', (mistyped, name) => {
  expect(nearestName(mistyped, names)).toBe(name);
});

it.each(['', 'x', 'gauge', 'calibration', 'stud_book_of_horses'])('nothing is near "%s"', (mistyped) => {
  expect(nearestName(mistyped, names)).toBeUndefined();
});
