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

/** A text, where there is one; JSON-LD has no use for an empty one. */
export function textOrNone(text: string | undefined): string | undefined {
  return text === undefined || text.trim() === '' ? undefined : text;
}

/**
 * A path as an identifier: URI-encoded, but letters of all scripts stay as they are. Source: RO-Crate 1.2, "Data Entities";
 * RFC 3987 section 2.2 for the characters that an IRI may hold.
 */
export function idOfPath(path: string): string {
  return path.replace(
    /[^A-Za-z0-9\-._~!$&'()*+,;=:@/\u00a0-\ud7ff\uf900-\ufdcf\ufdf0-\uffef\u{10000}-\u{dffff}]|[\u2028\u2029\u200e\u200f\u202a-\u202e\u00a0\u2000-\u200a\u3000\ufffe\uffff]/gu,
    (sign) => encodeURIComponent(sign),
  );
}
