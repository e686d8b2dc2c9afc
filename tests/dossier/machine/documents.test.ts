import { readFileSync } from 'node:fs';
import { Ajv2020 } from 'ajv/dist/2020.js';
import { beforeAll, describe, expect, it } from 'vitest';
import { frameworks } from '../../../src/dossier/frameworks/index.ts';
import { areas } from '../../../src/records/record.ts';
import {
  awkwardNames,
  exampleProject,
  type Json,
  type Project,
  readAndRemoved,
  theAwkward,
  theExample,
} from './projects.ts';

const schema = (name: string) => JSON.parse(readFileSync(`schemas/${name}.schema.json`, 'utf8'));
const validate = new Ajv2020({ allowUnionTypes: true, allErrors: true }).compile(schema('facts'));
const validateFindings = new Ajv2020({ allowUnionTypes: true }).compile(schema('findings'));

let example: Project;
let awkward: Project;
let again: Project;
beforeAll(async () => {
  example = await theExample();
  awkward = await theAwkward();
  again = await readAndRemoved(await exampleProject());
}, 120_000);

const record = (project: Project, id: string): Json =>
  project.json('facts.json').studies[0].records.find((one: Json) => one.id === id);

describe('facts.json and findings.json', () => {
  it('fit their schemas, which would refuse broken ones', () => {
    for (const project of [example, awkward]) {
      expect([validate(project.json('facts.json')), validate.errors]).toEqual([true, null]);
      expect(validateFindings(project.json('findings.json'))).toBe(true);
    }
    const broken = example.json('facts.json');
    broken.studies[0].records[0].state = 'fine';
    broken.studies[0].colour = 'blue';
    expect(validate(broken)).toBe(false);
    expect(validate.errors?.map(({ keyword }) => keyword).sort()).toEqual(['additionalProperties', 'enum']);
  });

  it('tell of each record its state, seal and files', () => {
    const rainfall = record(example, 'inputs.rainfall');
    expect(rainfall).toMatchObject({ state: 'sound', rests_on: [] });
    expect(rainfall.seal).toMatchObject({ digest: rainfall.digest, sealed_on: '2025-03-12' });
    expect(rainfall.files.filter((file: Json) => file.own).map((file: Json) => file.path)).toEqual([
      'data/rain/fennock-bridge.csv',
      'data/rain/high-tarrow.csv',
      'data/rain/sallow-rigg.csv',
    ]);
    expect(record(example, 'inputs.radar').elsewhere).toEqual([
      {
        path: 'radar/2001-2015.csv',
        sha256: '01c665f84bae5fa7c6b6a94ff0eca4d8eca217375809d3652ba71ee2be081d46',
        bytes: 74080,
        location: 'https://data.northmere.example/radar/2001-2015.csv',
      },
    ]);
    expect(record(awkward, 'inputs.lfs').files).toEqual([
      { path: awkwardNames.lfs, own: true, sha256: '4d'.repeat(32), bytes: 123456, in_repository: false },
    ]);
  });

  it('tell figures stated and recomputed', () => {
    const { scores, balances, bands, conditions } = example.json('facts.json').studies[0];
    const stated = scores['outlet-flow'].figures.find(
      (one: Json) => one.window === 'validation' && one.score === 'nse',
    );
    expect(stated.agrees).toBe(true);
    expect(stated.recomputed.toFixed(2)).toBe(String(stated.stated));
    // The figures that example-project/stoplog.yaml states, and tests/example-project.test.ts works out by itself.
    expect(balances.catchment.runoff_ratio).toBeCloseTo(0.536, 3);
    expect(bands['outlet-flow'].coverage).toBeCloseTo(0.77, 2);
    expect(conditions.annual_rainfall.mean).toBeCloseTo(984.9, 1);
  });
});

