import type { Manifest } from '../manifest/manifest.ts';
import { type Parts, splitFragment } from '../manifest/substance.ts';
import type { RecordNode } from './record.ts';

/** What a record states, with what stands beside its fragment in the manifest and belongs to it. */
export function partsOf(
  { area, field, fragment }: Pick<RecordNode, 'area' | 'field' | 'fragment'>,
  { data }: Manifest,
): Parts {
  const parts = splitFragment(field, fragment);
  const beside =
    area === 'scenarios' ? data.scenarios?.conditions : area === 'interventions' ? data.seasons : undefined;
  return beside === undefined ? parts : { ...parts, substance: [parts.substance, beside] };
}
