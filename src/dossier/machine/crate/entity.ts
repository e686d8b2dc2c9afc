/** A reference from one entity to another. */
export interface Reference {
  readonly '@id': string;
}

/** One entity of the graph: flat, with references and single values; what is undefined is not written. */
export interface Entity extends Reference {
  readonly '@type': string | readonly string[];
  readonly [property: string]: unknown;
}

export function refer({ '@id': id }: Reference): Reference {
  return { '@id': id };
}

/** References as RO-Crate writes them: none is left out, a single one stands without a list. */
export function referTo(entities: readonly Reference[]): Reference | readonly Reference[] | undefined {
  const ids = [...new Set(entities.map((entity) => entity['@id']))];
  const [first, ...more] = ids.map((id) => ({ '@id': id }));
  return more.length === 0 ? first : ids.map((id) => ({ '@id': id }));
}

/** A path as an identifier: URI-encoded, but letters of all scripts stay as they are. Source: RO-Crate 1.2, "Data Entities". */
export function idOfPath(path: string): string {
  return path.replace(/[^A-Za-z0-9\-._~!$&'()*+,;=:@/\p{L}\p{M}\p{N}]/gu, (sign) => encodeURIComponent(sign));
}

/** An absolute address as an identifier: without the signs that browsers allow in an address and an IRI must not have. */
export function idOfAddress(address: string): string {
  return new URL(address).href.replace(/[\s"<>\\^`{|}]/g, (sign) => encodeURIComponent(sign));
}
