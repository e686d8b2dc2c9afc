/** What a document states, as `state of record stoplog.yaml inputs.rain` -> `"sound"`: values as JSON. */
export type Told = ReadonlyMap<string, string>;

/** A document as JSON; undefined where it is none. */
export function parsed(text: string | null | undefined): unknown {
  try {
    return JSON.parse(text ?? '');
  } catch {
    return undefined;
  }
}

/** What `contents.json` tells of the subject. */
export function toldByContents(document: unknown): Told {
  return new Map([
    ...whole(document, ['commit', 'draft', 'verdict']),
    ...listIn(document, 'records').flatMap((record) => ofRecord(fieldIn(record, 'manifest'), record)),
  ]);
}

/** What `facts.json` tells of the same. */
export function toldByFacts(document: unknown): Told {
  return new Map([
    ...whole(document, ['commit', 'draft']),
    ...listIn(document, 'studies').flatMap((study) =>
      listIn(study, 'records').flatMap((record) => ofRecord(fieldIn(study, 'manifest'), record)),
    ),
  ]);
}

/** What `findings.json` tells of the same; it knows records by their state only. */
export function toldByFindings(document: unknown): Told {
  const records = listIn(document, 'manifests').flatMap((manifest) =>
    listIn(manifest, 'records').flatMap((record) => ofRecord(fieldIn(manifest, 'path'), record)),
  );
  return new Map([
    ...whole(document, ['verdict']),
    ...records.filter(([statement]) => statement.startsWith('state ')),
  ]);
}

export function fieldIn(value: unknown, key: string): unknown {
  return typeof value === 'object' && value !== null && Object.hasOwn(value, key)
    ? (value as Record<string, unknown>)[key]
    : undefined;
}

export function listIn(value: unknown, key: string): readonly unknown[] {
  const list = fieldIn(value, key);
  return Array.isArray(list) ? list : [];
}

function whole(document: unknown, keys: readonly string[]): readonly (readonly [string, string])[] {
  return keys.map((key) => [key, asText(fieldIn(document, key))]);
}

function ofRecord(manifest: unknown, record: unknown): readonly (readonly [string, string])[] {
  const of = `of record ${asText(fieldIn(record, 'id'))} in ${asText(manifest)}`;
  return [
    [`state ${of}`, asText(fieldIn(record, 'state'))],
    [`digest ${of}`, asText(fieldIn(record, 'digest'))],
  ];
}

function asText(value: unknown): string {
  return JSON.stringify(value) ?? 'nothing';
}
