import { describe, expect, it } from 'vitest';
import { isStandIn, isStated } from './stand-in.ts';

describe('a stand-in', () => {
  it.each([
    '',
    '  ',
    '?',
    '???',
    '-',
    '...',
    'todo',
    'TODO: ask the office',
    'To do',
    'tbd',
    'TBD.',
    'xxx',
    '<unknown>',
    '(n/a)',
    'N/A',
    'as usual',
    'fixme later',
  ])('%j says nothing', (text) => {
    expect(isStandIn(text)).toBe(true);
  });

  it.each([
    'Unknown Brook gauge',
    '1',
    'none',
    'm3/s',
    'todorov filter',
    'xxl plots',
    'no wind record',
    '°C',
  ])('%j says something', (text) => {
    expect(isStandIn(text)).toBe(false);
  });

  it('leaves out what is not there', () => {
    expect([isStated(undefined), isStated('tbd'), isStated('report 7')]).toEqual([false, false, true]);
  });
});
