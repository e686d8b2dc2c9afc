import { type CurveNumberRow, curveNumbers, type SoilGroup, soilGroups } from '../tables/curve-numbers.ts';
import type { HandbookOrder } from './handbook-order.ts';
import type { HandbookClass } from './handbook-range.ts';

/**
 * The relation by which the first class has the smaller curve number; null where none holds in the whole table. Two classes on one
 * soil group, or one class on two.
 *
 * Formula: the relations below
 * Inputs: two classes of TR-55 Table 2-2; where a record seals a part of them, only the soil group and that share are compared.
 * Range: a relation, or null.
 * Read: a curve number that breaks one has no physical meaning left beside its neighbour.
 * Undefined: never.
 * Source: TR-55 1986, Table 2-2; NRCS National Engineering Handbook 630, ch. 9.
 * Example: curveNumberOrder({class: 'woods, good', soilGroup: 'A'}, {class: 'woods, good', soilGroup: 'B'}) -> {states: 'curve numbers rise with the soil group from A to D', orEqual: true}
 */
export function curveNumberOrder(smaller: HandbookClass, greater: HandbookClass): HandbookOrder | null {
  const [low, high] = [smaller, greater].map((of) =>
    curveNumbers.find((row) => row.class === of.class.trim().toLowerCase()),
  );
  if (low === undefined || high === undefined) return null;
  const [less = 0, more = 0] = [smaller.sealedShare, greater.sealedShare];
  if (smaller.soilGroup !== greater.soilGroup)
    return low === high && less === more && isCoarser(smaller.soilGroup, greater.soilGroup) ? bySoil : null;
  if (low === high) return less < more ? bySealing : null;
  if (less > 0 || more > 0) return null;
  return orders.find(({ holds }) => holds(low, high)) ?? null;
}

const bySoil: HandbookOrder = {
  states: 'curve numbers rise with the soil group from A to D',
  orEqual: true,
};
const bySealing: HandbookOrder = { states: 'sealing raises the curve number', orEqual: true };

function isCoarser(one: SoilGroup | undefined, other: SoilGroup | undefined): boolean {
  if (one === undefined || other === undefined) return false;
  return soilGroups.indexOf(one) < soilGroups.indexOf(other);
}

interface CurveNumberOrder extends HandbookOrder {
  holds(low: CurveNumberRow, high: CurveNumberRow): boolean;
}

const crops = ['row crops', 'small grain', 'close-seeded legumes or rotation meadow'];
const conditions = ['good', 'fair', 'poor'];

/** What is sealed, and grass in good condition as what is not. */
function sealing({ cover, condition, sealedPercent }: CurveNumberRow): number | null {
  if ((cover === 'open space' || cover === 'pasture') && condition === 'good') return 0;
  return sealedPercent;
}

function isSame(low: CurveNumberRow, high: CurveNumberRow, ...keys: ('cover' | 'treatment' | 'condition')[]) {
  return keys.every((key) => low[key] === high[key]);
}

/** How water is held on a field: terraced, contoured, straight row; null for what is no tillage. */
function tillage(row: CurveNumberRow): { readonly place: number; readonly residue: boolean } | null {
  const [how = '', residue] = row.treatment?.split(' with ') ?? [];
  const place = ['contoured and terraced', 'contoured', 'straight row'].indexOf(how);
  return place < 0 ? null : { place, residue: residue !== undefined };
}

const orders: readonly CurveNumberOrder[] = [
  {
    states: 'sealed ground has a higher curve number than grass or less sealed ground',
    orEqual: true,
    holds: (low, high) => {
      const [less, more] = [sealing(low), sealing(high)];
      return high.sealedPercent === 100 || (less !== null && more !== null && less < more);
    },
  },
  {
    states: 'cover in better condition has a lower curve number',
    orEqual: false,
    holds: (low, high) =>
      isSame(low, high, 'cover', 'treatment') &&
      low.condition !== null &&
      high.condition !== null &&
      conditions.indexOf(low.condition) < conditions.indexOf(high.condition),
  },
  {
    states: 'contours and terraces lower the curve number',
    orEqual: true,
    holds: (low, high) => {
      const [one, other] = [tillage(low), tillage(high)];
      return (
        isSame(low, high, 'cover', 'condition') &&
        one !== null &&
        other !== null &&
        one.residue === other.residue &&
        one.place < other.place
      );
    },
  },
  {
    states: 'row crops have a higher curve number than small grain treated alike',
    orEqual: true,
    holds: (low, high) =>
      low.cover === 'small grain' &&
      high.cover === 'row crops' &&
      isSame(low, high, 'treatment', 'condition'),
  },
  {
    states: 'bare fallow has a higher curve number than any crop',
    orEqual: false,
    holds: (low, high) => crops.includes(low.cover) && high.class === 'fallow, bare soil',
  },
  {
    states: 'crops have a higher curve number than meadow',
    orEqual: false,
    holds: (low, high) => low.cover === 'meadow' && crops.includes(high.cover),
  },
  {
    states: 'good woods have no higher curve number than meadow or good grass',
    orEqual: true,
    holds: (low, high) => low.class === 'woods, good' && (high.cover === 'meadow' || sealing(high) === 0),
  },
];
