import type { FieldPath } from '../../manifest/manifest.ts';
import { fromFolder } from '../../records/paths.ts';
import type { RecordNode } from '../../records/record.ts';
import { type Draft, rule } from '../rule.ts';

export const inputsPublishedDigestDiffers = rule({
  id: 'inputs.published-digest-differs',
  scope: 'inputs',
  from: 'setup',
  means: 'contradicted',
  statement: 'The SHA-256 that the provider publishes is not that of the file.',
  why: 'The file was cut short, edited or replaced after it was fetched, or is another version of the data than the source names.',
  source: { basis: 'definition', citation: 'Equal bytes have equal SHA-256 (FIPS 180-4).' },
  clear:
    'Fetch the file again; where it was changed on purpose, keep the original, and tell the change in `preparation`.',
  check: (record, { manifest }) => {
    const { id, fragment } = record;
    const stated = fragment.source?.published_sha256;
    const files = dataOf(record).filter(({ sha256 }) => sha256 !== undefined);
    const differing = files.flatMap(({ path, field, sha256, published }) => {
      const byPath = typeof stated === 'object' ? stated[fromFolder(manifest.folder, path)] : undefined;
      const wanted =
        published ?? byPath ?? (files.length === 1 && typeof stated === 'string' ? stated : sha256);
      return wanted === sha256
        ? []
        : draft(id, field, path, wanted, sha256, `${path} is not the file that its provider published`);
    });
    const shared = typeof stated === 'string' && files.length > 1 ? stated : undefined;
    if (shared === undefined || files.some(({ sha256 }) => sha256 === shared)) return differing;
    const field = [...record.field, 'source', 'published_sha256'];
    const none = `None of the ${files.length} files is the one that the provider published`;
    return [...differing, draft(id, field, '', shared, undefined, none)];
  },
});

interface DataFile {
  readonly path: string;
  readonly field: FieldPath;
  /** Undefined where the content is not here and no digest is stated. */
  readonly sha256: string | undefined;
  /** What the provider publishes, where the manifest says it beside the file. */
  readonly published: string | undefined;
}

/** The data files of an input, without scripts of its preparation. */
function dataOf({ fragment, claims, elsewhere, field }: RecordNode<'inputs'>): readonly DataFile[] {
  const isData = (file: { readonly field: FieldPath }) => file.field[field.length] === 'files';
  return [
    ...[...claims.values()].filter(isData).map(({ path, field, identity }) => ({
      path,
      field,
      sha256: identity.kind === 'unavailable' ? undefined : identity.sha256,
      published: undefined,
    })),
    ...elsewhere.filter(isData).map(({ path, field, sha256 }) => {
      const stated = fragment.files?.[Number(field.at(-1))];
      const published = typeof stated === 'object' ? stated.published_sha256 : undefined;
      return { path, field, sha256, published };
    }),
  ];
}

function draft(
  record: string,
  field: FieldPath,
  subject: string,
  stated: string | undefined,
  found: string | undefined,
  says: string,
): Draft {
  return {
    record,
    field,
    subject,
    ...(stated === undefined ? {} : { stated }),
    ...(found === undefined ? {} : { found }),
    message: `${says}: the SHA-256 differ.`,
  };
}