describe('crosswalk.json', () => {
  it('knows TRACE’s eight elements and those of EPA QA/G-5M', () => {
    const ids = frameworks.map(({ name, elements }) => [name, elements.map(({ id }) => id)]);
    expect(ids).toEqual([
      ['TRACE', ['1', '2', '3', '4', '5', '6', '7', '8']],
      ['EPA QA/G-5M', ['A5', 'A6', 'A7', 'A9', 'B7', 'B9', 'B10', 'C1', 'D1', 'D2', 'D3']],
    ]);
  });

  it('asks only for fields that a manifest can have', () => {
    const { $defs, properties } = schema('manifest');
    const known = new Set(JSON.stringify({ $defs, properties }).match(/"[a-z0-9_]+":/g));
    for (const address of frameworks.flatMap(({ elements }) => elements.flatMap((one) => one.answered_by))) {
      const [area, ...keys] = address.split('.');
      expect(areas).toContain(area);
      for (const key of keys) expect(known).toContain(`"${key}":`);
    }
  });

  const elements = (project: Project, name: string): Json[] =>
    project.json('crosswalk.json').studies[0].frameworks.find((one: Json) => one.name === name).elements;

  it('leads from each element to the records and fields that answer it, with their state', () => {
    const corroboration = elements(example, 'TRACE').find((one) => one.id === '8');
    expect(corroboration).toEqual({
      id: '8',
      title: 'Model output corroboration',
      answers: [
        { record: 'periods', fields: ['validation'], state: 'sound', grade: 'sealed' },
        {
          record: 'evaluation.outlet-flow',
          fields: ['scores.validation', 'split_test'],
          state: 'sound',
          grade: 'recomputed',
        },
        {
          record: 'evaluation.dry-years',
          fields: ['scores.validation', 'split_test'],
          state: 'sound',
          grade: 'recomputed',
        },
      ],
    });
  });

  it('shows an element that nothing answers, empty', () => {
    expect(elements(awkward, 'EPA QA/G-5M').find((one) => one.id === 'D1')).toEqual({
      id: 'D1',
      title: 'Departures from validation criteria',
      answers: [],
    });
  });

  it('takes the frameworks that a group keeps beside its manifest, and says where one can’t be read', async () => {
    const own = {
      name: 'Office check list',
      source: 'Northmere Catchment Office (2020), invented',
      elements: [
        { id: '1', title: 'Where is the outlet?', answered_by: ['catchment.outlet', 'catchment.area.value'] },
      ],
    };
    const unknown = { id: '2', title: 'What colour?', answered_by: ['colour.of_water'] };
    const repository = await exampleProject({
      'office.framework.json': JSON.stringify(own),
      'wrong.framework.json': JSON.stringify({ ...own, elements: [...own.elements, unknown] }),
      'text.framework.json': 'elements: none',
      'deeper/other.framework.json': JSON.stringify(own),
    });
    const project = await readAndRemoved(repository);
    const [, , ...more] = project.json('crosswalk.json').studies[0].frameworks;
    expect(more.map(({ name, note }: Json) => [name, note])).toEqual([
      ['Office check list', undefined],
      ['text.framework.json', 'Not read: it is no JSON.'],
      [
        'wrong.framework.json',
        expect.stringContaining('Not read: `elements[1]`: `colour.of_water` begins with no area'),
      ],
    ]);
    expect(more[0].elements[0].answers).toEqual([
      { record: 'catchment', fields: ['outlet', 'area.value'], state: 'sound', grade: 'sealed' },
    ]);
  });
});

describe('the documents', () => {
  it('are the same bytes for the same commit, wherever the repository lies', () => {
    expect(again.content.commit).toBe(example.content.commit);
    expect(again.documents).toEqual(example.documents);
    expect(again.crate).toEqual(example.crate);
  });

  it('name no folder of this machine', () => {
    for (const { content } of [...awkward.documents, awkward.crate]) {
      expect(String(content)).not.toContain(awkward.repository.folder);
    }
  });
});
