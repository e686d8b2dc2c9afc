import { describe, expect, it } from 'vitest';
import type { Take } from '../manifest/data.generated.ts';
import { take } from './take.ts';

const from = (text: string, how: Take, file = 'model/control.txt') =>
  take(new TextEncoder().encode(text), how, file);

describe('taking the value of a key', () => {
  it.each([
    ['warmup_years 2', '2'],
    ['warmup_years = 2', '2'],
    ['warmup_years: 2', '2'],
    ['  warmup_years\t=\t2  ', '2'],
    ['warmup_years=2', '2'],
    ['warmup_years = 2 ! years', '2'],
    ['warmup_years = 2 # years', '2'],
    ['warmup_years 2 // years', '2'],
    ['warmup_years = "2 years"', '2 years'],
    ["warmup_years 'a # b' # c", 'a # b'],
  ])('%j', (line, value) => {
    expect(from(`first line\r\n${line}\nlast`, { key: 'warmup_years' })).toEqual({ value, line: 2 });
  });

  it('takes no longer key that begins alike, and says what is not there', () => {
    expect(from('warmup_years_min 2\n', { key: 'warmup_years' })).toBe(
      'model/control.txt has no lines that begin with the key `warmup_years`',
    );
  });

  it('takes none of several, and says where they are', () => {
    expect(from('a 1\na 2\na 3\na 4\na 5\n', { key: 'a' })).toBe(
      'model/control.txt has several lines that begin with the key `a`: 1, 2, 3 and more',
    );
  });

  it('says that the value is missing', () => {
    expect(from('a = # later\n', { key: 'a' })).toBe('nothing stands there on line 1 of model/control.txt');
  });
});

describe('taking a word of a line', () => {
  const text = 'begins 2001-10-01\n2, 365;  1\n';
  it.each([
    [{ line: 1, word: 2 }, '2001-10-01'],
    [{ line: 2, word: 3 }, '1'],
    [{ line: 1 }, 'begins 2001-10-01'],
  ])('%j', (how, value) => {
    expect(from(text, how)).toEqual({ value, line: how.line });
  });

  it('says what is not there', () => {
    expect(from(text, { line: 9 })).toBe('model/control.txt has no line 9; it ends with line 3');
    expect(from(text, { line: 1, word: 3 })).toBe('line 1 of model/control.txt has no word 3');
  });
});

describe('taking a cell of a table', () => {
  it.each([
    ['commas', 'name,value\nsoil,180\ndeep,70\n', { row: 'deep', column: 'value' }, '70', 3],
    ['blanks', 'name   value\nsoil   180\ndeep    70\n', { row: 'deep', column: 'value' }, '70', 3],
    ['tabs', 'name\tvalue\nsoil a\t180\n', { row: 'soil a', column: 'value' }, '180', 2],
    ['semicolons', 'name;value\nsoil;1,8\n', { row: 'soil', column: 2 }, '1,8', 2],
    ['quotation marks', 'name,value\n"soil, upper",180\n', { row: 'soil, upper', column: 'value' }, '180', 2],
    ['places below the names', 'name,value\nsoil,180\ndeep,70\n', { row: 2, column: 'value' }, '70', 3],
    ['places without names', '180 2\n70 3\n', { row: 2, column: 1 }, '70', 2],
    ['lines above the names', '# run 7\nname value\nsoil 180\n', { row: 'soil', column: 'value' }, '180', 3],
    ['a stated separator', 'a b,value\nsoil,180\n', { row: 'soil', column: 2, separator: 'comma' }, '180', 2],
  ] as const)('by %s', (_, text, how, value, line) => {
    expect(from(text, how)).toEqual({ value, line });
  });

  it('says what is not there, and what is there twice', () => {
    const text = 'name,value\nsoil,180\nsoil,190\n';
    expect(from(text, { row: 'soil', column: 'vlaue' })).toBe('model/control.txt has no column `vlaue`');
    expect(from(text, { row: 'deep', column: 'value' })).toBe(
      'model/control.txt has no lines that begin with the cell `deep`',
    );
    expect(from(text, { row: 'soil', column: 'value' })).toContain(
      'several lines that begin with the cell `soil`: 2, 3',
    );
    expect(from(text, { row: 'soil', column: 5 })).toContain('several');
    expect(from('name,value\nsoil,\n', { row: 'soil', column: 'value' })).toContain(
      'nothing stands there on line 2',
    );
  });
});

