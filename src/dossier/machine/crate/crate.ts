import { jsonText } from '../../../reports/json.ts';
import type { DossierContent, DossierFile } from '../../content.ts';
import { dossierIdentifier } from '../../identifier.ts';
import { crateName, documentPath } from '../../layout.ts';
import type { Payload } from '../../payload.ts';
import { licencesOf } from '../licence.ts';
import { authorsOfAll } from '../people.ts';
import { descriptionOf, keywordsOf, titleOf } from '../telling.ts';
import { type Entity, refer, referTo } from './entity.ts';
import { fileEntities } from './file-entities.ts';
import { partyEntities } from './party-entities.ts';
import { runEntities } from './run-entities.ts';
import { licenceEntity, literatureEntities, placeEntities } from './study-entities.ts';

const version = 'https://w3id.org/ro/crate/1.2';
const profile: Entity = {
  '@id': 'https://w3id.org/ro/wfrun/process/0.5',
  '@type': 'CreativeWork',
  name: 'Process Run Crate',
  version: '0.5',
};

/**
 * `ro-crate-metadata.json` of a bag, RO-Crate 1.2 with the profile Process Run Crate 0.5. `documents` are all others that lie
 * beside it, so it is made last.
 */
export function crateDocument(
  content: DossierContent,
  payload: Payload,
  documents: readonly DossierFile[],
): DossierFile {
  const files = fileEntities(content, payload, documents);
  const parties = partyEntities(authorsOfAll(content));
  const runs = content.studies.map((study) => runEntities(study, files, parties.ids));
  const actions = runs.flatMap((run) => run.actions);
  const stated = licencesOf(content);
  const licences = stated.length === 0 ? [licenceEntity(undefined)] : stated.map(licenceEntity);
  const places = content.studies.flatMap(placeEntities);
  const literature = content.studies.flatMap(literatureEntities);
  const root: Entity = {
    '@id': './',
    '@type': 'Dataset',
    conformsTo: refer(profile),
    identifier: `urn:uuid:${dossierIdentifier(content)}`,
    name: titleOf(content),
    description: descriptionOf(content),
    datePublished: content.committedAt,
    version: content.commit,
    license: referTo(licences),
    author: referTo(parties.entities.filter((entity) => [...parties.ids.values()].includes(entity['@id']))),
    keywords: keywordsOf(content).join(', '),
    contentLocation: referTo(places.filter((entity) => entity['@type'] === 'Place')),
    temporalCoverage: single(
      content.studies.flatMap(({ facts }) => facts.manifest.data.periods?.simulation ?? []),
    ),
    citation: referTo(literature),
    hasPart: referTo(files.parts),
    mentions: referTo([...actions, ...files.described]),
  };
  const graph = onceEach([
    {
      '@id': crateName,
      '@type': 'CreativeWork',
      about: refer(root),
      conformsTo: { '@id': version },
    },
    root,
    ...files.parts,
    ...files.described,
    ...actions,
    ...runs.flatMap((run) => run.software),
    ...parties.entities,
    ...places,
    ...literature,
    ...licences,
    profile,
  ]);
  return {
    path: documentPath(crateName),
    content: jsonText({ '@context': `${version}/context`, '@graph': graph }),
  };
}

/** A single value stands without a list. */
function single(texts: readonly string[]): string | readonly string[] | undefined {
  const [first, ...more] = [...new Set(texts)];
  return more.length === 0 || first === undefined ? first : [first, ...more];
}

/** No two entities may have one id: the first stays. */
function onceEach(entities: readonly Entity[]): readonly Entity[] {
  const found = new Map<string, Entity>();
  for (const entity of entities) if (!found.has(entity['@id'])) found.set(entity['@id'], entity);
  return [...found.values()];
}
