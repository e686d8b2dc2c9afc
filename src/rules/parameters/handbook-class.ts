import type { HandbookClass } from '../../hydrology/parameters/handbook-range.ts';
import type { Handbook } from '../../manifest/data.generated.ts';

/** The class of a handbook that a record names. */
export function handbookClassOf({
  class: name = '',
  soil_group: soilGroup,
  impervious_share: sealedShare,
}: Handbook): HandbookClass {
  return { class: name, soilGroup, sealedShare };
}