describe('taking what a pattern catches', () => {
  const log = 'start\ntwo-store release 1.4.2 (2025)\nend\n';
  it.each([
    ['release (\\S+)', '1.4.2'],
    ['^\\S+ release [0-9.]+', 'two-store release 1.4.2'],
  ])('%s', (pattern, value) => {
    expect(from(log, { pattern })).toEqual({ value, line: 2 });
  });

  it('says what does not match, matches twice, or is no pattern', () => {
    expect(from(log, { pattern: 'version (\\S+)' })).toBe(
      'model/control.txt has no lines that match `version (\\S+)`',
    );
    expect(from(log, { pattern: '^(\\w+)$' })).toContain('several lines that match');
    expect(from(log, { pattern: '(release' })).toContain('can’t be read as a regular expression');
  });

  it('takes time that grows with the text only', () => {
    // On an engine that goes back, this pattern doubles its time with every letter: 2^3000 steps.
    expect(from(`${'a'.repeat(3000)}!`, { pattern: '^(a+)+$' })).toContain('has no lines that match');
  });
});

describe('taking from a structured file', () => {
  const yaml =
    'time:\n  start: 2001-10-01\n  warm up/years: 2\nzones: [{name: upper, area: 12.5}]\nsnow: false\nempty:\n';
  const json = '{"time": {"start": "2001-10-01"},\n "zones": [\n  {"area": 12.5}]}';
  const toml = 'snow = false\n[time]\nstart = 2001-10-01\nyears = 2\n';
  it.each([
    ['control.yaml', yaml, '/time/start', '2001-10-01', 2],
    ['control.yml', yaml, '/time/warm up~1years', 2, 3],
    ['control.yaml', yaml, '/zones/0/area', 12.5, 4],
    ['control.yaml', yaml, '/snow', false, 5],
    ['control.json', json, '/time/start', '2001-10-01', 1],
    ['control.json', json, '/zones/0/area', 12.5, 3],
    ['control.toml', toml, '/time/years', 2, null],
    ['control.toml', toml, '/time/start', '2001-10-01', null],
    ['control.TOML', toml, '/snow', false, null],
    ['alias.yaml', 'a: &years 2\nb: *years\n', '/b', 2, 1],
    // RFC 6901, section 5: the pointers of the example document.
    ['rfc.json', '{"a/b": 1, "m~n": 8, " ": 7, "": 0}', '/a~1b', 1, 1],
    ['rfc.json', '{"a/b": 1, "m~n": 8, " ": 7, "": 0}', '/m~0n', 8, 1],
    ['rfc.json', '{"a/b": 1, "m~n": 8, " ": 7, "": 0}', '/', 0, 1],
  ] as const)('%s: %j at %s', (file, text, pointer, value, line) => {
    expect(from(text, { pointer }, file)).toEqual({ value, line });
  });

  it.each([
    ['control.yaml', yaml, '/time/end', 'holds nothing at `/time/end`'],
    ['control.yaml', yaml, '/zones/x', 'holds nothing at'],
    ['control.yaml', yaml, '/zones/1/area', 'holds nothing at'],
    ['control.yaml', yaml, '/empty', 'holds nothing at'],
    ['control.yaml', yaml, '/time', 'that is one value'],
    ['control.toml', toml, '/time', 'that is one value'],
    ['control.toml', toml, '/__proto__', 'holds nothing at'],
    ['control.yaml', yaml, 'time/start', 'does not begin with `/`'],
    ['control.yaml', 'a: [1\nb: 2\n', '/b', 'can’t be read as YAML'],
    ['control.toml', 'a = \n', '/a', 'can’t be read as TOML'],
    ['control.ini', 'a = 1', '/a', 'reads .json, .yaml and .toml files'],
  ])('%s %j %s', (file, text, pointer, problem) => {
    expect(from(text, { pointer }, file)).toContain(problem);
  });

  it('is not led round by aliases that would expand without end', () => {
    const bomb = `a: &a [x, x]\nb: &b [*a, *a]\nc: &c [*b, *b]\nd: [*c, *c]\n`;
    expect(from(bomb, { pointer: '/d' }, 'control.yaml')).toContain('that is one value');
  });
});
