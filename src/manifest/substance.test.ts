import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { FieldPath } from './manifest.ts';
import { readManifest } from './read.ts';
import { splitFragment } from './substance.ts';

const data = readManifest('stoplog.yaml', readFileSync('tests/harness/sound.yaml', 'utf8')).manifest?.data;

const at = (field: FieldPath): unknown =>
  field.reduce<unknown>((value, part) => (value as Record<string | number, unknown>)[part], data);

/** A fragment put together again from its two halves. */
function joined(substance: unknown, wording: unknown): unknown {
  if (wording === null || wording === undefined) return substance;
  if (Array.isArray(substance))
    return substance.map((item, place) => joined(item, (wording as unknown[])[place]));
  if (typeof substance !== 'object' || substance === null) return wording;
  const names = new Set([...Object.keys(substance), ...Object.keys(wording)]);
  const half = (of: unknown, name: string) => (of as Record<string, unknown>)[name];
  return Object.fromEntries(
    [...names].map((name) => [name, joined(half(substance, name), half(wording, name))]),
  );
}

const records: readonly FieldPath[] = [
  ['study'],
  ['catchment'],
  ['model'],
  ['inputs', 'rainfall'],
  ['periods'],
  ['setup'],
  ['readings', 0],
  ['parameters'],
  ['runs', 'calibrated'],
  ['evaluation', 'outlet-flow'],
  ['balance', 'catchment'],
  ['interventions'],
  ['seasons', 0],
  ['uncertainty'],
  ['scenarios', 'conditions'],
  ['scenarios', 'cases', 'dry'],
];

describe('substance and wording', () => {
  it.each(records)('%s %s %s are together the fragment, and nothing is in both', (...field) => {
    const { substance, wording, accepts } = splitFragment(
      field.filter((part) => part !== undefined),
      at(field),
    );
    expect(accepts).toEqual([]);
    expect(joined(substance, wording)).toEqual(at(field));
    if (wording !== null) expect(joined(substance, null)).not.toEqual(at(field));
  });

  it('of a model: reasons are wording, names and what was done are substance', () => {
    const { substance, wording } = splitFragment(['model'], at(['model']));
    expect(wording).toEqual({
      justification:
        'Two stores and a daily step answer a question about dry-weather flow with the data there are.',
      alternatives: [{ rejected_because: 'no soil survey finer than the catchment' }],
      assumptions: [{ evidence: 'tracer test of 2015' }, null],
    });
    expect(substance).toMatchObject({
      version: '2.1',
      alternatives: [{ name: 'grid-based soil model' }],
      assumptions: [{ holds: true }, { response: 'two flood days left out of the record' }],
    });
  });

  it('keep the place of a reason that stands for a statement', () => {
    expect(splitFragment(['periods'], { warm_up: { zero_because: 'a' } })).toEqual({
      substance: { warm_up: {} },
      wording: { warm_up: { zero_because: 'a' } },
      accepts: [],
    });
    expect(splitFragment(['interventions'], { none_because: 'a' }).substance).toEqual({});
  });

  it('hold no acceptances: those are apart, in order, from entries of a list too', () => {
    const accept = (rule: string) => ({ rule, because: 'a', by: 'b', on: '2026-01-01' });
    expect(
      splitFragment(['evaluation', 'x'], { variable: 'sediment', accepts: [accept('a.b'), accept('c.d')] }),
    ).toEqual({
      substance: { variable: 'sediment' },
      wording: null,
      accepts: [accept('a.b'), accept('c.d')],
    });
    const interventions = [
      { name: 'weir', accepts: [accept('a.b')] },
      { name: 'farm', because: 'small', accepts: [accept('c.d')] },
    ];
    expect(splitFragment(['interventions'], interventions)).toEqual({
      substance: [{ name: 'weir' }, { name: 'farm' }],
      wording: [null, { because: 'small' }],
      accepts: [accept('a.b'), accept('c.d')],
    });
  });

  it('of a record are told apart whatever its name', () => {
    const parts = splitFragment(['inputs', 'constructor'], { role: 'soil', may_be_negative_because: 'a' });
    expect(parts.wording).toEqual({ may_be_negative_because: 'a' });
  });

  it('of a single field are told as well', () => {
    expect(splitFragment(['periods', 'calibration'], ['2003-10-01/2007-09-30'])).toEqual({
      substance: ['2003-10-01/2007-09-30'],
      wording: null,
      accepts: [],
    });
    expect(splitFragment(['study', 'title'], 'a')).toEqual({ substance: null, wording: 'a', accepts: [] });
    expect(splitFragment(['parameters', 'values', 0, 'value'], 3).substance).toBe(3);
  });
});
