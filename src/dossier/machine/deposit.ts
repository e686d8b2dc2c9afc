import { caution } from '../../reports/caution.ts';
import type { DossierContent } from '../content.ts';
import { dossierIdentifier } from '../identifier.ts';
import { plainDoi } from './doi.ts';
import { licencesOf, licenceUrl } from './licence.ts';
import { authorsOfAll, type Party } from './people.ts';
import { descriptionOf, keywordsOf, titleOf, writtenOn } from './telling.ts';

/** Stands where nothing is known: DataCite Metadata Schema 4, appendix 3, standard values for unknown information. */
const unavailable = '(:unav)';

/**
 * `datacite.json`: a draft for depositing in an archive, by the DataCite Metadata Schema 4. The archive adds its DOI; until
 * then the identifier is a UUID, for a DOI that nobody registered would be an invented one.
 */
export function deposit(content: DossierContent): object {
  const authors = authorsOfAll(content);
  return {
    schemaVersion: 'http://datacite.org/schema/kernel-4',
    identifiers: [{ identifier: `urn:uuid:${dossierIdentifier(content)}`, identifierType: 'UUID' }],
    creators: authors.length === 0 ? [{ name: unavailable }] : authors.map(creator),
    titles: [{ title: titleOf(content) }],
    publisher: authors.find(({ isPerson }) => !isPerson)?.name ?? unavailable,
    publicationYear: writtenOn(content).slice(0, 4),
    types: { resourceType: 'Hydrological model study', resourceTypeGeneral: 'Dataset' },
    subjects: keywordsOf(content).map((subject) => ({ subject })),
    dates: [
      { date: writtenOn(content), dateType: 'Created' },
      ...simulationsOf(content).map((date) => ({ date, dateType: 'Coverage' })),
    ],
    version: content.commit,
    rightsList: licencesOf(content).map(rights),
    descriptions: [
      { description: descriptionOf(content), descriptionType: 'Abstract' },
      { description: caution, descriptionType: 'Other' },
    ],
    geoLocations: content.studies.flatMap(({ facts }) => place(facts.manifest.data.catchment)),
    relatedIdentifiers: relatedTo(content),
  };
}

function creator({ name, isPerson, orcid, affiliation }: Party): object {
  return {
    name,
    ...(orcid === undefined && isPerson ? {} : { nameType: isPerson ? 'Personal' : 'Organizational' }),
    ...(orcid === undefined
      ? {}
      : {
          nameIdentifiers: [
            { nameIdentifier: orcid, nameIdentifierScheme: 'ORCID', schemeUri: 'https://orcid.org' },
          ],
        }),
    ...(affiliation === undefined ? {} : { affiliation: [{ name: affiliation }] }),
  };
}

function rights(name: string): object {
  const rightsUri = licenceUrl(name);
  if (rightsUri === null) return { rights: name };
  return { rights: name, rightsUri, rightsIdentifier: name, rightsIdentifierScheme: 'SPDX' };
}

function simulationsOf({ studies }: DossierContent): readonly string[] {
  return [...new Set(studies.flatMap(({ facts }) => facts.manifest.data.periods?.simulation ?? []))];
}

function place(
  catchment: DossierContent['studies'][number]['facts']['manifest']['data']['catchment'],
): readonly object[] {
  const { longitude, latitude } = catchment?.outlet ?? {};
  const point =
    longitude === undefined || latitude === undefined
      ? {}
      : { geoLocationPoint: { pointLongitude: longitude, pointLatitude: latitude } };
  const named = catchment?.name === undefined ? {} : { geoLocationPlace: catchment.name };
  const whole = { ...named, ...point };
  return Object.keys(whole).length === 0 ? [] : [whole];
}

/** Inputs, model and literature that have a DOI or an address of their own. */
function relatedTo({ studies }: DossierContent): readonly object[] {
  const found = studies.flatMap(({ facts }) => {
    const { inputs = {}, model, study } = facts.manifest.data;
    const literature = Array.isArray(study?.literature) ? study.literature : [];
    return [
      ...Object.values(inputs).flatMap(({ source }) => related('IsDerivedFrom', source)),
      ...related('Requires', model?.source),
      ...literature.flatMap((citation) => related('References', citation)),
    ];
  });
  return [...new Map(found.map((one) => [JSON.stringify(one), one])).values()];
}

function related(
  relationType: string,
  { doi, url }: { readonly doi?: string; readonly url?: string } = {},
): readonly object[] {
  if (doi !== undefined)
    return [{ relatedIdentifier: plainDoi(doi), relatedIdentifierType: 'DOI', relationType }];
  return url === undefined ? [] : [{ relatedIdentifier: url, relatedIdentifierType: 'URL', relationType }];
}
