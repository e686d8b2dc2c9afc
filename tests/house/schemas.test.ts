import { readFileSync } from 'node:fs';
import { Ajv2020 } from 'ajv/dist/2020.js';
import { globSync } from 'glob';
import { describe, expect, it } from 'vitest';
import type { Seal } from '../../src/records/seal.ts';
import { faultyField, withChecksum } from '../../src/records/seal-entry.ts';
import { writeSealsFile } from '../../src/records/seals-file.ts';
import type { Verdict } from '../../src/verdict/finding.ts';

type Schema = { readonly [key: string]: unknown };

const read = (path: string): Schema => JSON.parse(readFileSync(path, 'utf8')) as Schema;
const annotations = ['x-unit', 'x-source', 'x-prose', 'x-accepts', 'x-expects'];

/** Every part of a schema with its place, keys of `properties` apart from the maps that hold them. */
function* partsOf(schema: unknown, place = '#'): Generator<readonly [place: string, part: Schema]> {
  if (typeof schema !== 'object' || schema === null) return;
  if (!Array.isArray(schema)) yield [place, schema as Schema];
  for (const [key, value] of Object.entries(schema)) yield* partsOf(value, `${place}/${key}`);
}

describe.for(globSync('schemas/*.json').sort())('%s', (path) => {
  const schema = read(path);
  const parts = [...partsOf(schema)];

  it('is a JSON Schema by the meta-schema of draft 2020-12, and the meta-schema would refuse a broken one', () => {
    const ajv = new Ajv2020();
    expect(schema.$schema).toBe('https://json-schema.org/draft/2020-12/schema');
    expect([ajv.validateSchema(schema), ajv.errors ?? []]).toEqual([true, []]);
    expect(ajv.validateSchema({ ...schema, properties: { study: { type: 'txt' } } })).toBe(false);
  });

  it('holds no keyword that the draft or our annotations do not know', () => {
    const ajv = new Ajv2020({
      strictTypes: true,
      allowUnionTypes: true,
      formats: { date: true, period: true },
    });
    ajv.addVocabulary(annotations);
    expect(() => ajv.compile(schema)).not.toThrow();
  });

  it('describes every key, its own or by the definition that it refers to', () => {
    const definitions = schema.$defs as Readonly<Record<string, Schema>>;
    const described = (part: Schema): boolean =>
      typeof part.description === 'string' ||
      (typeof part.$ref === 'string' && described(definitions[part.$ref.slice('#/$defs/'.length)] ?? {}));
    const keys = parts.filter(
      ([place]) =>
        /\/properties\/[^/]+$/.test(place) && !place.includes('/then/') && !place.includes('/else/'),
    );
    expect(keys.length).toBeGreaterThan(20);
    expect(keys.filter(([, part]) => !described(part)).map(([place]) => place)).toEqual([]);
  });

  it('refuses unknown keys in every map that is not one of names', () => {
    const open = parts.filter(
      ([place, part]) =>
        part.type === 'object' &&
        part.additionalProperties === undefined &&
        part.unevaluatedProperties === undefined &&
        place !== '#/$defs/Layout', // closed by the maps that share it
    );
    expect(open.map(([place]) => place)).toEqual([]);
  });

  it('gives every figure a unit', () => {
    if (!path.includes('manifest')) return;
    const figures = parts.filter(
      ([place, part]) => part.type === 'number' && /\/properties\/[^/]+$/.test(place),
    );
    const bare = figures.filter(
      ([place, part]) => part['x-unit'] === undefined && !place.endsWith('/else/properties/now'),
    );
    expect(figures.length).toBeGreaterThan(40);
    expect(bare.map(([place]) => place)).toEqual([]);
  });
});

describe('generated files', () => {
  it('are what the generator makes of the schemas', async () => {
    const generator: string = '../../src/build/generate.mjs';
    const { generate } = (await import(generator)) as { generate(): Promise<ReadonlyMap<string, string>> };
    const stale = [...(await generate())].filter(([path, content]) => readFileSync(path, 'utf8') !== content);
    expect(stale.map(([path]) => path)).toEqual([]);
  });

  it('are all of the generator', async () => {
    const generator: string = '../../src/build/generate.mjs';
    const { generate } = (await import(generator)) as { generate(): Promise<ReadonlyMap<string, string>> };
    expect(globSync('src/**/*.generated.*').sort()).toEqual([...(await generate()).keys()].sort());
  });
});

