import { sha256OfJson } from './canonical.ts';
import type { Links } from './link.ts';
import { fromFolder } from './paths.ts';
import { type Area, type RecordNode, type Records, sha256Of } from './record.ts';
import type { Seal } from './seal.ts';

/** What a run or parameters bring forth, and what that came from. */
export type Outcome = Pick<Seal, 'outcome' | 'driven_by'>;

/**
 * The outcome of a record and what drives it, as a seal keeps them: of a run all that it rests on and the files that
 * it takes, of parameters the data and the window of the calibration. None for other records.
 */
export function outcomeOf(record: RecordNode, { nodes, manifest }: Records, links: Links): Outcome {
  if (record.area !== 'runs' && record.area !== 'parameters') return { outcome: null, driven_by: {} };
  const below = links.restsOn.get(record.id) ?? [];
  const drives =
    record.area === 'runs' ? below : below.filter((id) => /^inputs\.|periods\.calibration$/.test(id));
  const taken = [...record.claims.values()].filter(({ own }) => record.area === 'runs' && !own);
  return {
    outcome: productOf(record),
    driven_by: Object.fromEntries([
      ...drives.map((id) => {
        const node = nodes.get(id);
        return [id, node === undefined ? (links.digests.get(id) ?? null) : effectOf(node)];
      }),
      ...taken.map(({ path, identity }) => [fromFolder(manifest.folder, path), sha256Of(identity)]),
    ]),
  };
}

/** What of a record can move an outcome: what it brings forth, else all that it states. */
function effectOf(record: RecordNode): string {
  const files = [...record.claims.values()].map(({ identity }) => sha256Of(identity));
  return productOf(record) ?? sha256OfJson({ substance: record.substance, files });
}

/** Where the product of a record is named. An input's statement may change and its data not; then nothing need move. */
const productKeys: Readonly<Partial<Record<Area, readonly string[]>>> = {
  inputs: ['files'],
  model: ['executable', 'environment'],
  parameters: ['table'],
  runs: ['gives'],
};

/** Digest of the files, by content, and the values that a record brings forth; null where there are none. */
function productOf({ area, field, fragment, claims, elsewhere }: RecordNode): string | null {
  const isProduct = (named: { readonly field: RecordNode['field'] }): boolean =>
    productKeys[area]?.includes(String(named.field[field.length])) ?? false;
  const files = [
    ...[...claims.values()].filter(isProduct).map(({ identity }) => sha256Of(identity)),
    ...elsewhere.filter(isProduct).map(({ sha256 = null }) => sha256),
  ];
  const values = area === 'parameters' ? valuesOf(fragment as RecordNode<'parameters'>['fragment']) : [];
  return files.length + values.length === 0
    ? null
    : sha256OfJson({ files: files.map(String).sort(), values });
}

function valuesOf({ values = [] }: RecordNode<'parameters'>['fragment']): readonly unknown[] {
  return values.map(({ name, value, by }) => ({ name, value, by }));
}
