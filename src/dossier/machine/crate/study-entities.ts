import type { DossierStudy } from '../../content.ts';
import { doiAddress } from '../doi.ts';
import { idOf } from '../identifier.ts';
import { licenceUrl } from '../licence.ts';
import { type Entity, idOfAddress } from './entity.ts';

/** A licence; where none is stated, that nothing is granted. */
export function licenceEntity(name: string | undefined): Entity {
  if (name === undefined) {
    const description =
      'Nobody has stated under which terms this may be used; ask the people who are named here.';
    return { '@id': '#no-licence', '@type': 'CreativeWork', name: 'No licence stated', description };
  }
  const url = licenceUrl(name);
  return url === null
    ? {
        '@id': `#licence-${idOf('licence', name)}`,
        '@type': 'CreativeWork',
        name,
        description: `Stated as ${name}.`,
      }
    : {
        '@id': url,
        '@type': 'CreativeWork',
        name,
        description: `${name}, as the SPDX licence list names it.`,
      };
}

/** The catchment, with its outlet as a point (WGS 84, longitude first) where that is stated. */
export function placeEntities({ facts }: DossierStudy): readonly Entity[] {
  const { catchment } = facts.manifest.data;
  if (catchment === undefined) return [];
  const { longitude, latitude } = catchment.outlet ?? {};
  const id = idOf('catchment', facts.manifest.path, catchment.name ?? '');
  const isKnown = longitude !== undefined && latitude !== undefined;
  const point = { '@id': `#outlet-${id}`, '@type': 'Geometry', asWKT: `POINT (${longitude} ${latitude})` };
  return [
    {
      '@id': `#catchment-${id}`,
      '@type': 'Place',
      name: catchment.name ?? 'Catchment',
      latitude,
      longitude,
      geo: isKnown ? { '@id': point['@id'] } : undefined,
    },
    ...(isKnown ? [point] : []),
  ];
}

/** Earlier work that a study cites. */
export function literatureEntities({ facts }: DossierStudy): readonly Entity[] {
  const literature = facts.manifest.data.study?.literature;
  if (!Array.isArray(literature)) return [];
  return literature.flatMap(({ cites, doi, url }): readonly Entity[] => {
    const name = cites ?? doi ?? url;
    if (name === undefined) return [];
    const address = doi === undefined ? url : doiAddress(doi);
    const id = address !== undefined && URL.canParse(address) ? idOfAddress(address) : undefined;
    return [{ '@id': id ?? `#citation-${idOf('citation', name)}`, '@type': 'CreativeWork', name }];
  });
}