describe('the schema of findings', () => {
  const ajv = new Ajv2020({ allowUnionTypes: true });
  const validate = ajv.compile(read('schemas/findings.schema.json'));
  /** Every key of the type, so that the compiler tells when the schema falls behind. */
  const verdict: Verdict = {
    format: 'stoplog-findings/1',
    at: 'staged for commit',
    base: null,
    comparison: { asked: 'main', strict: false, unavailable: 'It shares no commit.', notes: ['A note.'] },
    manifests: [
      {
        path: 'stoplog.yaml',
        study: 'Harrow Brook dry-weather flow',
        phase: 'calibration',
        records: [
          {
            id: 'study',
            state: 'sound',
            grade: 'sealed',
            sealed_on: '2021-01-15',
            sealed_by: 'A <a@b.example>',
          },
        ],
        findings: [
          {
            rule: 'seal.stale',
            level: 'block',
            record: 'inputs.rainfall',
            message: 'The file changed.',
            file: 'stoplog.yaml',
            line: 41,
            column: 3,
            stated: 0.78,
            found: null,
            unit: '1',
            trail: ['inputs.rainfall', 'data/rain.csv'],
            detail: [],
            source: 'follows from the words',
            clear: 'stoplog seal inputs.rainfall',
            standing: false,
            waived: null,
            accepted: null,
            fingerprint: 'ab12',
          },
        ],
        departures: [{ of: 'evaluation.drop', now: 'blocks', because: 'licence', loosens: false }],
        cured: [{ rule: 'seal.stale', record: 'model', message: 'It changed.', fingerprint: 'cd34' }],
        changed: [{ record: 'evaluation.outlet-flow', what: ['calibration.nse 0.78 -> 0.8'] }],
      },
    ],
    totals: {
      records: 1,
      sound: 1,
      block: 1,
      warn: 0,
      note: 0,
      waived: 0,
      accepted: 0,
      standing: 0,
      cured: 1,
    },
    verdict: 'blocked',
  };

  it('takes a verdict', () => {
    expect([validate(verdict), validate.errors]).toEqual([true, null]);
  });

  it('wants every key of it, and no other', () => {
    const without = (part: object, key: string) =>
      Object.fromEntries(Object.entries(part).filter(([name]) => name !== key));
    const [manifest] = verdict.manifests;
    const [finding] = manifest?.findings ?? [];
    const withFinding = (changed: object) => ({
      ...verdict,
      manifests: [{ ...manifest, findings: [changed] }],
    });
    for (const key of Object.keys(verdict)) expect(validate(without(verdict, key))).toBe(false);
    for (const key of Object.keys(finding ?? {}))
      expect(validate(withFinding(without(finding ?? {}, key)))).toBe(false);
    expect(validate(withFinding({ ...finding, more: 1 }))).toBe(false);
  });
});

describe('the schema of seals', () => {
  const ajv = new Ajv2020({ allowUnionTypes: true, formats: { date: true } });
  ajv.addVocabulary(annotations);
  const validate = ajv.compile(read('schemas/seals.schema.json'));
  const digest = 'ab'.repeat(32);
  /** Every key of the type. */
  const seal: Seal = withChecksum({
    scheme: 1,
    substance: digest,
    wording: digest,
    accepts: [digest],
    files: {
      'data/rain.csv': { sha256: digest, bytes: 120, blob: 'c0ffee' },
      'radar.nc': { sha256: null, bytes: null, blob: null },
    },
    rests_on: { model: digest },
    digest,
    outcome: digest,
    driven_by: { 'inputs.rainfall': digest, 'model/control.txt': null },
    unmoved: ['inputs.rainfall'],
    facts: { nse: { value: 0.78, computed_by: 1 } },
    sealed_by: 'A <a@b.example>',
    sealed_on: '2021-01-15',
    grade: 'rerun',
    because: null,
  });
  const fileOf = (entry: object): unknown => JSON.parse(writeSealsFile(new Map([['runs.a', entry as Seal]])));

  it('takes a seals file as it is written', () => {
    expect(faultyField({ ...seal })).toBeNull();
    expect([validate(fileOf(seal)), validate.errors]).toEqual([true, null]);
  });

  it('refuses what the reader of seals refuses', () => {
    const wrong = [
      ...Object.keys(seal).map((key) =>
        Object.fromEntries(Object.entries(seal).filter(([name]) => name !== key)),
      ),
      { ...seal, more: 1 },
      { ...seal, digest: 'AB' },
      { ...seal, grade: 'stated' },
      { ...seal, scheme: 0 },
      { ...seal, files: { a: { sha256: digest, bytes: -1, blob: null } } },
      { ...seal, facts: { nse: { value: true, computed_by: 1 } } },
    ];
    for (const entry of wrong) {
      expect(faultyField(entry)).not.toBeNull();
      expect(validate(fileOf(entry))).toBe(false);
    }
  });
});
