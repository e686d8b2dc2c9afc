import type { Acceptance, ManifestData } from '../manifest/data.generated.ts';
import type { FieldPath } from '../manifest/manifest.ts';

/** Every acceptance of a manifest with its field, in the manifest's order. */
export function acceptancesIn(
  data: ManifestData,
): readonly { readonly field: FieldPath; readonly acceptance: Acceptance }[] {
  return below(data, []);
}

function below(node: unknown, field: FieldPath): { field: FieldPath; acceptance: Acceptance }[] {
  if (typeof node !== 'object' || node === null) return [];
  return Object.entries(node).flatMap(([key, value]) => {
    const place = [...field, Array.isArray(node) ? Number(key) : key];
    return key === 'accepts'
      ? (value as Acceptance[]).map((acceptance, index) => ({ field: [...place, index], acceptance }))
      : below(value, place);
  });
}
