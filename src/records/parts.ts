import type { ManifestData } from '../manifest/data.generated.ts';
import type { Manifest } from '../manifest/manifest.ts';
import { type Parts, splitFragment } from '../manifest/substance.ts';
import type { RecordNode } from './record.ts';

type Stated = Pick<RecordNode, 'area' | 'field' | 'fragment'>;

/** What a record states, with what stands beside its fragment in the manifest and belongs to it. */
export function partsOf({ area, field, fragment }: Stated, { data }: Manifest): Parts {
  const parts = splitFragment(field, fragment);
  const beside = Object.values(besideOf(area, data));
  return beside.length === 0 ? parts : { ...parts, substance: [parts.substance, ...beside] };
}

/** The same substance by field: its fragment's under the empty name. */
export function substanceByField(
  { area, field, fragment }: Stated,
  { data }: Manifest,
): Readonly<Record<string, unknown>> {
  return { '': splitFragment(field, fragment).substance, ...besideOf(area, data) };
}

function besideOf(
  area: RecordNode['area'],
  { scenarios, seasons }: ManifestData,
): Readonly<Record<string, unknown>> {
  if (area === 'scenarios' && scenarios?.conditions !== undefined)
    return { 'scenarios.conditions': scenarios.conditions };
  return area === 'interventions' && seasons !== undefined ? { seasons } : {};
}
