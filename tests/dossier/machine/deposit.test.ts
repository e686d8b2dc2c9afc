import { Ajv } from 'ajv';
import { beforeAll, describe, expect, it } from 'vitest';
import { type Json, type Project, theAwkward, theExample } from './projects.ts';

let example: Project;
let awkward: Project;
beforeAll(async () => {
  example = await theExample();
  awkward = await theAwkward();
}, 120_000);

const text = { type: 'string', minLength: 1 };
const listOf = (properties: object, required: readonly string[], more: object = {}) => ({
  type: 'array',
  items: { type: 'object', properties, required, additionalProperties: false },
  ...more,
});

/**
 * A small schema of ours, from the documented rules of the DataCite Metadata Schema 4 (properties, what is mandatory, controlled
 * lists as far as they are used here) and from the shape of its JSON. No registry carries the official one beyond 4.3; from memory.
 */
const schema = {
  type: 'object',
  additionalProperties: false,
  required: ['schemaVersion', 'identifiers', 'creators', 'titles', 'publisher', 'publicationYear', 'types'],
  properties: {
    schemaVersion: { const: 'http://datacite.org/schema/kernel-4' },
    identifiers: listOf({ identifier: text, identifierType: text }, ['identifier', 'identifierType'], {
      minItems: 1,
    }),
    creators: listOf(
      {
        name: text,
        nameType: { enum: ['Personal', 'Organizational'] },
        nameIdentifiers: listOf({ nameIdentifier: text, nameIdentifierScheme: text, schemeUri: text }, [
          'nameIdentifier',
          'nameIdentifierScheme',
        ]),
        affiliation: listOf({ name: text }, ['name']),
      },
      ['name'],
      { minItems: 1 },
    ),
    titles: listOf({ title: text }, ['title'], { minItems: 1 }),
    publisher: text,
    publicationYear: { type: 'string', pattern: '^[0-9]{4}$' },
    types: {
      type: 'object',
      properties: {
        resourceType: text,
        resourceTypeGeneral: {
          enum: ['Collection', 'ComputationalNotebook', 'Dataset', 'Model', 'Software', 'Workflow', 'Other'],
        },
      },
      required: ['resourceType', 'resourceTypeGeneral'],
      additionalProperties: false,
    },
    subjects: listOf({ subject: text }, ['subject']),
    dates: listOf(
      {
        date: { type: 'string', pattern: '^\\d{4}-\\d{2}-\\d{2}(/\\d{4}-\\d{2}-\\d{2})?$' },
        dateType: { enum: ['Created', 'Issued', 'Collected', 'Coverage', 'Valid', 'Other'] },
      },
      ['date', 'dateType'],
    ),
    version: text,
    rightsList: listOf(
      { rights: text, rightsUri: text, rightsIdentifier: text, rightsIdentifierScheme: text },
      [],
    ),
    descriptions: listOf(
      {
        description: text,
        descriptionType: {
          enum: ['Abstract', 'Methods', 'SeriesInformation', 'TableOfContents', 'TechnicalInfo', 'Other'],
        },
      },
      ['description', 'descriptionType'],
    ),
    geoLocations: listOf(
      {
        geoLocationPlace: text,
        geoLocationPoint: {
          type: 'object',
          properties: {
            pointLongitude: { type: 'number', minimum: -180, maximum: 180 },
            pointLatitude: { type: 'number', minimum: -90, maximum: 90 },
          },
          required: ['pointLongitude', 'pointLatitude'],
          additionalProperties: false,
        },
      },
      [],
    ),
    relatedIdentifiers: listOf(
      {
        relatedIdentifier: text,
        relatedIdentifierType: { enum: ['DOI', 'URL'] },
        relationType: { enum: ['IsDerivedFrom', 'References', 'Requires'] },
      },
      ['relatedIdentifier', 'relatedIdentifierType', 'relationType'],
    ),
  },
};

const validate = new Ajv({ allErrors: true }).compile(schema);
function faultsOf(document: Json): string[] {
  validate(document);
  return (validate.errors ?? []).map(({ instancePath, keyword }) => `${instancePath} ${keyword}`);
}

describe('datacite.json', () => {
  it('fits the documented rules, and a broken one would not', () => {
    expect(faultsOf(example.json('datacite.json'))).toEqual([]);
    expect(faultsOf(awkward.json('datacite.json'))).toEqual([]);
    const sound = example.json('datacite.json');
    expect(faultsOf({ ...sound, publicationYear: 2025 })).toEqual(['/publicationYear type']);
    expect(faultsOf({ ...sound, identifiers: [] })).toEqual(['/identifiers minItems']);
    expect(faultsOf({ ...sound, creators: undefined, colour: 'blue' })).toEqual([
      ' required',
      ' additionalProperties',
    ]);
    expect(faultsOf({ ...sound, types: { ...sound.types, resourceTypeGeneral: 'ModelRun' } })).toEqual([
      '/types/resourceTypeGeneral enum',
    ]);
  });

  it('invents no DOI: until an archive gives one, the identifier is that of the dossier', () => {
    const [identifier] = example.json('datacite.json').identifiers;
    const root = example.json('ro-crate-metadata.json')['@graph'][1];
    expect(identifier).toEqual({ identifier: root.identifier, identifierType: 'UUID' });
  });

  it('names inputs, model and literature', () => {
    const { relatedIdentifiers, geoLocations, dates } = awkward.json('datacite.json');
    expect(relatedIdentifiers).toContainEqual({
      relatedIdentifier: '10.5072/a(b)<c>',
      relatedIdentifierType: 'DOI',
      relationType: 'References',
    });
    expect(geoLocations).toEqual([
      {
        geoLocationPlace: 'Harrow Brook at Stone Bridge',
        geoLocationPoint: { pointLongitude: -1.5, pointLatitude: 52.5 },
      },
    ]);
    expect(dates).toContainEqual({ date: '2001-10-01/2010-09-30', dateType: 'Coverage' });
  });
});
