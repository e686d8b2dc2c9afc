import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { Ajv } from 'ajv';
import formats from 'ajv-formats';
import { beforeAll, describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import known from '../../../src/dossier/machine/cff-licences.json' with { type: 'json' };
import { citation } from '../../../src/dossier/machine/citation.ts';
import { outsidePackage } from '../../harness/outside.ts';
import { type Json, type Project, theAwkward, theExample } from './projects.ts';

/** Its `validateCFF` mends a wrong version in place of refusing it, so its schema is asked by our own ajv. */
const cffjs = outsidePackage('cffjs');

let example: Project;
let awkward: Project;
beforeAll(async () => {
  example = await theExample();
  awkward = await theAwkward();
}, 120_000);

async function schemaOfFormat(): Promise<Json> {
  return (await import(pathToFileURL(join(cffjs.folder, 'dist/schema.js')).href)).schema;
}

async function faultsOf(document: Json): Promise<string[]> {
  const ajv = new Ajv({ strict: false, allErrors: true });
  formats.default(ajv);
  ajv.validate(await schemaOfFormat(), document);
  return (ajv.errors ?? []).map(({ instancePath, keyword }) => `${instancePath} ${keyword}`);
}

describe('CITATION.cff', () => {
  it.skipIf(!cffjs.available)('fits the schema of Citation File Format 1.2.0', async () => {
    for (const project of [example, awkward])
      expect(await faultsOf(parse(project.text('CITATION.cff')))).toEqual([]);
  });

  it.skipIf(!cffjs.available)('would be refused when it is broken', async () => {
    const sound = parse(example.text('CITATION.cff'));
    expect(await faultsOf({ ...sound, 'cff-version': '1.3.0' })).toEqual(['/cff-version pattern']);
    expect(await faultsOf({ ...sound, authors: [] })).toEqual(['/authors minItems']);
    expect(await faultsOf({ ...sound, license: 'CC-BY-3.0-AU' })).toContain('/license enum');
    expect(await faultsOf({ ...sound, colour: 'blue' })).toEqual([' additionalProperties']);
  });

  it.skipIf(!cffjs.available)('knows just the licences of the format', async () => {
    const { enum: ids } = (await schemaOfFormat()).definitions['license-enum'];
    expect(known.ids.split(' ')).toEqual(ids);
  });

  it('says who, what, when, and under which licence', () => {
    expect(parse(example.text('CITATION.cff'))).toMatchObject({
      'cff-version': '1.2.0',
      type: 'dataset',
      title: 'Fennock Water low-flow model',
      authors: [{ name: 'Northmere Catchment Office', email: 'models@northmere.example' }],
      'date-released': '2025-03-12',
      commit: example.content.commit,
      license: 'CC-BY-4.0',
    });
  });

  it('gives the address of a licence that the format does not know', () => {
    const { license, 'license-url': url, title, message } = parse(awkward.text('CITATION.cff'));
    expect([license, url]).toEqual([undefined, 'https://spdx.org/licenses/CC-BY-3.0-AU.html']);
    expect(title).toBe('DRAFT: Harrow "Brook": <script>alert(1)</script> & \u202eμ - second: line #3');
    expect(message).toContain('draft');
  });

  it('names who sealed the records where nobody else is named', () => {
    const [study] = awkward.content.studies;
    if (study === undefined) throw new Error('no study');
    const { manifest } = study.facts;
    const data = { ...manifest.data, study: { ...manifest.data.study, contacts: [] } };
    const facts = { ...study.facts, manifest: { ...manifest, data } };
    const { authors } = parse(citation({ ...awkward.content, studies: [{ ...study, facts }] }));
    expect(authors).toEqual([{ name: 'Test Modeller', email: 'modeller@northmere.example' }]);
  });
});
