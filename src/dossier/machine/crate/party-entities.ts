import { idOf } from '../identifier.ts';
import type { Party } from '../people.ts';
import { type Entity, refer } from './entity.ts';

/** People and bodies with the bodies that people belong to, and the id of each party by its UUID. */
export function partyEntities(parties: readonly Party[]): {
  readonly entities: readonly Entity[];
  readonly ids: ReadonlyMap<string, string>;
} {
  const entities = new Map<string, Entity>();
  const ids = new Map<string, string>();
  const add = (entity: Entity): Entity => {
    entities.set(entity['@id'], entities.get(entity['@id']) ?? entity);
    return entity;
  };
  const bodies = new Map(parties.flatMap((party) => (party.isPerson ? [] : [[party.name, party.uuid]])));
  const bodyId = (name: string) => `#organization-${bodies.get(name) ?? idOf('body', name)}`;
  for (const { uuid, name, isPerson, orcid, affiliation, email, url } of parties) {
    const body =
      affiliation === undefined
        ? undefined
        : { '@id': bodyId(affiliation), '@type': 'Organization', name: affiliation };
    const entity = add({
      '@id': isPerson ? (orcid ?? `#person-${uuid}`) : bodyId(name),
      '@type': isPerson ? 'Person' : 'Organization',
      name,
      email,
      url,
      affiliation: body === undefined ? undefined : refer(body),
    });
    ids.set(uuid, entity['@id']);
    if (body !== undefined && !bodies.has(body.name)) add(body);
  }
  return { entities: [...entities.values()], ids };
}
