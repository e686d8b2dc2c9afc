import type { RecomputedBalance } from '../../facts/balances/balance-of.ts';
import type { Facts } from '../../facts/facts.ts';
import { isDefined } from '../../hydrology/paired.ts';
import type { RecordNode } from '../../records/record.ts';

/** The balance that the files give; null where they give none, of which `balance.differs` tells. */
export function computedBalance({ name }: RecordNode, balances: Facts['balances']): RecomputedBalance | null {
  const recomputed = balances.get(name ?? '')?.recomputed;
  return recomputed !== undefined && isDefined(recomputed) ? recomputed.value : null;
}
